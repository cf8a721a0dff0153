/** Student's t. Degrees of freedom may be fractional (Welch) or infinite (normal). */

import { findRootOfIncreasing } from '../root.ts';
import { betaLogitQuantile, incompleteBeta } from './incomplete-beta.ts';
import { logBeta } from './log-gamma.ts';
import { normalQuantile, normalTails } from './normal.ts';
import type { Tail, Tails } from './tails.ts';
import { noneAbove, noneBelow, requireNumber, requirePositive, requireProbability, tailsFrom } from './tails.ts';

/** From here on the deviate below is exact to the last digits in every tail that can be printed, and the beta fraction is not. */
const manyDegrees = 1e5;

export function tTails(t: number, df: number): Tails {
  requireNumber(t, 'A t value');
  requirePositive(df, 'A number of degrees of freedom');
  if (t === Infinity) return noneAbove;
  if (t === -Infinity) return noneBelow;
  if (df === Infinity) return normalTails(t);
  if (df >= manyDegrees) return normalTails(deviateOfT(t, df));
  const size = Math.abs(t);
  const both = twoSided(size, df);
  const log = both.logLower - Math.LN2;
  const small = both.lower / 2;
  const rest = 1 - small;
  const logRest = Math.log1p(-small);
  return t > 0
    ? { lower: rest, upper: small, logLower: logRest, logUpper: log }
    : { lower: small, upper: rest, logLower: log, logUpper: logRest };
}

/** `lower` is P(|T| > size). */
function twoSided(size: number, df: number): Tails {
  const ratio = size * (size / df);
  if (ratio < 1e290) return incompleteBeta(df / 2, 0.5, 1 / (1 + ratio), ratio / (1 + ratio));
  // t² does not fit a double: the first term of the series in df/t² is then exact.
  return tailsFrom('lower', (df / 2) * (Math.log(df) - 2 * Math.log(size)) - Math.log(df / 2) - logBeta(df / 2, 0.5));
}

/** Two-sided p of a t value. */
export function tTwoSided(t: number, df: number): number {
  const { lower, upper } = tTails(t, df);
  return Math.min(1, 2 * Math.min(lower, upper));
}

/** Normal deviate with the same tail as t: Hill (1970), Communications of the ACM 13:617 (algorithm 395). */
function deviateOfT(t: number, df: number): number {
  const a = df - 0.5;
  const b = 48 * a * a;
  const w2 = a * Math.log1p(Math.min(t * (t / df), Number.MAX_VALUE));
  const w = Math.sqrt(w2);
  const second = (((4 * w2 + 33) * w2 + 240) * w2 + 855) / (10 * b * (b + 0.8 * w2 * w2 + 100));
  return Math.sign(t) * w * (1 + (w2 + 3) / b - second);
}

/** The t with P(T <= t) = p, or P(T > t) = p for the upper tail. */
export function tQuantile(p: number, df: number, tail: Tail = 'lower'): number {
  requireProbability(p);
  requirePositive(df, 'A number of degrees of freedom');
  if (tail === 'upper') return 0 - tQuantile(p, df);
  if (df === Infinity) return normalQuantile(p);
  if (p === 0) return -Infinity;
  if (p === 1) return Infinity;
  if (p === 0.5) return 0;
  const smaller = Math.min(p, 1 - p);
  return Math.sign(p - 0.5) * upperQuantile(smaller, df);
}

function upperQuantile(smaller: number, df: number): number {
  if (df >= manyDegrees) {
    const target = Math.log(smaller);
    return findRootOfIncreasing((t) => target - tTails(t, df).logUpper, normalQuantile(smaller, 'upper'), 1e-3);
  }
  // x = df/(df + t²) has the two-sided probability as its lower tail.
  const logit =
    smaller < 0.25 ? betaLogitQuantile(2 * smaller, df / 2, 0.5, 'lower') : betaLogitQuantile(1 - 2 * smaller, df / 2, 0.5, 'upper');
  return Math.sqrt(df) * Math.exp(-logit / 2);
}

/** Multiplier of the standard error in a two-sided interval of that level. */
export function tMultiplier(level: number, df: number): number {
  return tQuantile((1 - level) / 2, df, 'upper');
}
