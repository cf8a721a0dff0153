import { describe, expect, it } from 'vitest';
import { drawSecret } from '../pseudonyms/keyed-hash.ts';
import { usualNormalisation } from '../pseudonyms/normalise-local-id.ts';
import { CodeBook } from './code-book.ts';
import { joinLocalIds } from './join-local-ids.ts';
import { joinPeople } from './join-people.ts';
import { KeyFileRefusal } from './key-file-refusal.ts';
import { mergeKeys } from './merge-keys.ts';
import { rotateKey } from './rotate-key.ts';
import type { PseudonymMode, SiteKey } from './site-key.ts';

const newKey = (mode: PseudonymMode): SiteKey => ({
  site: 'site-07',
  revision: 1,
  mode,
  idType: 'mrn',
  normalisation: usualNormalisation,
  generations: [{ keyId: '2026-01', secret: drawSecret(), codes: new Map(), replacedBy: new Map() }],
  people: new Map(),
  matches: new Map(),
  idLengths: new Map(),
});

/** Looks people up, and states the first training day of those that have one. */
async function withPeople(key: SiteKey, people: Readonly<Record<string, string>>) {
  const book = await CodeBook.open(key);
  const codes: Record<string, string> = {};
  for (const [localId, indexDate] of Object.entries(people)) {
    const { code } = await book.codeOf(localId);
    codes[localId] = code;
    if (indexDate !== '') book.remember(code, { indexDate });
  }
  return { key: book.close(), codes };
}

describe.each(['random', 'hmac'] as const)('a code book in %s mode', (mode) => {
  it('gives a person the same code every month, and says when somebody is new', async () => {
    const first = await withPeople(newKey(mode), { A1: '2026-01-15', B2: '' });
    expect(first.codes['A1']).not.toBe(first.codes['B2']);
    const book = await CodeBook.open(first.key);
    expect(await book.codeOf('A1')).toEqual({ code: first.codes['A1'], isNew: false });
    expect((await book.codeOf('C3')).isNew).toBe(true);
    expect((await book.codeOf('C3')).isNew).toBe(false);
    expect(book.replacedCodes).toEqual([]);
  });

  it('does not list record numbers', async () => {
    const { key } = await withPeople(newKey(mode), { '00482913': '2026-01-15' });
    expect(JSON.stringify([...key.generations[0].codes, ...key.people])).not.toContain('00482913');
  });

  it('carries people over to a new secret, some at once and the others when they are met', async () => {
    const before = await withPeople(newKey(mode), { A1: '2026-01-15', B2: '2026-02-20' });
    const { key, replaced } = await rotateKey(before.key, '2027-01', ['A1', 'NEW']);
    expect(replaced).toEqual([{ from: before.codes['A1'], to: expect.not.stringContaining(before.codes['A1'] ?? '') as string }]);
    expect(key.people.get(replaced[0]?.to ?? '')).toEqual({ indexDate: '2026-01-15' });
    expect(key.people.has(before.codes['A1'] ?? '')).toBe(false);
    await expect(rotateKey(key, '2026-01', [])).rejects.toThrow(RangeError);

    const later = await CodeBook.open(key);
    expect(await later.codeOf('A1')).toEqual({ code: replaced[0]?.to, isNew: false });
    const carried = await later.codeOf('B2');
    expect(carried.isNew).toBe(false);
    expect(later.replacedCodes).toEqual([{ from: before.codes['B2'], to: carried.code }]);
    expect(later.person(carried.code)).toEqual({ indexDate: '2026-02-20' });

    expect(later.presentCodeOf(before.codes['B2'] ?? '')).toBe(carried.code);
    expect(later.presentCodeOf(carried.code)).toBe(carried.code);
    const again = await CodeBook.open(later.close());
    expect((await again.codeOf('B2')).code).toBe(carried.code);
    expect(again.replacedCodes).toEqual([]);
  });

  it('joins two record numbers of one person, and keeps them joined over a rotation', async () => {
    const before = await withPeople(newKey(mode), { A1: '2026-02-20', B2: '2026-01-15' });
    const joined = await joinLocalIds(before.key, 'A1', 'B2');
    expect(joined.replaced).toEqual([{ from: before.codes['B2'], to: before.codes['A1'] }]);
    expect([...joined.key.people]).toEqual([[before.codes['A1'], { indexDate: '2026-01-15' }]]);
    expect((await joinLocalIds(joined.key, 'A1', 'B2')).replaced).toEqual([]);

    const { key, replaced } = await rotateKey(joined.key, '2027-01', ['B2']);
    expect(replaced).toHaveLength(1);
    const book = await CodeBook.open(key);
    expect((await book.codeOf('A1')).code).toBe(replaced[0]?.to);
    expect((await book.codeOf('B2')).code).toBe(replaced[0]?.to);
    expect(book.replacedCodes).toEqual([]);
  });

  it('joins a record number that nobody had before without replacing anything', async () => {
    const before = await withPeople(newKey(mode), { A1: '2026-02-20' });
    const { key, replaced } = await joinLocalIds(before.key, 'A1', 'C3');
    expect(replaced).toEqual([]);
    expect(await (await CodeBook.open(key)).codeOf('C3')).toEqual({ code: before.codes['A1'], isNew: false });
  });
});

