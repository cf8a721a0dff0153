/**
 * Do the groups' spreads differ? Analysis of variance of the distances from the group's median.
 * Source: Brown & Forsythe (1974) Journal of the American Statistical Association 69:364-367.
 */

import { quantile } from '../description/quantile.ts';
import { comparableGroups, groupCautions } from '../groups/groups.ts';
import type { Group } from '../groups/groups.ts';
import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable } from '../result.ts';
import { oneWayAnova } from './one-way.ts';

/** Two or more groups of at least two values; smaller groups are set aside and named. */
export function brownForsytheTest(given: readonly Group[]): TestResult | NotEstimable {
  const compared = comparableGroups(given, 2);
  const distances = compared.groups.map(({ name, values }) => {
    const median = quantile(values, 0.5);
    return { name, values: values.map((value) => Math.abs(value - median)) };
  });
  const anova = oneWayAnova(distances);
  if (anova.kind === 'not-estimable') return notEstimable(anova.reason, compared.basis);
  const { statisticName, statistic, df, p } = anova;
  return {
    kind: 'test',
    ...compared.basis,
    statisticName,
    statistic,
    df,
    p,
    method: 'Brown-Forsythe test of equal spread (analysis of variance of the distances from the group medians).',
    failedAssumptions: groupCautions(compared),
  };
}
