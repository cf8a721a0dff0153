/**
 * Bowker's test that movements from i to j are as frequent as from j to i. Pairs of categories that nobody moved between are skipped and do
 * not count as degrees of freedom.
 * Source: Bowker (1948) J Am Stat Assoc 43:572-574. (R's mcnemar.test counts all pairs and gives no figure as soon as one is empty.)
 */

import type { TestOutcome } from '../result.ts';
import { notEstimable, nothingLeftOut } from '../result.ts';
import { chiSquareFigures } from '../test-figures.ts';
import type { CountTable } from '../tables/contingency-table.ts';
import { marginsOf, requireSquareTable } from '../tables/contingency-table.ts';

/** Rows: before; columns: after; the same categories in the same order. */
export function bowkerSymmetry(table: CountTable): TestOutcome {
  requireSquareTable(table);
  const basis = { n: marginsOf(table).total, leftOut: nothingLeftOut };
  let statistic = 0;
  let pairs = 0;
  let sparse = false;
  for (const [i, row] of table.entries()) {
    for (let j = i + 1; j < row.length; j++) {
      const there = row[j] as number;
      const back = table[j]?.[i] as number;
      if (there + back === 0) continue;
      pairs++;
      statistic += (there - back) ** 2 / (there + back);
      sparse ||= there + back < 10;
    }
  }
  if (pairs === 0) return notEstimable('nobody changed category: no comparison possible', basis);
  return {
    kind: 'test',
    ...basis,
    ...chiSquareFigures(statistic, pairs),
    method: "Bowker's test of symmetry, degrees of freedom counting the pairs of categories between which somebody moved (two-sided).",
    failedAssumptions: sparse ? ['fewer than 10 movements between some categories: the chi-square approximation is rough'] : [],
  };
}
