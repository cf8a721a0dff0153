/**
 * Exact McNemar test: the same people classified yes/no twice. Only those whose status changed count; under no net movement each of them
 * is as likely to have moved either way.
 * Source: McNemar (1947) Psychometrika 12:153-157; exact form as the sign test, Agresti (2002) Categorical Data Analysis, section 10.1.4.
 */

import type { NotEstimable, TestFigures, TestResult } from '../result.ts';
import { notEstimable, nothingLeftOut } from '../result.ts';
import { chiSquareFigures } from '../test-figures.ts';
import { exactSignProbability } from './exact-sign-probability.ts';
import type { TwoByTwo } from '../tables/fisher-two-by-two.ts';
import { requireSquareTable } from '../tables/contingency-table.ts';

export interface McNemarTest extends TestResult {
  /** First category before, second after; and the other way round. */
  readonly gained: number;
  readonly lost: number;
  /** gained / lost; Infinity when nobody lost. */
  readonly oddsRatio: number;
  /** Chi-square form without continuity correction, for large numbers of changed people. */
  readonly asymptotic: TestFigures;
}

/** Rows: before; columns: after. */
export function mcNemarTest(table: TwoByTwo): McNemarTest | NotEstimable {
  requireSquareTable(table);
  const [[a, gained], [lost, d]] = table;
  const basis = { n: a + gained + lost + d, leftOut: nothingLeftOut };
  if (gained + lost === 0) return notEstimable('nobody changed: no comparison possible', basis);
  return {
    kind: 'test',
    ...basis,
    statisticName: 'count',
    statistic: gained,
    df: [],
    p: exactSignProbability(gained, lost),
    method: 'Exact McNemar test (two-sided binomial test of those who changed).',
    failedAssumptions: [],
    gained,
    lost,
    oddsRatio: gained / lost,
    asymptotic: chiSquareFigures((gained - lost) ** 2 / (gained + lost), 1),
  };
}
