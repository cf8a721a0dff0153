/** Tests of tables of counts against R. */

import type { CountTable, TwoByTwo } from '../src/index.ts';
import { chiSquareTest, cochranArmitageTrend, fisherExactTable, fisherTwoByTwo, mantelHaenszel } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import { figures, limits, membersOf } from './figures.ts';
import fixture from './tables.json' with { type: 'json' };

const twoByTwo = (table: CountTable): TwoByTwo => table as unknown as TwoByTwo;

export const tableChecks: readonly ReferenceCheck[] = [
  ...fixture.chiSquare.map((one): ReferenceCheck => ({ ...one, method: 'chi-square', compute: () => chiSquareTest(one.table) })),
  ...fixture.fisherTwoByTwo.map((one): ReferenceCheck => ({
    ...one,
    method: 'fisher-two-by-two',
    compute: () =>
      membersOf(fisherTwoByTwo(twoByTwo(one.table)), ({ estimate, interval, test }) => ({
        p: test.p,
        oddsRatio: estimate,
        limits: limits(interval),
      })),
  })),
  ...fixture.fisherTable.map((one): ReferenceCheck => ({ ...one, method: 'fisher-table', compute: () => fisherExactTable(one.table) })),
  ...fixture.trend.map((one): ReferenceCheck => {
    const groups = one.events.map((events, i) => ({ events, total: one.totals[i] as number }));
    return {
      ...one,
      method: 'cochran-armitage',
      compute: () => ({
        homogeneity: membersOf(chiSquareTest(groups.map(({ events, total }) => [events, total - events])), figures),
        trend: membersOf(cochranArmitageTrend(groups), figures),
      }),
    };
  }),
  ...fixture.mantelHaenszel.map((one): ReferenceCheck => ({
    ...one,
    method: 'mantel-haenszel',
    compute: () =>
      membersOf(mantelHaenszel(one.strata.map(twoByTwo)), ({ estimate, interval, test }) => ({
        oddsRatio: estimate,
        limits: limits(interval),
        statistic: test.statistic,
        p: test.p,
      })),
  })),
];
