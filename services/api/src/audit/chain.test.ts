import { describe, expect, it } from 'vitest';
import { canonicalJson, type Canonical } from './canonical-json.ts';
import { chainHash, firstPrevious, verifyChain, type ChainEntry } from './chain.ts';
import vectors from './chain.vectors.json' with { type: 'json' };

// Source of every expected value: chain.vectors.json names it.
const chain: ChainEntry[] = vectors.chain.map(({ event, prev, hash }) => ({ seq: event.seq, event: canonicalJson(event as Canonical), prev, hash }));
const anchor = vectors.anchor;

/** Writes the chain anew from an entry on, as somebody would who can write everything. */
function rewritten(entries: readonly ChainEntry[], from: number): ChainEntry[] {
  const result: ChainEntry[] = [];
  for (const entry of entries) {
    const prev = result.at(-1)?.hash ?? firstPrevious;
    const event = entry.seq === from ? entry.event.replace('"actor":"usr', '"actor":"xsr') : entry.event;
    result.push({ ...entry, event, prev, hash: chainHash(prev, event) });
  }
  return result;
}
const changed = (entries: readonly ChainEntry[], seq: number, change: (entry: ChainEntry) => ChainEntry): ChainEntry[] =>
  entries.map((entry) => (entry.seq === seq ? change(entry) : entry));
const otherActor = (entry: ChainEntry): ChainEntry => ({ ...entry, event: entry.event.replace('"actor":"usr', '"actor":"xsr') });

describe('the audit chain', () => {
  it('gives the published hash for every published event', () => {
    for (const entry of chain) expect(chainHash(entry.prev, entry.event)).toBe(entry.hash);
    expect(verifyChain(chain, anchor)).toEqual({ entries: chain.length, holds: true, firstBrokenSeq: null, head: chain.at(-1)?.hash });
  });

  it.each([
    ['an actor is changed', changed(chain, 2, otherActor), 2],
    ['an entry is changed and its own hash made anew', changed(chain, 2, (entry) => ({ ...otherActor(entry), hash: chainHash(entry.prev, otherActor(entry).event) })), 3],
    ['an entry is removed', chain.filter((entry) => entry.seq !== 3), 3],
    ['two entries are swapped', [chain[0], chain[2], chain[1], ...chain.slice(3)] as ChainEntry[], 2],
  ])('notices that %s', (_what, entries, seq) => {
    expect(verifyChain(entries)).toMatchObject({ holds: false, firstBrokenSeq: seq });
    expect(verifyChain(entries, anchor)).toMatchObject({ holds: false, firstBrokenSeq: seq });
  });

  it('needs an outside anchor to notice a cut end or a chain written anew', () => {
    const cut = chain.slice(0, 3);
    expect(verifyChain(cut)).toMatchObject({ holds: true });
    expect(verifyChain(cut, anchor)).toMatchObject({ holds: false, firstBrokenSeq: 4 });
    const anew = rewritten(chain, 2);
    expect(verifyChain(anew)).toMatchObject({ holds: true });
    expect(verifyChain(anew, anchor)).toMatchObject({ holds: false, firstBrokenSeq: 4 });
    expect(verifyChain(chain.slice(0, 4), anchor)).toMatchObject({ holds: true });
  });
});

describe('canonical JSON', () => {
  it('sorts keys by code point, writes no spaces and leaves other scripts as they are', () => {
    expect(canonicalJson({ b: 1, a: 'Überprüft', '\u{1F600}': true, '\uFFFD': null })).toBe('{"a":"Überprüft","b":1,"\uFFFD":null,"\u{1F600}":true}');
  });
  it('refuses numbers that have more than one way to be written', () => {
    expect(() => canonicalJson({ a: 0.1 })).toThrow(TypeError);
  });
});
