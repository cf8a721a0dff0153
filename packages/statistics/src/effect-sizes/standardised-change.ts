/**
 * Change from baseline in units of a standard deviation. The standardised response mean (SRM, also dz) divides by the SD of the changes
 * and so grows with the correlation of the two visits; the baseline effect size divides by the SD at baseline. They are not
 * interchangeable. Interval of the SRM from the noncentral t; gz is the SRM with Hedges' small-sample factor.
 * Sources: Liang, Fossel & Larson (1990) Medical Care 28:632-642 (SRM); Kazis, Anderson & Meenan (1989) Medical Care 27:S178-S189
 * (baseline effect size); Hedges (1981); Steiger & Fouladi (1997).
 */

import { computableScale } from '../description/computable-scale.ts';
import type { Moments } from '../description/moments.ts';
import { moments, sampleSd } from '../description/moments.ts';
import type { Estimate, Figure, Interval, NotEstimable } from '../result.ts';
import { figure, noFigure, notEstimable, reasons, requireLevel, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { changes, cleanPairs, defaultResolution } from '../samples.ts';
import { percentText } from '../test-figures.ts';
import { noncentralInterval, scaledInterval } from './noncentral-interval.ts';
import { smallSampleFactor } from './small-sample-factor.ts';

/** `estimate` and `interval` are the SRM. */
export interface StandardisedChange extends Estimate {
  readonly corrected: Figure<{ readonly estimate: number; readonly interval: Interval }>;
  /** Mean change over the SD at baseline. */
  readonly baselineEffectSize: Figure;
  /** In the unit of the data. */
  readonly sdOfChange: number;
}

/** Needs two complete pairs whose changes differ at the instrument's resolution. */
export function standardisedChange(
  baseline: ArrayLike<Observation>,
  followUp: ArrayLike<Observation>,
  resolution: number = defaultResolution,
  level = 0.95,
): StandardisedChange | NotEstimable {
  requireLevel(level);
  const pairs = cleanPairs(baseline, followUp);
  const { n, leftOut } = pairs;
  const basis = { n, leftOut };
  if (n === 0) return notEstimable(reasons.noData, basis);
  const scaled = computableScale([changes(pairs, resolution), pairs.first]);
  if (scaled === 'too large') return notEstimable(reasons.tooLarge, basis);
  if (n === 1) return notEstimable(reasons.singleValue, basis);
  const [change, before] = scaled.samples.map(moments) as [Moments, Moments];
  if (change.least === change.greatest) return notEstimable(reasons.allEqual, basis);
  const sd = sampleSd(change);
  const srm = change.mean / sd;
  const interval = noncentralInterval(srm * Math.sqrt(n), n - 1, 1 / Math.sqrt(n), level);
  if (interval === undefined) return notEstimable(reasons.tooSmall, basis);
  return {
    kind: 'estimate',
    ...basis,
    estimate: srm,
    interval,
    corrected: n === 2 ? noFigure('the small-sample factor needs three pairs') : corrected(srm, interval, n - 1),
    baselineEffectSize: baselineEffectSize(change.mean, before),
    sdOfChange: sd * scaled.factor,
    method: `Standardised response mean (mean change over SD of change) with ${percentText(level)} interval from the noncentral t.`,
    failedAssumptions: verySmallSample(n),
  };
}

function baselineEffectSize(meanChange: number, before: Moments): Figure {
  if (before.least === before.greatest) return noFigure('all values equal at baseline');
  const size = meanChange / sampleSd(before);
  return Number.isFinite(size) ? figure(size) : noFigure(reasons.tooSmall);
}

function corrected(srm: number, interval: Interval, df: number): Figure<{ estimate: number; interval: Interval }> {
  const factor = smallSampleFactor(df);
  return figure({ estimate: factor * srm, interval: scaledInterval(interval, factor) });
}
