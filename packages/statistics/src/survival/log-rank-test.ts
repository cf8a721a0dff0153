/**
 * Log-rank test that the event comes equally early in all groups, with hypergeometric variance (Mantel-Haenszel form, rho = 0).
 * Source: Mantel (1966) Cancer Chemother Rep 50:163-170; Kalbfleisch & Prentice (2002), section 1.5.
 */

import type { Label } from '../complete-rows.ts';
import { symmetricSolver } from '../linear-algebra/solve-symmetric.ts';
import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable, reasons } from '../result.ts';
import { chiSquareFigures } from '../test-figures.ts';
import type { FollowUp } from './follow-up.ts';
import { cleanFollowUp, orderOfTime } from './follow-up.ts';

export interface LogRankGroup {
  readonly group: string;
  readonly n: number;
  readonly observed: number;
  /** Events expected if all groups were alike. */
  readonly expected: number;
}

export interface LogRankTest extends TestResult {
  readonly groups: readonly LogRankGroup[];
  /** Covariance of observed minus expected. */
  readonly covariance: readonly (readonly number[])[];
}

export interface GroupedFollowUp extends FollowUp {
  readonly group: ArrayLike<Label>;
}

export function logRankTest({ time, event, group }: GroupedFollowUp): LogRankTest | NotEstimable {
  const clean = cleanFollowUp({ time, event }, [group]);
  const basis = { n: clean.n, leftOut: clean.leftOut };
  const { names, codes } = clean.labels[0] as (typeof clean.labels)[number];
  if (clean.n === 0) return notEstimable(reasons.noData, basis);
  if (names.length < 2) return notEstimable(reasons.noComparison, basis);

  const k = names.length;
  const at = (values: ArrayLike<number>, i: number): number => values[i] as number;
  const atRisk = new Float64Array(k);
  for (const code of codes) atRisk[code] = at(atRisk, code) + 1;
  const sizes = atRisk.slice();
  const observed = new Float64Array(k);
  const expected = new Float64Array(k);
  const covariance = Array.from({ length: k }, () => new Float64Array(k));
  const order = orderOfTime(clean.time);
  for (let start = 0; start < order.length;) {
    const now = at(clean.time, at(order, start));
    const leaving = new Float64Array(k);
    let events = 0;
    let end = start;
    for (; end < order.length && clean.time[at(order, end)] === now; end++) {
      const row = at(order, end);
      const code = at(codes, row);
      leaving[code] = at(leaving, code) + 1;
      if (clean.event[row] === 1) {
        events++;
        observed[code] = at(observed, code) + 1;
      }
    }
    const total = order.length - start;
    // A time at which one person is left adds no variance: who had the event was certain.
    const spread = total > 1 ? (events * (total - events)) / (total - 1) : 0;
    for (let i = 0; i < k && events > 0; i++) {
      const share = at(atRisk, i) / total;
      expected[i] = at(expected, i) + events * share;
      const row = covariance[i] as Float64Array;
      for (let j = 0; j < k; j++) row[j] = at(row, j) + spread * share * ((i === j ? 1 : 0) - at(atRisk, j) / total);
    }
    for (let i = 0; i < k; i++) atRisk[i] = at(atRisk, i) - at(leaving, i);
    start = end;
  }

  // Groups never at risk together with others when an event came say nothing; of the rest one is redundant.
  const informative = names.map((_, i) => i).filter((i) => at(covariance[i] as Float64Array, i) > 0);
  const kept = informative.slice(1);
  const difference = kept.map((i) => at(observed, i) - at(expected, i));
  const solved = symmetricSolver(kept.map((i) => kept.map((j) => at(covariance[i] as Float64Array, j))))?.solve(difference);
  if (kept.length === 0 || solved === undefined)
    return notEstimable('no event with at least two groups at risk: no comparison possible', basis);
  const fewest = Math.min(...informative.map((i) => at(expected, i)));
  return {
    kind: 'test',
    ...basis,
    ...chiSquareFigures(
      solved.reduce((sum, value, i) => sum + value * (difference[i] as number), 0),
      kept.length,
    ),
    method: 'Log-rank test with hypergeometric variance (two-sided).',
    failedAssumptions: fewest < 5 ? ['fewer than 5 expected events in a group: the chi-square approximation is rough'] : [],
    groups: names.map((name, i) => ({ group: name, n: at(sizes, i), observed: at(observed, i), expected: at(expected, i) })),
    covariance: covariance.map((row) => [...row]),
  };
}
