import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { tableChecks } from '../../reference/tables.checks.ts';
import { logFactorials } from './log-factorials.ts';
import { marginsOf } from './contingency-table.ts';
import type { CountTable, TwoByTwo } from './index.ts';
import { chiSquareTest, cochranArmitageTrend, fisherExactTable, fisherTwoByTwo, mantelHaenszel } from './index.ts';

const seed = 42;
const cell = fc.nat({ max: 6 });
const smallTable = fc
  .tuple(fc.integer({ min: 2, max: 3 }), fc.integer({ min: 2, max: 3 }))
  .chain(([rows, columns]) => fc.array(fc.array(cell, { minLength: columns, maxLength: columns }), { minLength: rows, maxLength: rows }));
const twoByTwo = fc.tuple(fc.tuple(cell, cell), fc.tuple(cell, cell));

/** p of the exact test by writing out every table with the margins of `table`. */
function byEnumeration(table: CountTable): number {
  const { rows, columns, total } = marginsOf(table);
  const lf = logFactorials(total);
  const log = (cells: CountTable): number =>
    [...rows, ...columns].reduce((sum, count) => sum + (lf[count] as number), 0) -
    (lf[total] as number) -
    cells.flat().reduce((sum, count) => sum + (lf[count] as number), 0);
  const observed = log(table);
  let p = 0;
  const fill = (done: number[][], left: readonly number[]): void => {
    const row = rows[done.length];
    if (row === undefined) {
      const found = log(done);
      if (found <= observed + 1e-7) p += Math.exp(found);
      return;
    }
    const place = (cells: number[], open: number): void => {
      if (cells.length === columns.length) {
        if (open === 0)
          fill(
            [...done, cells],
            left.map((count, j) => count - (cells[j] as number)),
          );
        return;
      }
      for (let count = 0; count <= Math.min(open, left[cells.length] as number); count++) place([...cells, count], open - count);
    };
    place([], row);
  };
  fill([], columns);
  return p;
}

