/**
 * Share of people with an event and its Wilson score interval, without continuity correction.
 * Source: Wilson (1927) J Am Stat Assoc 22:209-212; method 3 of Newcombe (1998) Stat Med 17:857-872.
 */

import { normalMultiplier } from '../distributions/normal.ts';
import type { EstimateResult, Interval } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons, requireLevel, verySmallSample } from '../result.ts';
import { percentText } from '../test-figures.ts';
import type { EventCount } from './counts.ts';
import { requireEventCount } from './counts.ts';

/** Limits alone, for `total` of at least 1. At no event the lower limit is 0 exactly, at all events the upper is 1. */
export function wilsonLimits({ events, total }: EventCount, level: number): Interval {
  if (!(total >= 1)) throw new RangeError('A proportion needs at least one person.');
  const z = normalMultiplier(level);
  const share = events / total;
  const widening = (z * z) / total;
  const centre = share + widening / 2;
  const half = z * Math.sqrt((share * (1 - share)) / total + widening / (4 * total));
  return {
    lower: events === 0 ? 0 : (centre - half) / (1 + widening),
    upper: events === total ? 1 : (centre + half) / (1 + widening),
    level,
  };
}

export function wilsonProportion(events: number, total: number, level = 0.95): EstimateResult {
  requireEventCount({ events, total });
  requireLevel(level);
  const basis = { n: total, leftOut: nothingLeftOut };
  if (total === 0) return notEstimable(reasons.noData, basis);
  return {
    kind: 'estimate',
    ...basis,
    estimate: events / total,
    interval: wilsonLimits({ events, total }, level),
    method: `Proportion with Wilson score interval without continuity correction (two-sided, ${percentText(level)}).`,
    failedAssumptions: verySmallSample(total),
  };
}
