/**
 * Pairs of groups after a Kruskal-Wallis test: difference of mean ranks over its tie-corrected standard error,
 * z = (R_i - R_j)/sqrt((N(N + 1)/12 - sum(t³ - t)/(12 (N - 1))) (1/n_i + 1/n_j)); two-sided normal p, adjusted by Holm.
 * Source: Dunn (1964) Technometrics 6:241-252; Holm (1979) Scandinavian Journal of Statistics 6:65-70.
 */

import { normalUpper } from '../distributions/normal.ts';
import type { Group, GroupSetAside } from '../groups/groups.ts';
import { comparableGroups, groupCautions } from '../groups/groups.ts';
import { holmAdjusted } from '../multiplicity/adjusted-p-values.ts';
import type { NotEstimable, Provenance } from '../result.ts';
import { notEstimable, reasons } from '../result.ts';
import { tieTerm } from './midranks.ts';
import { rankedGroups } from './ranked-groups.ts';

/** Positive `z`: the first group ranks higher. */
export interface DunnPair {
  readonly first: string;
  readonly second: string;
  readonly meanRankDifference: number;
  readonly z: number;
  readonly p: number;
  readonly holmP: number;
}

export interface DunnComparison extends Provenance {
  readonly kind: 'rank-pairs';
  readonly pairs: readonly DunnPair[];
  readonly setAside: readonly GroupSetAside[];
}

export function dunnTest(given: readonly Group[]): DunnComparison | NotEstimable {
  const compared = comparableGroups(given, 1);
  const { basis, setAside } = compared;
  if (compared.groups.length < 2) return notEstimable(reasons.noComparison, basis);
  const { groups, tieSizes } = rankedGroups(compared.groups);
  const n = basis.n;
  if (tieSizes[0] === n) return notEstimable(reasons.allEqual, basis);
  const variance = (n * (n + 1)) / 12 - tieTerm(tieSizes) / (12 * (n - 1));
  const plain = groups.flatMap((one, i) =>
    groups.slice(i + 1).map((two) => {
      const meanRankDifference = one.meanRank - two.meanRank;
      const z = meanRankDifference / Math.sqrt(variance * (1 / one.n + 1 / two.n));
      return { first: one.name, second: two.name, meanRankDifference, z, p: 2 * normalUpper(Math.abs(z)) };
    }),
  );
  const holm = holmAdjusted(plain.map(({ p }) => p));
  return {
    kind: 'rank-pairs',
    ...basis,
    pairs: plain.map((pair, i) => ({ ...pair, holmP: holm[i] as number })),
    setAside,
    method: `Dunn's comparison of all ${plain.length} pairs of mean ranks (two-sided, tie-corrected), p adjusted by Holm's method.`,
    failedAssumptions: groupCautions(compared),
  };
}
