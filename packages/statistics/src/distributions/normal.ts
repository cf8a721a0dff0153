/** Standard normal distribution, good to the last digit or two in both tails, also on the log scale. */

import { findRootOfIncreasing } from '../root.ts';
import type { Tail, Tails } from './tails.ts';
import { noneAbove, noneBelow, requireNumber, requireProbability } from './tails.ts';

/** z of a two-sided 95% interval. */
export const z95 = 1.959963984540054;

const inverseRootTwoPi = 0.3989422804014327;

/**
 * Chebyshev coefficients of (1 + x) exp(x²/2) P(X > x) in t = (x - 5)/(x + 5), x >= 0: the mapping of
 * Schonfelder (1978) and Shepherd & Laframboise (1981) for erfc. Computed to 45 digits with mpmath; the first is halved.
 */
const scaledTail = [
  0.4619742120721857, -0.06516520239491264, -0.005458781501136567, 0.01229619904556344, -0.006470872915703688, 0.0022407355224168305,
  -0.0005638623774651974, 9.984031082925812e-5, -9.849514843168493e-6, -4.032494233045217e-7, 2.99023962013034e-7, -3.032070748442814e-8,
  -4.617665713929027e-9, 1.3298288008382692e-9, 3.007242719019045e-11, -4.4299537255328156e-11, 1.3999857147018152e-12,
  1.4718957028912571e-12, -9.325953119165372e-14, -5.294681169067695e-14, 3.958188414414517e-15, 2.1048214642963194e-15,
  -1.345671286136144e-16, -9.097614914495833e-17,
] as const;
const highest = scaledTail.length - 1;

/** exp(x²/2) P(X > x) for x >= 0. */
function scaledUpper(x: number): number {
  const twice = 2 * ((x - 5) / (x + 5));
  let next = 0;
  let afterNext = 0;
  for (let i = highest; i > 0; i--) {
    const now = twice * next - afterNext + (scaledTail[i] as number);
    afterNext = next;
    next = now;
  }
  return ((twice / 2) * next - afterNext + scaledTail[0]) / (1 + x);
}

/** exp(-x²/2): the part of x with few digits is squared exactly (Cody 1969), so that the tail keeps its digits. */
function exponentialOfHalfSquare(x: number): number {
  const coarse = Math.trunc(x * 16) / 16;
  return Math.exp((-coarse * coarse) / 2) * Math.exp((-(x - coarse) * (x + coarse)) / 2);
}

export function normalDensity(x: number): number {
  requireNumber(x, 'A normal deviate');
  if (Math.abs(x) > 40) return 0;
  return inverseRootTwoPi * exponentialOfHalfSquare(Math.abs(x));
}

/** P(X > x) alone, for loops that need nothing else. */
export function normalUpper(x: number): number {
  requireNumber(x, 'A normal deviate');
  if (x === 0) return 0.5;
  const size = Math.abs(x);
  if (size > 40) return x > 0 ? 0 : 1;
  const small = scaledUpper(size) * exponentialOfHalfSquare(size);
  return x > 0 ? small : 1 - small;
}

/** ln P(X <= x) alone; finite as long as x² is. */
export function normalLogLower(x: number): number {
  if (x === -Infinity) return -Infinity;
  return x > 0 || Number.isNaN(x) ? Math.log1p(-normalUpper(x)) : (-x * x) / 2 + Math.log(scaledUpper(-x));
}

export function normalTails(x: number): Tails {
  requireNumber(x, 'A normal deviate');
  if (x === -Infinity) return noneBelow;
  if (x === Infinity) return noneAbove;
  return { lower: normalUpper(-x), upper: normalUpper(x), logLower: normalLogLower(x), logUpper: normalLogLower(-x) };
}

/** The x with P(X <= x) = p, or P(X > x) = p for the upper tail. -Infinity and Infinity at p = 0 and 1. */
export function normalQuantile(p: number, tail: Tail = 'lower'): number {
  requireProbability(p);
  if (tail === 'upper') return 0 - normalQuantile(p);
  if (p === 0) return -Infinity;
  if (p === 1) return Infinity;
  if (p === 0.5) return 0;
  if (p > 0.5) return 0 - normalQuantile(1 - p);
  const target = Math.log(p);
  // The tail behaves like exp(-x²/2), so its logarithm is nearly a parabola and the root is met in a few steps.
  const start = -Math.sqrt(Math.max(0, -2 * (target + Math.LN2)));
  return findRootOfIncreasing((x) => normalLogLower(x) - target, start, 0.25);
}

/** Multiplier of the standard error in a two-sided interval of that level. */
export function normalMultiplier(level: number): number {
  return normalQuantile((1 - level) / 2, 'upper');
}
