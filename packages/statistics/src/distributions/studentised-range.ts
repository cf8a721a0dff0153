/** Studentised range: the largest minus the smallest of k means over their estimated standard error (Tukey 1953). */

import { findRootOfIncreasing } from '../root.ts';
import { chiDensity } from './chi-density.ts';
import { halfLogTwoPi } from './log-gamma.ts';
import { logIntegral } from './log-concave-integral.ts';
import { normalLogLower, normalUpper } from './normal.ts';
import { tQuantile } from './student-t.ts';
import type { Tail, Tails } from './tails.ts';
import { noneAbove, noneBelow, requireNumber, requireProbability, tailsFrom } from './tails.ts';

/** From here on the standard error is taken as known. */
const knownError = 1e9;

function requireGroups(groups: number): void {
  if (!(Number.isInteger(groups) && groups >= 2)) throw new RangeError('A range needs at least two groups.');
}

/**
 * ln P(range of k standard normals > w). With z the largest value, the others all lie below z but not all above z - w:
 * k ∫ φ(z) [Φ(z)^(k-1) - (Φ(z) - Φ(z - w))^(k-1)] dz, a sum of positive parts, so the tail keeps its digits.
 */
function logRangeUpper(w: number, groups: number): number {
  const others = groups - 1;
  const log = (z: number) => {
    const below = normalLogLower(z);
    const logShare = Math.min(0, normalLogLower(z - w) - below);
    // ln(1 - (1 - share)^others); a share below the last digit of 1 is kept on the log scale, where it cannot vanish.
    const logNotAllAbove = logShare < -40 ? Math.log(others) + logShare : Math.log(-Math.expm1(others * Math.log1p(-Math.exp(logShare))));
    return -(z * z) / 2 + others * below + logNotAllAbove;
  };
  return Math.min(0, Math.log(groups) - halfLogTwoPi + logIntegral(log, -20, w + 20));
}

/** ln P(range of k standard normals <= w): k ∫ φ(z) [Φ(z) - Φ(z - w)]^(k-1) dz. */
function logRangeLower(w: number, groups: number): number {
  const log = (z: number) => {
    const between = z > w ? normalUpper(z - w) - normalUpper(z) : normalUpper(-z) - normalUpper(w - z);
    return -(z * z) / 2 + (groups - 1) * Math.log(between);
  };
  return Math.min(0, Math.log(groups) - halfLogTwoPi + logIntegral(log, -20, w + 20));
}

/** Bonferroni's bound: the exact tail lies under it and falls off at the same place. */
function roughLogRangeUpper(w: number, groups: number): number {
  return Math.min(0, Math.log(groups * (groups - 1)) + normalLogLower(-w / Math.SQRT2));
}

interface LogRange {
  readonly exact: (w: number, groups: number) => number;
  readonly rough: (w: number, groups: number) => number;
}

/** Beyond this, squares leave the range of a double. */
const largest = 1e150;

/** df >= 1, or Infinity for the range of standard normals. A finite q beyond 1e150 has the tails of 1e150, where P(range > q) < 1e-149. */
export function studentisedRangeTails(q: number, groups: number, df: number): Tails {
  requireNumber(q, 'A studentised range');
  requireGroups(groups);
  if (!(df >= 1)) throw new RangeError('The studentised range is computed for 1 degree of freedom or more.');
  if (q <= 0) return noneBelow;
  if (q === Infinity) return noneAbove;
  const within = Math.min(q, largest);
  const logOf = (range: LogRange) => {
    if (df >= knownError) return range.exact(within, groups);
    const density = chiDensity(df);
    const product = (log: (w: number, groups: number) => number) => (s: number) => density.log(s) + log(within * s, groups);
    return logIntegral(product(range.exact), density.from, density.to, product(range.rough));
  };
  const upper = tailsFrom('upper', logOf({ exact: logRangeUpper, rough: roughLogRangeUpper }));
  return upper.lower > 0.1 ? upper : tailsFrom('lower', logOf({ exact: logRangeLower, rough: logRangeLower }));
}

/** The q with P(range <= q) = p, or P(range > q) = p for the upper tail. */
export function studentisedRangeQuantile(p: number, groups: number, df: number, tail: Tail = 'lower'): number {
  requireProbability(p);
  requireGroups(groups);
  if (p === 0 || p === 1) return (p === 0) === (tail === 'lower') ? 0 : Infinity;
  const direct: Tail = p <= 0.5 === (tail === 'lower') ? 'lower' : 'upper';
  const target = Math.log(Math.min(p, 1 - p));
  // Bonferroni's t is close above; the search is on the logarithms of q and of the smaller tail.
  const start = Math.SQRT2 * tQuantile(Math.min(p, 1 - p) / (groups * (groups - 1)), df, 'upper');
  const logQ = findRootOfIncreasing(
    (log) => {
      const tails = studentisedRangeTails(Math.exp(log), groups, df);
      return direct === 'lower' ? tails.logLower - target : target - tails.logUpper;
    },
    Math.log(direct === 'lower' ? 1 : start),
    0.03,
  );
  return Math.exp(logQ);
}
