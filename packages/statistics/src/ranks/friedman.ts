/**
 * Friedman's test of repeated visits: ranks within each person, chi-square with k - 1 df, tie-corrected. Kendall's W = chi²/(n (k - 1)).
 * Source: Friedman (1937) Journal of the American Statistical Association 32:675-701; Hollander & Wolfe (1973) chapter 7.
 */

import { completeRows } from '../complete-rows.ts';
import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable, reasons, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { roundToResolution } from '../samples.ts';
import { chiSquareFigures } from '../test-figures.ts';
import { midranks, tieTerm } from './midranks.ts';

export interface RepeatedVisits extends TestResult {
  /** Agreement of the people on the order of the visits, 0 to 1. */
  readonly kendallW: number;
  readonly meanRanks: readonly number[];
}

/** One list per visit, people in the same order in each; only people with a value at every visit take part. */
export function friedmanTest(visits: readonly ArrayLike<Observation>[], resolution?: number): RepeatedVisits | NotEstimable {
  const { n, leftOut, columns } = completeRows(visits);
  const k = visits.length;
  const basis = { n, leftOut };
  if (n === 0) return notEstimable(reasons.noData, basis);
  if (k < 2) return notEstimable(reasons.noComparison, basis);
  const sums = new Float64Array(k);
  let ties = 0;
  for (let person = 0; person < n; person++) {
    const row = columns.map((column) => column[person] as number);
    const ranked = midranks(resolution === undefined ? row : row.map((value) => roundToResolution(value, resolution)));
    ranked.ranks.forEach((rank, visit) => (sums[visit] = (sums[visit] as number) + rank));
    ties += tieTerm(ranked.tieSizes);
  }
  const divisor = n * k * (k + 1) - ties / (k - 1);
  if (divisor <= 0) return notEstimable('all values equal within each person', basis);
  const middle = (n * (k + 1)) / 2;
  const chiSquare = (12 * sums.reduce((sum, rankSum) => sum + (rankSum - middle) ** 2, 0)) / divisor;
  return {
    kind: 'test',
    ...basis,
    ...chiSquareFigures(chiSquare, k - 1),
    kendallW: chiSquare / (n * (k - 1)),
    meanRanks: Array.from(sums, (rankSum) => rankSum / n),
    method: "Friedman's test of repeated visits in the same people (tie-corrected, chi-square approximation).",
    failedAssumptions: verySmallSample(n),
  };
}
