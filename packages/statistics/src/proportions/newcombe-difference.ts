/**
 * Difference of two independent proportions (first minus second) with the interval built from their Wilson intervals.
 * Source: method 10 (hybrid score, no continuity correction) of Newcombe (1998) Stat Med 17:873-890.
 */

import type { EstimateResult } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons, requireLevel, verySmallSample } from '../result.ts';
import { percentText } from '../test-figures.ts';
import type { EventCount } from './counts.ts';
import { requireEventCount } from './counts.ts';
import { wilsonLimits } from './wilson-proportion.ts';

export function newcombeDifference(first: EventCount, second: EventCount, level = 0.95): EstimateResult {
  requireEventCount(first);
  requireEventCount(second);
  requireLevel(level);
  const basis = { n: first.total + second.total, leftOut: nothingLeftOut };
  if (first.total === 0 || second.total === 0) return notEstimable(reasons.noComparison, basis);
  const p1 = first.events / first.total;
  const p2 = second.events / second.total;
  const limits1 = wilsonLimits(first, level);
  const limits2 = wilsonLimits(second, level);
  const difference = p1 - p2;
  return {
    kind: 'estimate',
    ...basis,
    estimate: difference,
    interval: {
      lower: difference - Math.hypot(p1 - limits1.lower, limits2.upper - p2),
      upper: difference + Math.hypot(limits1.upper - p1, p2 - limits2.lower),
      level,
    },
    method: `Difference of two proportions with Newcombe's hybrid score interval without continuity correction (two-sided, ${percentText(level)}).`,
    failedAssumptions: verySmallSample(Math.min(first.total, second.total)),
  };
}
