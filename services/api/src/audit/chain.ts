/** The hash chain of the audit log: hash = SHA-256(previous hash as 32 bytes, then the canonical event in UTF-8). */
import { createHash } from 'node:crypto';

export const firstPrevious = '0'.repeat(64);

export const chainHash = (previous: string, canonicalEvent: string): string =>
  createHash('sha256').update(Buffer.from(previous, 'hex')).update(canonicalEvent, 'utf8').digest('hex');

export interface ChainEntry {
  readonly seq: number;
  readonly event: string;
  readonly prev: string;
  readonly hash: string;
}

export interface ChainVerdict {
  readonly entries: number;
  readonly holds: boolean;
  readonly firstBrokenSeq: number | null;
  readonly head: string | null;
}

/** A head of the chain copied to a place the application cannot write. */
export interface Anchor {
  readonly seq: number;
  readonly hash: string;
}

/**
 * Walks the chain in order. Notices a changed, removed, inserted or swapped entry. An end cut off, or a chain rewritten as a whole, shows only
 * against an anchor, and an event that was never written shows nowhere.
 */
export function verifyChain(entries: Iterable<ChainEntry>, anchor?: Anchor): ChainVerdict {
  let previous = firstPrevious;
  let count = 0;
  for (const entry of entries) {
    const expectedSeq = count + 1;
    const sound =
      entry.seq === expectedSeq &&
      entry.prev === previous &&
      entry.hash === chainHash(previous, entry.event) &&
      (JSON.parse(entry.event) as { seq?: unknown }).seq === expectedSeq;
    if (!sound) return { entries: count, holds: false, firstBrokenSeq: expectedSeq, head: null };
    if (anchor?.seq === expectedSeq && anchor.hash !== entry.hash) return { entries: count, holds: false, firstBrokenSeq: expectedSeq, head: null };
    previous = entry.hash;
    count += 1;
  }
  if (anchor && count < anchor.seq) return { entries: count, holds: false, firstBrokenSeq: count + 1, head: null };
  return { entries: count, holds: true, firstBrokenSeq: null, head: count === 0 ? null : previous };
}
