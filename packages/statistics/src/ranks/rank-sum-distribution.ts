/**
 * Exact null distribution of the Mann-Whitney U and of a rank sum with ties, by counting all ways to choose the first group.
 * Source: Mann & Whitney (1947) Annals of Mathematical Statistics 18:50-60; with midranks as in Streitberg & Röhmel (1986)
 * Statistical Software Newsletter 12:10-17.
 */

import { requireCount } from '../distributions/binomial.ts';
import type { Tails } from '../distributions/tails.ts';
import { noneAbove, noneBelow, requireNumber } from '../distributions/tails.ts';

/** Pairs of values up to which arrangements are counted: about a second of work. */
const mostPairs = 40_000;

/** Shares of the C(m + n, m) arrangements without ties that give U = 0, 1, …, mn. */
export function rankSumShares(m: number, n: number): Float64Array {
  // counts[j] is for i of the first and j of the second group: the largest value belongs to the first (adding j to U) or the second.
  let counts = Array.from({ length: n + 1 }, () => Float64Array.of(1));
  for (let i = 1; i <= m; i++) {
    const next = [Float64Array.of(1)];
    for (let j = 1; j <= n; j++) {
      const here = new Float64Array(i * j + 1);
      const shareOfFirst = i / (i + j);
      const withoutFirst = counts[j] as Float64Array;
      const withoutSecond = next[j - 1] as Float64Array;
      for (let u = 0; u < withoutFirst.length; u++) here[u + j] = (withoutFirst[u] as number) * shareOfFirst;
      for (let u = 0; u < withoutSecond.length; u++) here[u] = (here[u] as number) + (withoutSecond[u] as number) * (1 - shareOfFirst);
      next.push(here);
    }
    counts = next;
  }
  return counts[n] as Float64Array;
}

/** P(U <= u) and P(U > u), from the shares of U = 0, 1, … */
export function tailsOfShares(shares: Float64Array, u: number): { readonly lower: number; readonly upper: number } {
  let lower = 0;
  let upper = 0;
  for (const [at, share] of shares.entries()) {
    if (at <= u) lower += share;
    else upper += share;
  }
  return { lower, upper };
}

/** P(U <= u) and P(U > u) for groups of m and n without ties. */
export function rankSumTails(u: number, m: number, n: number): Tails {
  requireNumber(u, 'A count of pairs');
  requireCount(m, 'The size of a group');
  requireCount(n, 'The size of a group');
  const whole = Math.floor(u);
  if (whole < 0) return noneBelow;
  if (whole >= m * n) return noneAbove;
  if (m * n > mostPairs) throw new RangeError('Arrangements are counted for at most 40,000 pairs of values.');
  const { lower, upper } = tailsOfShares(rankSumShares(m, n), whole);
  return { lower, upper, logLower: Math.log(lower), logUpper: Math.log(upper) };
}

/** P(S <= sum) and P(S >= sum), S the sum of `size` of the `scores` chosen at random. The scores are whole numbers (doubled midranks). */
export function chosenSumTails(
  scores: readonly number[],
  size: number,
  sum: number,
): { readonly atMost: number; readonly atLeast: number } {
  // Choosing the group is choosing the rest: the smaller of the two is counted.
  if (size > scores.length / 2) {
    const all = scores.reduce((total, score) => total + score, 0);
    const rest = chosenSumTails(scores, scores.length - size, all - sum);
    return { atMost: rest.atLeast, atLeast: rest.atMost };
  }
  const ascending = [...scores].sort((a, b) => a - b);
  /** Sum of the `k` largest of the first `seen` scores. */
  const largestSum = (k: number, seen: number): number =>
    ascending.slice(Math.max(0, seen - k), seen).reduce((total, score) => total + score, 0);
  const greatest = largestSum(size, scores.length);
  const width = greatest + 1;
  // ways[k * width + s]: how many choices of k scores so far add to s.
  const ways = new Float64Array((size + 1) * width);
  ways[0] = 1;
  ascending.forEach((score, seen) => {
    for (let k = Math.min(size, seen + 1); k >= 1; k--) {
      const row = k * width;
      const from = row - width - score;
      for (let s = largestSum(k, seen + 1); s >= score; s--) ways[row + s] = (ways[row + s] as number) + (ways[from + s] as number);
    }
  });
  let atMost = 0;
  let atLeast = 0;
  let all = 0;
  for (let s = 0; s <= greatest; s++) {
    const share = ways[size * width + s] as number;
    all += share;
    if (s <= sum) atMost += share;
    if (s >= sum) atLeast += share;
  }
  return { atMost: atMost / all, atLeast: atLeast / all };
}