describe('tests of tables', () => {
  it.each(tableChecks)('agree with the published figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });
});

describe('exact test of a table of any size', () => {
  it('finds what writing out every table finds', () => {
    fc.assert(
      fc.property(smallTable, (table) => {
        const test = fisherExactTable(table);
        const filled = marginsOf(table);
        if (test.kind === 'not-estimable') {
          expect(Math.min(...[filled.rows, filled.columns].map((side) => side.filter((count) => count > 0).length))).toBeLessThan(2);
          return;
        }
        expect(test.p).toBeCloseTo(byEnumeration(table), 10);
      }),
      { seed },
    );
  });

  it('gives the same p as the 2 x 2 test', () => {
    fc.assert(
      fc.property(twoByTwo, (table) => {
        const one = fisherExactTable(table);
        const other = fisherTwoByTwo(table);
        expect(one.kind === 'not-estimable').toBe(other.kind === 'not-estimable');
        if (one.kind === 'test' && other.kind === 'estimate') expect(one.p).toBeCloseTo(other.test.p, 10);
      }),
      { seed },
    );
  });

  it('does not mind the order of rows and columns, nor an empty one', () => {
    const table = [
      [5, 1, 0, 2],
      [1, 4, 0, 3],
      [0, 2, 0, 6],
    ];
    const shuffled = [table[2], table[0], table[1]].map((row) => [row?.[3], row?.[0], row?.[1]].map(Number));
    const one = fisherExactTable(table);
    const other = fisherExactTable(shuffled);
    if (one.kind !== 'test' || other.kind !== 'test') throw new Error('expected tests');
    expect(other.p).toBeCloseTo(one.p, 12);
  });

  it('counts two large cohorts over five grades', () => {
    const test = fisherExactTable([
      [40, 22, 31, 60, 12],
      [33, 25, 40, 71, 18],
    ]);
    expect(test).toMatchObject({ kind: 'test', failedAssumptions: [] });
    expect(test).not.toHaveProperty('simulation');
  });

  it('draws tables when they are too many to count, says so, and repeats itself', () => {
    const table = [
      [120, 64, 88, 190, 41],
      [101, 80, 95, 170, 52],
      [90, 77, 120, 160, 60],
      [130, 61, 99, 201, 33],
    ];
    const one = fisherExactTable(table, { seed: 5, replicates: 1999 });
    const again = fisherExactTable(table, { seed: 5, replicates: 1999 });
    const chiSquare = chiSquareTest(table);
    if (one.kind !== 'test' || chiSquare.kind !== 'test') throw new Error('expected tests');
    expect(one).toEqual(again);
    expect(one.simulation).toEqual({ seed: 5, replicates: 1999 });
    expect(one.method).toContain('B = 1999');
    // With counts this large chi-square is close, and the simulation error is below 0.002 at this p.
    expect(Math.abs(one.p - chiSquare.p)).toBeLessThan(0.005);
  });

  it('finds nothing to compare in one row or one column', () => {
    expect(fisherExactTable([[3, 4]])).toMatchObject({ kind: 'not-estimable', reason: 'no comparison possible', n: 7 });
    expect(fisherExactTable([[3], [4]])).toMatchObject({ kind: 'not-estimable' });
    expect(
      fisherExactTable([
        [0, 0],
        [0, 0],
      ]),
    ).toMatchObject({ reason: 'no data' });
    expect(fisherExactTable([])).toMatchObject({ reason: 'no data' });
  });

  it('refuses tables that are none', () => {
    expect(() => fisherExactTable([[1, 2], [3]])).toThrow(RangeError);
    expect(() => fisherExactTable([[1, 2.5]])).toThrow(RangeError);
    expect(() => fisherExactTable([[1, -2]])).toThrow(RangeError);
    expect(() => fisherExactTable([[1, 2]], { seed: 1, replicates: 0 })).toThrow(RangeError);
  });
});

describe('exact test of a 2 x 2 table', () => {
  it('turns the odds ratio over with the columns', () => {
    fc.assert(
      fc.property(twoByTwo, ([[a, b], [c, d]]) => {
        const one = fisherTwoByTwo([
          [a, b],
          [c, d],
        ]);
        const other = fisherTwoByTwo([
          [b, a],
          [d, c],
        ]);
        if (one.kind !== 'estimate' || other.kind !== 'estimate') return;
        expect(other.test.p).toBeCloseTo(one.test.p, 10);
        if (one.estimate > 0 && Number.isFinite(one.estimate)) expect(Math.log(other.estimate)).toBeCloseTo(-Math.log(one.estimate), 8);
        expect(one.interval.lower).toBeLessThanOrEqual(one.estimate);
        expect(one.interval.upper).toBeGreaterThanOrEqual(one.estimate);
      }),
      { seed },
    );
  });

  it('bounds the odds ratio on one side where a cell is empty', () => {
    expect(
      fisherTwoByTwo([
        [5, 0],
        [2, 6],
      ]),
    ).toMatchObject({ estimate: Infinity, interval: { upper: Infinity }, failedAssumptions: [expect.stringContaining('empty cell')] });
    expect(
      fisherTwoByTwo([
        [0, 5],
        [2, 6],
      ]),
    ).toMatchObject({ estimate: 0, interval: { lower: 0 } });
  });

  it('holds for tens of thousands', () => {
    const table: TwoByTwo = [
      [9_000, 6_000],
      [8_700, 6_300],
    ];
    const test = fisherTwoByTwo(table);
    const chiSquare = chiSquareTest(table);
    if (test.kind !== 'estimate' || chiSquare.kind !== 'test') throw new Error('expected figures');
    // Near the sample odds ratio and the chi-square p, as it must be with counts of this size.
    expect(test.estimate).toBeCloseTo((9_000 * 6_300) / (6_000 * 8_700), 4);
    expect(test.test.p / chiSquare.p).toBeCloseTo(1, 1);
  });

  it('finds nothing to compare where a margin is empty', () => {
    const empty: TwoByTwo = [
      [0, 0],
      [3, 4],
    ];
    expect(fisherTwoByTwo(empty)).toMatchObject({ kind: 'not-estimable', reason: 'no comparison possible' });
    expect(
      fisherTwoByTwo([
        [0, 0],
        [0, 0],
      ]),
    ).toMatchObject({ reason: 'no data' });
  });
});

describe('chi-square', () => {
  it('is N V^2 of the smaller side less one, and names small expected counts', () => {
    fc.assert(
      fc.property(smallTable, (table) => {
        const test = chiSquareTest(table);
        if (test.kind !== 'test') return;
        const side = Math.min(test.expected.length, test.expected[0]?.length ?? 0) - 1;
        expect(test.statistic).toBeCloseTo(test.n * side * test.cramersV ** 2, 8);
        expect(test.cramersV).toBeLessThanOrEqual(1 + 1e-12);
        expect(test.failedAssumptions.length).toBe(test.smallestExpected < 5 ? 1 : 0);
      }),
      { seed },
    );
  });

  it('finds nothing to compare in one category', () => {
    expect(
      chiSquareTest([
        [3, 0],
        [4, 0],
      ]),
    ).toMatchObject({ kind: 'not-estimable', reason: 'no comparison possible' });
    expect(chiSquareTest([])).toMatchObject({ reason: 'no data' });
  });
});

describe('trend of proportions', () => {
  const groups = [
    { events: 3, total: 20 },
    { events: 6, total: 22 },
    { events: 11, total: 19 },
  ];

  it('does not mind where the scores begin or in which unit they are', () => {
    const one = cochranArmitageTrend(groups);
    const other = cochranArmitageTrend(groups, [10, 30, 50]);
    if (one.kind !== 'test' || other.kind !== 'test') throw new Error('expected tests');
    expect(other.statistic).toBeCloseTo(one.statistic, 12);
    expect(one.direction).toBe(1);
    expect(cochranArmitageTrend(groups, [3, 2, 1])).toMatchObject({ direction: -1 });
  });

  it('is the chi-square of the table for two groups', () => {
    const two = groups.slice(0, 2);
    const trend = cochranArmitageTrend(two);
    const table = chiSquareTest(two.map(({ events, total }) => [events, total - events]));
    if (trend.kind !== 'test' || table.kind !== 'test') throw new Error('expected tests');
    expect(trend.statistic).toBeCloseTo(table.statistic, 12);
  });

  it('needs people with and without the event in more than one group', () => {
    expect(cochranArmitageTrend([])).toMatchObject({ reason: 'no data' });
    expect(cochranArmitageTrend([{ events: 3, total: 9 }])).toMatchObject({ reason: 'no comparison possible' });
    expect(
      cochranArmitageTrend([
        { events: 0, total: 9 },
        { events: 0, total: 4 },
      ]),
    ).toMatchObject({ reason: 'no comparison possible' });
    expect(() => cochranArmitageTrend(groups, [1, 2])).toThrow(RangeError);
    expect(() => cochranArmitageTrend(groups, [1, 2, Infinity])).toThrow(RangeError);
  });
});

describe('common odds ratio over strata', () => {
  const stratum: TwoByTwo = [
    [12, 5],
    [6, 9],
  ];

  it('is the cross product of a single stratum and stays so when the stratum is repeated', () => {
    const one = mantelHaenszel([stratum]);
    const twice = mantelHaenszel([stratum, stratum]);
    if (one.kind !== 'estimate' || twice.kind !== 'estimate') throw new Error('expected estimates');
    expect(one.estimate).toBeCloseTo((12 * 9) / (5 * 6), 12);
    expect(twice.estimate).toBeCloseTo(one.estimate, 12);
    expect(twice.interval.lower).toBeGreaterThan(one.interval.lower);
  });

  it('passes over strata with an empty margin', () => {
    const hollow: TwoByTwo = [
      [0, 0],
      [4, 7],
    ];
    const one = mantelHaenszel([stratum]);
    const other = mantelHaenszel([stratum, hollow]);
    if (one.kind !== 'estimate' || other.kind !== 'estimate') throw new Error('expected estimates');
    expect(other.estimate).toBe(one.estimate);
    expect(mantelHaenszel([hollow])).toMatchObject({ kind: 'not-estimable', reason: 'no comparison possible' });
    expect(mantelHaenszel([])).toMatchObject({ reason: 'no data' });
    expect(
      mantelHaenszel([
        [
          [5, 0],
          [2, 3],
        ],
      ]),
    ).toMatchObject({ kind: 'not-estimable' });
  });
});
