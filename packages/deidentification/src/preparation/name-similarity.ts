import { foldName } from './variable-names.ts';

function pairsOf(text: string): Map<string, number> {
  const pairs = new Map<string, number>();
  for (let at = 0; at + 1 < text.length; at += 1) {
    const pair = text.slice(at, at + 2);
    pairs.set(pair, (pairs.get(pair) ?? 0) + 1);
  }
  return pairs;
}

/** How alike two names are, from 0 to 1: the share of letter pairs they have in common (Dice 1945). Case and separators do not count. */
export function nameSimilarity(one: string, other: string): number {
  const [first, second] = [pairsOf(foldName(one)), pairsOf(foldName(other))];
  let common = 0;
  for (const [pair, count] of first) common += Math.min(count, second.get(pair) ?? 0);
  const sizes = [...first.values(), ...second.values()].reduce((sum, count) => sum + count, 0);
  return sizes === 0 ? 0 : (2 * common) / sizes;
}
