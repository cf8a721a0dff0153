/**
 * Exact null distribution of the signed rank statistic V (sum of the ranks of positive differences) by counting all 2^n sign patterns.
 * Source: Wilcoxon (1945) Biometrics Bulletin 1:80-83; counting with midranks as in Streitberg & Röhmel (1986) Statistical Software
 * Newsletter 12:10-17.
 */

import { requireCount } from '../distributions/binomial.ts';
import type { Tails } from '../distributions/tails.ts';
import { noneAbove, noneBelow, requireNumber } from '../distributions/tails.ts';

/** Beyond this the number of patterns, 2^n, leaves the range of a double. */
const mostScores = 1000;

function requireCountable(differences: number): void {
  if (differences > mostScores) throw new RangeError('Sign patterns are counted for at most 1000 differences.');
}

/**
 * Shares of the sign patterns whose sum is 0, 1, …, `limit`. `scores` are whole numbers: ranks, or doubled midranks when there are ties.
 * Work: number of scores × limit.
 */
export function signedSumShares(scores: ArrayLike<number>, limit: number): Float64Array {
  requireCountable(scores.length);
  const patterns = new Float64Array(limit + 1);
  patterns[0] = 1;
  let reached = 0;
  for (let i = 0; i < scores.length; i++) {
    const score = scores[i] as number;
    reached = Math.min(limit, reached + score);
    for (let sum = reached; sum >= score; sum--) patterns[sum] = (patterns[sum] as number) + (patterns[sum - score] as number);
  }
  const all = 2 ** scores.length;
  return patterns.map((count) => count / all);
}

/** Share of the sign patterns whose sum is at most `limit`. */
export function shareOfSumsUpTo(scores: ArrayLike<number>, limit: number): number {
  return limit < 0 ? 0 : signedSumShares(scores, limit).reduce((sum, share) => sum + share, 0);
}

function ranksTo(n: number): Float64Array {
  return Float64Array.from({ length: n }, (_, i) => i + 1);
}

/** P(V <= v) and P(V > v) for n differences without ties. */
export function signedRankTails(v: number, n: number): Tails {
  requireNumber(v, 'A sum of ranks');
  requireCount(n, 'The number of differences');
  const greatest = (n * (n + 1)) / 2;
  const whole = Math.floor(v);
  if (whole < 0) return noneBelow;
  if (whole >= greatest) return noneAbove;
  requireCountable(n);
  // The distribution is symmetric, so the smaller tail serves for both sides.
  const lowerIsSmall = whole < greatest / 2;
  const small = shareOfSumsUpTo(ranksTo(n), lowerIsSmall ? whole : greatest - whole - 1);
  const [lower, upper] = lowerIsSmall ? [small, 1 - small] : [1 - small, small];
  return { lower, upper, logLower: Math.log(lower), logUpper: Math.log(upper) };
}

/** Smallest v with P(V <= v) >= p, and P(V < v), for n differences without ties; 0 < p <= 1/2. */
export function signedRankQuantile(p: number, n: number): { readonly v: number; readonly below: number } {
  const shares = signedSumShares(ranksTo(n), Math.floor((n * (n + 1)) / 4));
  return smallestReaching(shares, p);
}

/** Smallest index whose running sum of shares reaches p, and the sum before it. Rounding must not push it one further. */
export function smallestReaching(shares: Float64Array, p: number): { readonly v: number; readonly below: number } {
  let below = 0;
  for (const [v, share] of shares.entries()) {
    if (below + share >= p * (1 - 1e-12)) return { v, below };
    below += share;
  }
  return { v: shares.length - 1, below: below - (shares.at(-1) ?? 0) };
}
