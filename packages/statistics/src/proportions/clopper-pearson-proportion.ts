/**
 * Share of people with an event and its exact interval, which holds its level for every true share (and is wider than Wilson's for it).
 * Source: Clopper & Pearson (1934) Biometrika 26:404-413, by quantiles of the beta distribution.
 */

import { betaQuantile } from '../distributions/beta.ts';
import type { EstimateResult } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons, requireLevel, verySmallSample } from '../result.ts';
import { percentText } from '../test-figures.ts';
import { requireEventCount } from './counts.ts';

export function clopperPearsonProportion(events: number, total: number, level = 0.95): EstimateResult {
  requireEventCount({ events, total });
  requireLevel(level);
  const basis = { n: total, leftOut: nothingLeftOut };
  if (total === 0) return notEstimable(reasons.noData, basis);
  const tail = (1 - level) / 2;
  return {
    kind: 'estimate',
    ...basis,
    estimate: events / total,
    interval: {
      lower: events === 0 ? 0 : betaQuantile(tail, events, total - events + 1),
      upper: events === total ? 1 : betaQuantile(tail, events + 1, total - events, 'upper'),
      level,
    },
    method: `Proportion with exact interval of Clopper and Pearson (two-sided, at least ${percentText(level)}).`,
    failedAssumptions: verySmallSample(total),
  };
}