describe('facts of two people who turn out to be one', () => {
  it('are joined so that the earlier day and the higher age stay', () => {
    expect(joinPeople({ indexDate: '2026-02-01', age: 61, lastDay: 40 }, { indexDate: '2026-01-15', age: 62 })).toEqual({
      indexDate: '2026-01-15',
      age: 62,
      lastDay: 40,
    });
    expect(joinPeople({}, undefined)).toEqual({});
  });
});

describe('two copies of a key', () => {
  it('become one: the code that sorts first stays, and the earlier first training day counts', async () => {
    const start = await withPeople(newKey('random'), { A1: '2026-01-15' });
    const mine = await withPeople(start.key, { B2: '2026-02-20', C3: '2026-03-01', A1: '2026-01-15' });
    const theirs = await withPeople(start.key, { B2: '2026-02-18', D4: '2026-03-05', A1: '2026-01-15' });
    const merged = mergeKeys(mine.key, theirs.key);

    const [kept = '', retired = ''] = [mine.codes['B2'] ?? '', theirs.codes['B2'] ?? ''].sort();
    expect(merged.replaced).toEqual([{ from: retired, to: kept }]);
    expect(merged.indexDatesMoved).toEqual([kept]);
    expect(merged.key.people.get(kept)).toEqual({ indexDate: '2026-02-18' });
    expect(merged.key.people.has(retired)).toBe(false);
    const book = await CodeBook.open(merged.key);
    expect((await book.codeOf('A1')).code).toBe(start.codes['A1']);
    expect((await book.codeOf('B2')).code).toBe(kept);
    expect((await book.codeOf('C3')).code).toBe(mine.codes['C3']);
    expect((await book.codeOf('D4')).code).toBe(theirs.codes['D4']);

    const turned = mergeKeys(theirs.key, mine.key);
    expect(turned.replaced).toEqual(merged.replaced);
    expect(new Map([...turned.key.people].sort())).toEqual(new Map([...merged.key.people].sort()));
  });

  it('become one when both went on after a rotation', async () => {
    const start = await withPeople(newKey('random'), { A1: '2026-01-15' });
    const rotated = await rotateKey(start.key, '2027-01', []);
    const mine = await withPeople(rotated.key, { A1: '' });
    const theirs = await withPeople(rotated.key, { A1: '' });
    const merged = mergeKeys(mine.key, theirs.key);
    const kept = [mine.codes['A1'] ?? '', theirs.codes['A1'] ?? ''].sort()[0] ?? '';
    expect(merged.key.generations[1]?.replacedBy.get(start.codes['A1'] ?? '')).toBe(kept);
    expect([...merged.key.people]).toEqual([[kept, { indexDate: '2026-01-15' }]]);
  });

  it('take the column matches of the copy that was saved more often', () => {
    const key = newKey('random');
    const older: SiteKey = {
      ...key,
      matches: new Map([
        ['sessions', []],
        ['bouts', []],
      ]),
    };
    const newer: SiteKey = { ...key, revision: 5, matches: new Map([['sessions', [{ header: 'MRN', as: 'participant' }]]]) };
    for (const merged of [mergeKeys(older, newer), mergeKeys(newer, older)]) {
      expect(merged.key.revision).toBe(5);
      expect(merged.key.matches.get('sessions')).toEqual([{ header: 'MRN', as: 'participant' }]);
      expect(merged.key.matches.get('bouts')).toEqual([]);
    }
  });

  it('are refused when they are no copies of each other', () => {
    const key = newKey('random');
    const others: SiteKey[] = [
      newKey('random'),
      { ...key, site: 'site-08' },
      { ...key, mode: 'hmac' },
      { ...key, idType: 'study-id' },
      { ...key, normalisation: { ...usualNormalisation, stripLeadingZeros: true } },
    ];
    expect(mergeKeys(key, key).replaced).toEqual([]);
    for (const other of others) expect(() => mergeKeys(key, other)).toThrow(KeyFileRefusal);
  });
});
