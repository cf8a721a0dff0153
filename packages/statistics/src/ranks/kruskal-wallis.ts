/**
 * Kruskal-Wallis test of two or more groups: H with the tie divisor 1 - sum(t³ - t)/(N³ - N), chi-square with k - 1 df.
 * Effect sizes: epsilon² = H/(N - 1), eta²(H) = (H - k + 1)/(N - k).
 * Sources: Kruskal & Wallis (1952) Journal of the American Statistical Association 47:583-621; Tomczak & Tomczak (2014) Trends in Sport
 * Sciences 1:19-25 (effect sizes).
 */

import { chiSquareTails } from '../distributions/chi-square.ts';
import type { Group, GroupSetAside } from '../groups/groups.ts';
import { comparableGroups, groupCautions } from '../groups/groups.ts';
import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable, reasons } from '../result.ts';
import { rankedGroups } from './ranked-groups.ts';
import { tieTerm } from './midranks.ts';

export interface KruskalWallis extends TestResult {
  readonly epsilonSquared: number;
  readonly etaSquared: number;
  readonly groups: readonly { readonly name: string; readonly n: number; readonly meanRank: number }[];
  readonly setAside: readonly GroupSetAside[];
}

/** Two or more groups with at least one value, one of them with two; empty groups are set aside and named. */
export function kruskalWallisTest(given: readonly Group[]): KruskalWallis | NotEstimable {
  const compared = comparableGroups(given, 1);
  const { basis, setAside } = compared;
  const k = compared.groups.length;
  if (k < 2) return notEstimable(reasons.noComparison, basis);
  const { groups, tieSizes } = rankedGroups(compared.groups);
  const n = basis.n;
  if (n === k) return notEstimable('every group has a single value', basis);
  if (tieSizes[0] === n) return notEstimable(reasons.allEqual, basis);
  const middle = (n + 1) / 2;
  const uncorrected = (12 / (n * (n + 1))) * groups.reduce((sum, group) => sum + group.n * (group.meanRank - middle) ** 2, 0);
  const h = uncorrected / (1 - tieTerm(tieSizes) / (n ** 3 - n));
  return {
    kind: 'test',
    ...basis,
    statisticName: 'H',
    statistic: h,
    df: [k - 1],
    p: chiSquareTails(h, k - 1).upper,
    epsilonSquared: h / (n - 1),
    etaSquared: (h - k + 1) / (n - k),
    groups,
    setAside,
    method: 'Kruskal-Wallis test (tie-corrected, chi-square approximation).',
    failedAssumptions: groupCautions(compared),
  };
}
