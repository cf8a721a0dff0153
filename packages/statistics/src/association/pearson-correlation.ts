/**
 * Pearson's correlation with the interval on Fisher's z scale (standard error 1/sqrt(n - 3)) and the t test of no correlation.
 * Source: Fisher (1921) Metron 1:3-32. Columns are centred and scaled first, so that values of any size keep their digits.
 */

import { normalMultiplier } from '../distributions/normal.ts';
import { centredColumn } from '../linear-algebra/centred-column.ts';
import type { Interval, TestedEstimateResult } from '../result.ts';
import { notEstimable, reasons, requireLevel, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { cleanPairs } from '../samples.ts';
import { percentText, tFigures } from '../test-figures.ts';

/** Why no correlation is given for so few pairs, if so. */
export function tooFewPairs(n: number): string | undefined {
  if (n === 0) return reasons.noData;
  return n < 4 ? `n = ${n}: a correlation needs at least 4 pairs` : undefined;
}

export const doesNotVary = 'one of the two measures does not vary';

/** Correlation of two columns of one length, or the reason why there is none. */
export function correlationOf(first: Float64Array, second: Float64Array): number | string {
  const tooFew = tooFewPairs(first.length);
  if (tooFew !== undefined) return tooFew;
  const x = centredColumn(first, true);
  const y = centredColumn(second, true);
  if (x.norm === 0 || y.norm === 0) return doesNotVary;
  if (!Number.isFinite(x.norm + y.norm)) return reasons.tooLarge;
  const product = x.unit.reduce((sum, value, i) => sum + value * (y.unit[i] as number), 0);
  return Math.min(1, Math.max(-1, product));
}

/** Interval of a correlation on the scale atanh, where its standard error is given. */
export function fisherInterval(correlation: number, standardError: number, level: number): Interval {
  const centre = Math.atanh(correlation);
  const half = normalMultiplier(level) * standardError;
  return { lower: Math.tanh(centre - half), upper: Math.tanh(centre + half), level };
}

/** Within rounding of plus or minus one the points lie on a line: the z scale has no place for it, and t no bounds. */
export function isPerfect(correlation: number): boolean {
  return 1 - Math.abs(correlation) < 8 * Number.EPSILON;
}

/** t of a correlation with n - 2 degrees of freedom. */
export function tOfCorrelation(correlation: number, n: number): number {
  return correlation * Math.sqrt((n - 2) / ((1 - correlation) * (1 + correlation)));
}

export function pearsonCorrelation(x: ArrayLike<Observation>, y: ArrayLike<Observation>, level = 0.95): TestedEstimateResult {
  requireLevel(level);
  const { first, second, n, leftOut } = cleanPairs(x, y);
  const correlation = correlationOf(first, second);
  if (typeof correlation === 'string') return notEstimable(correlation, { n, leftOut });
  if (isPerfect(correlation)) return notEstimable('the pairs lie exactly on a line: no interval', { n, leftOut }, Math.sign(correlation));
  return {
    kind: 'estimate',
    n,
    leftOut,
    estimate: correlation,
    interval: fisherInterval(correlation, 1 / Math.sqrt(n - 3), level),
    test: tFigures(tOfCorrelation(correlation, n), n - 2),
    method: `Pearson correlation with interval by Fisher's z transformation and t test (two-sided, ${percentText(level)}).`,
    failedAssumptions: verySmallSample(n),
  };
}
