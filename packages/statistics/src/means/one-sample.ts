/**
 * One sample against a fixed value: mean, t interval, t test. SE = SD/sqrt n, df = n - 1, all two-sided.
 * Source: Student (1908) Biometrika 6:1-25, in the sample form (n - 1).
 */

import { computableScale } from '../description/computable-scale.ts';
import { moments, sampleSd } from '../description/moments.ts';
import { tMultiplier } from '../distributions/student-t.ts';
import type { Estimate, NotEstimable, TestedEstimate } from '../result.ts';
import { notEstimable, reasons, requireLevel, verySmallSample } from '../result.ts';
import type { Observation, Sample } from '../samples.ts';
import { cleanSample } from '../samples.ts';
import { percentText, tFigures } from '../test-figures.ts';

/** SD and SE in the unit of the data. */
export interface Spread {
  readonly sd: number;
  readonly se: number;
}

export type MeanEstimate = Estimate & Spread;
export type OneSampleTest = TestedEstimate & Spread;

/** The figures of a cleaned sample, tested against `expected`, or why there are none; callers add the sentence that names the method. */
export function meanFigures(sample: Sample, level: number, expected = 0): Omit<OneSampleTest, 'method'> | NotEstimable {
  requireLevel(level);
  const { n, leftOut } = sample;
  if (n === 0) return notEstimable(reasons.noData, sample);
  const scaled = computableScale([sample.values]);
  if (scaled === 'too large') return notEstimable(reasons.tooLarge, sample);
  const { factor } = scaled;
  const of = moments(scaled.samples[0] as Float64Array);
  const mean = of.mean * factor;
  if (n === 1) return notEstimable(reasons.singleValue, sample, mean);
  if (of.least === of.greatest) return notEstimable(reasons.allEqual, sample, mean);
  const sd = sampleSd(of);
  const se = sd / Math.sqrt(n);
  const t = (of.mean - expected / factor) / se;
  if (!Number.isFinite(t)) return notEstimable(reasons.tooSmall, sample, mean);
  const reach = tMultiplier(level, n - 1) * se * factor;
  return {
    kind: 'estimate',
    estimate: mean,
    interval: { lower: mean - reach, upper: mean + reach, level },
    sd: sd * factor,
    se: se * factor,
    test: tFigures(t, n - 1),
    n,
    leftOut,
    failedAssumptions: verySmallSample(n),
  };
}

/** Mean with its t interval. A single value or equal values give no interval, but their mean as `pointEstimate`. */
export function meanWithInterval(values: ArrayLike<Observation>, level = 0.95): MeanEstimate | NotEstimable {
  const figures = meanFigures(cleanSample(values), level);
  if (figures.kind === 'not-estimable') return figures;
  const { test: _againstZero, ...estimate } = figures;
  return { ...estimate, method: `Mean with ${percentText(level)} t interval (sample SD, n - 1 degrees of freedom).` };
}

/** Mean against `expected`: the estimate is the mean itself, the test asks whether it differs from `expected`. */
export function oneSampleTest(values: ArrayLike<Observation>, expected: number, level = 0.95): OneSampleTest | NotEstimable {
  if (!Number.isFinite(expected)) throw new RangeError('The value to test against is a finite number.');
  const figures = meanFigures(cleanSample(values), level, expected);
  if (figures.kind === 'not-estimable') return figures;
  return { ...figures, method: `One-sample t test against ${expected} (two-sided) and ${percentText(level)} t interval for the mean.` };
}
