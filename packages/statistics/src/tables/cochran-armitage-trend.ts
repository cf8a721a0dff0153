/**
 * Trend of a proportion over ordered groups: Cochran-Armitage test without continuity correction (R's prop.trend.test).
 * Source: Armitage (1955) Biometrics 11:375-386; Agresti (2002) Categorical Data Analysis, 2nd ed., section 5.3.5.
 */

import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons } from '../result.ts';
import type { EventCount } from '../proportions/counts.ts';
import { requireEventCount } from '../proportions/counts.ts';
import { chiSquareFigures } from '../test-figures.ts';

export interface TrendTest extends TestResult {
  /** Sign of the change of the proportion with the score: 1 rising, -1 falling, 0 level. */
  readonly direction: -1 | 0 | 1;
}

/** `scores` place the groups on a scale; 1, 2, 3, … when not given. Empty groups count for nothing. */
export function cochranArmitageTrend(
  groups: readonly EventCount[],
  scores: readonly number[] = groups.map((_, i) => i + 1),
): TrendTest | NotEstimable {
  groups.forEach(requireEventCount);
  if (scores.length !== groups.length || !scores.every(Number.isFinite)) throw new RangeError('Each group needs a finite score.');
  const total = groups.reduce((sum, group) => sum + group.total, 0);
  const events = groups.reduce((sum, group) => sum + group.events, 0);
  const basis = { n: total, leftOut: nothingLeftOut };
  if (total === 0) return notEstimable(reasons.noData, basis);
  const mean = groups.reduce((sum, group, i) => sum + group.total * (scores[i] as number), 0) / total;
  const spread = groups.reduce((sum, group, i) => sum + group.total * ((scores[i] as number) - mean) ** 2, 0);
  if (events === 0 || events === total || spread === 0) return notEstimable(reasons.noComparison, basis);
  const share = events / total;
  const moved = groups.reduce((sum, group, i) => sum + (group.events - group.total * share) * ((scores[i] as number) - mean), 0);
  return {
    kind: 'test',
    ...basis,
    ...chiSquareFigures((moved * moved) / (share * (1 - share) * spread), 1),
    method: 'Cochran-Armitage test of trend in proportions over ordered groups, without continuity correction (two-sided).',
    failedAssumptions: Math.min(events, total - events) < 5 ? ['fewer than 5 people with, or without, the event'] : [],
    direction: Math.sign(moved) as -1 | 0 | 1,
  };
}
