/**
 * Jonckheere-Terpstra test of a trend over ordered groups: J counts the pairs of different groups in which the later group's value is
 * the larger, ties by half; normal with tie-corrected variance, no continuity correction.
 * Sources: Jonckheere (1954) Biometrika 41:133-145; Terpstra (1952) Indagationes Mathematicae 14:327-333; variance with ties after
 * Kendall & Gibbons (1990) Rank Correlation Methods, 5th ed.
 */

import { normalUpper } from '../distributions/normal.ts';
import type { CleanGroup, Group, GroupSetAside } from '../groups/groups.ts';
import { comparableGroups, groupCautions } from '../groups/groups.ts';
import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable, reasons } from '../result.ts';
import type { RankedGroup } from './ranked-groups.ts';
import { rankedGroups } from './ranked-groups.ts';

export interface TrendOverGroups extends TestResult {
  /** Positive when values rise with the order of the groups. */
  readonly z: number;
  readonly expected: number;
  readonly variance: number;
  readonly setAside: readonly GroupSetAside[];
}

/** Pairs in which the value of `later` is the larger, ties by half. */
function wins(earlier: CleanGroup, later: CleanGroup): number {
  const { n, meanRank } = rankedGroups([earlier, later]).groups[1] as RankedGroup;
  return n * meanRank - (n * (n + 1)) / 2;
}

const sumOver = (sizes: readonly number[], term: (size: number) => number): number => sizes.reduce((sum, size) => sum + term(size), 0);

/** The groups in their order; two or more with at least one value each. Empty groups are set aside and named. */
export function jonckheereTest(given: readonly Group[]): TrendOverGroups | NotEstimable {
  const compared = comparableGroups(given, 1);
  const { groups, basis, setAside } = compared;
  if (groups.length < 2) return notEstimable(reasons.noComparison, basis);
  const n = basis.n;
  const { tieSizes } = rankedGroups(groups);
  if (tieSizes[0] === n) return notEstimable(reasons.allEqual, basis);
  const sizes = groups.map(({ values }) => values.length);
  const j = groups.reduce((sum, later, i) => sum + groups.slice(0, i).reduce((inner, earlier) => inner + wins(earlier, later), 0), 0);
  const expected = (n * n - sumOver(sizes, (size) => size * size)) / 4;
  const whole = (size: number): number => size * (size - 1) * (2 * size + 5);
  const triples = (size: number): number => size * (size - 1) * (size - 2);
  const doubles = (size: number): number => size * (size - 1);
  const variance =
    (whole(n) - sumOver(sizes, whole) - sumOver(tieSizes, whole)) / 72 +
    (n > 2 ? (sumOver(sizes, triples) * sumOver(tieSizes, triples)) / (36 * triples(n)) : 0) +
    (sumOver(sizes, doubles) * sumOver(tieSizes, doubles)) / (8 * doubles(n));
  const z = (j - expected) / Math.sqrt(variance);
  return {
    kind: 'test',
    ...basis,
    statisticName: 'J',
    statistic: j,
    df: [],
    p: 2 * normalUpper(Math.abs(z)),
    z,
    expected,
    variance,
    setAside,
    method: 'Jonckheere-Terpstra test of a trend over the ordered groups (two-sided, normal approximation, tie-corrected).',
    failedAssumptions: groupCautions(compared),
  };
}
