/**
 * Pearson's chi-square test of association in a table of counts, without Yates' correction, with Cramer's V.
 * Source: Agresti (2002) Categorical Data Analysis, 2nd ed., section 3.2. Empty rows and columns are left out.
 */

import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons } from '../result.ts';
import { chiSquareFigures } from '../test-figures.ts';
import type { CountTable } from './contingency-table.ts';
import { marginsOf, requireCountTable, withoutEmptyLines } from './contingency-table.ts';

export interface ChiSquareTest extends TestResult {
  /** sqrt(chi-square / (N (smaller side - 1))): 0 no association, 1 full. */
  readonly cramersV: number;
  /** Counts expected without association, for the rows and columns that are not empty. */
  readonly expected: readonly (readonly number[])[];
  readonly smallestExpected: number;
}

export function chiSquareTest(table: CountTable): ChiSquareTest | NotEstimable {
  requireCountTable(table);
  const filled = withoutEmptyLines(table);
  const { rows, columns, total } = marginsOf(filled);
  const basis = { n: total, leftOut: nothingLeftOut };
  if (total === 0) return notEstimable(reasons.noData, basis);
  if (rows.length < 2 || columns.length < 2) return notEstimable(reasons.noComparison, basis);
  const expected = rows.map((row) => columns.map((column) => row * (column / total)));
  let statistic = 0;
  for (const [i, row] of filled.entries()) {
    for (const [j, count] of row.entries()) statistic += (count - (expected[i]?.[j] as number)) ** 2 / (expected[i]?.[j] as number);
  }
  const smallestExpected = Math.min(...expected.flat());
  return {
    kind: 'test',
    ...basis,
    ...chiSquareFigures(statistic, (rows.length - 1) * (columns.length - 1)),
    method: "Pearson's chi-square test without continuity correction (two-sided).",
    failedAssumptions: smallestExpected < 5 ? ['expected counts below 5: the exact test is the one to report'] : [],
    cramersV: Math.sqrt(statistic / (total * (Math.min(rows.length, columns.length) - 1))),
    expected,
    smallestExpected,
  };
}
