/**
 * Difference of two groups in units of their pooled SD: Cohen's d and, corrected for small samples, Hedges' g = J d. Intervals from the
 * noncentral t. Positive when the first group's mean is the larger.
 * Sources: Hedges (1981) Journal of Educational Statistics 6:107-128; Steiger & Fouladi (1997) for the interval.
 */

import { computableScale } from '../description/computable-scale.ts';
import type { Moments } from '../description/moments.ts';
import { moments } from '../description/moments.ts';
import type { Estimate, Interval, NotEstimable } from '../result.ts';
import { addLeftOut, notEstimable, reasons, requireLevel, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { cleanSample } from '../samples.ts';
import { percentText } from '../test-figures.ts';
import { noncentralInterval, scaledInterval } from './noncentral-interval.ts';
import { smallSampleFactor } from './small-sample-factor.ts';

/** `estimate` and `interval` are Hedges' g. */
export interface StandardisedDifference extends Estimate {
  readonly cohenD: number;
  readonly cohenDInterval: Interval;
  readonly smallSampleFactor: number;
  /** In the unit of the data. */
  readonly pooledSd: number;
}

/** Needs a value in each group, three in all, and some variance. */
export function standardisedDifference(
  first: ArrayLike<Observation>,
  second: ArrayLike<Observation>,
  level = 0.95,
): StandardisedDifference | NotEstimable {
  requireLevel(level);
  const [one, two] = [cleanSample(first), cleanSample(second)];
  const basis = { n: one.n + two.n, leftOut: addLeftOut(one.leftOut, two.leftOut) };
  if (one.n === 0 || two.n === 0) return notEstimable(reasons.noComparison, basis);
  const df = basis.n - 2;
  if (df < 2) return notEstimable('too few values for a pooled SD', basis);
  const scaled = computableScale([one.values, two.values]);
  if (scaled === 'too large') return notEstimable(reasons.tooLarge, basis);
  const [a, b] = scaled.samples.map(moments) as [Moments, Moments];
  const pooledSd = Math.sqrt((a.sumOfSquares + b.sumOfSquares) / df);
  if (pooledSd === 0) return notEstimable('all values equal within each group', basis);
  const cohenD = (a.mean - b.mean) / pooledSd;
  const unit = Math.sqrt(1 / one.n + 1 / two.n);
  const cohenDInterval = noncentralInterval(cohenD / unit, df, unit, level);
  if (cohenDInterval === undefined) return notEstimable(reasons.tooSmall, basis);
  const factor = smallSampleFactor(df);
  return {
    kind: 'estimate',
    ...basis,
    estimate: factor * cohenD,
    interval: scaledInterval(cohenDInterval, factor),
    cohenD,
    cohenDInterval,
    smallSampleFactor: factor,
    pooledSd: pooledSd * scaled.factor,
    method: `Hedges' g (pooled SD, exact small-sample factor) with ${percentText(level)} interval from the noncentral t.`,
    failedAssumptions: verySmallSample(Math.min(one.n, two.n)),
  };
}
