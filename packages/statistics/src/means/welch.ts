/**
 * Two independent groups by Welch's t test: the variances need not be equal. Estimate: mean of the first minus mean of the second.
 * df after Welch-Satterthwaite, fractional. Two-sided.
 * Source: Welch (1947) Biometrika 34:28-35; Satterthwaite (1946) Biometrics Bulletin 2:110-114.
 */

import { computableScale } from '../description/computable-scale.ts';
import type { Moments } from '../description/moments.ts';
import { moments } from '../description/moments.ts';
import { tMultiplier } from '../distributions/student-t.ts';
import type { NotEstimable, TestedEstimate } from '../result.ts';
import { addLeftOut, notEstimable, reasons, requireLevel, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { cleanSample } from '../samples.ts';
import { percentText, tFigures } from '../test-figures.ts';

export interface MeanDifference extends TestedEstimate {
  readonly groupSizes: readonly [number, number];
  readonly groupMeans: readonly [number, number];
  readonly se: number;
}

/** Needs two values in each group and some variance in at least one. */
export function welchTest(first: ArrayLike<Observation>, second: ArrayLike<Observation>, level = 0.95): MeanDifference | NotEstimable {
  requireLevel(level);
  const samples = [cleanSample(first), cleanSample(second)] as const;
  const basis = { n: samples[0].n + samples[1].n, leftOut: addLeftOut(samples[0].leftOut, samples[1].leftOut) };
  if (samples.some((sample) => sample.n === 0)) return notEstimable(reasons.noComparison, basis);
  const scaled = computableScale([samples[0].values, samples[1].values]);
  if (scaled === 'too large') return notEstimable(reasons.tooLarge, basis);
  const { factor } = scaled;
  const [one, two] = scaled.samples.map(moments) as [Moments, Moments];
  const difference = one.mean - two.mean;
  if (Math.min(one.n, two.n) < 2) return notEstimable('a group has fewer than two values', basis, difference * factor);
  const a = one.sumOfSquares / (one.n - 1) / one.n;
  const b = two.sumOfSquares / (two.n - 1) / two.n;
  if (a + b === 0) return notEstimable('all values equal within each group', basis, difference * factor);
  const se = Math.sqrt(a + b);
  const shareOfFirst = a / (a + b);
  const df = 1 / (shareOfFirst ** 2 / (one.n - 1) + (1 - shareOfFirst) ** 2 / (two.n - 1));
  const reach = tMultiplier(level, df) * se * factor;
  const estimate = difference * factor;
  return {
    kind: 'estimate',
    estimate,
    interval: { lower: estimate - reach, upper: estimate + reach, level },
    test: tFigures(difference / se, df),
    groupSizes: [one.n, two.n],
    groupMeans: [one.mean * factor, two.mean * factor],
    se: se * factor,
    ...basis,
    method: `Difference of two means (first minus second) with ${percentText(level)} interval and Welch t test (two-sided, unequal variances).`,
    failedAssumptions: verySmallSample(Math.min(one.n, two.n)),
  };
}
