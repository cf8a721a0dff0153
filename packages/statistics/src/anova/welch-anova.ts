/**
 * One-way analysis of variance without equal variances. w = n/s², m = sum w m_i/W, A = sum w (m_i - m)²/(k - 1),
 * L = sum (1 - w/W)²/(n - 1), F = A/(1 + 2 (k - 2) L/(k² - 1)), df = k - 1 and (k² - 1)/(3 L).
 * Source: Welch (1951) Biometrika 38:330-336.
 */

import { centredMoments, comparableGroups, groupCautions } from '../groups/groups.ts';
import type { Group, GroupSetAside } from '../groups/groups.ts';
import type { GroupSummary } from '../groups/group-summary.ts';
import { groupSummaries } from '../groups/group-summary.ts';
import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable, reasons } from '../result.ts';
import { fFigures } from '../test-figures.ts';

export interface WelchAnova extends TestResult {
  readonly groups: readonly GroupSummary[];
  readonly setAside: readonly GroupSetAside[];
}

const withoutVariance = (values: Float64Array): string | undefined =>
  values.every((value) => value === values[0]) ? 'all values equal' : undefined;

/** Two or more groups of at least two values, each with some variance; the others are set aside and named. */
export function welchAnova(given: readonly Group[]): WelchAnova | NotEstimable {
  const compared = comparableGroups(given, 2, withoutVariance);
  const { groups, setAside, basis } = compared;
  const k = groups.length;
  if (k < 2) return notEstimable(reasons.noComparison, basis);
  const centred = centredMoments(groups);
  if (centred === 'too large') return notEstimable(reasons.tooLarge, basis);
  const { of } = centred;
  // Variances of the group means, taken relative to the smallest so that their reciprocals cannot overflow.
  const variances = of.map((group) => group.sumOfSquares / (group.n - 1) / group.n);
  const smallest = Math.min(...variances);
  if (smallest === 0) return notEstimable('the values of a group are too close together to compute with', basis);
  const weights = variances.map((variance) => smallest / variance);
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const centre = of.reduce((sum, group, i) => sum + group.mean * (weights[i] as number), 0) / total;
  const between = of.reduce((sum, group, i) => sum + ((weights[i] as number) * (group.mean - centre) ** 2) / smallest, 0) / (k - 1);
  const lambda = of.reduce((sum, group, i) => sum + (1 - (weights[i] as number) / total) ** 2 / (group.n - 1), 0);
  return {
    kind: 'test',
    ...basis,
    ...fFigures(between / (1 + (2 * (k - 2) * lambda) / (k * k - 1)), k - 1, (k * k - 1) / (3 * lambda)),
    groups: groupSummaries(groups, centred),
    setAside,
    method: "Welch's one-way analysis of variance (variances may differ).",
    failedAssumptions: groupCautions(compared),
  };
}
