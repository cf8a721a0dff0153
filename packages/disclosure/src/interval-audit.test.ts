import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { enumerateTables } from '../reference/enumerate-tables.ts';
import { knownTables } from '../reference/two-way-tables.ts';
import type { CountTable, HiddenPattern, Knowledge, Place } from './index.ts';
import { intervalAudit } from './index.ts';

function hiding(table: CountTable, cells: readonly (readonly [number, number])[], columnTotals: readonly number[] = []): HiddenPattern {
  return {
    cells: table.counts.map((row, i) => row.map((_, j) => cells.some(([r, c]) => r === i && c === j))),
    rowTotals: table.counts.map(() => false),
    columnTotals: (table.counts[0] ?? []).map((_, j) => columnTotals.includes(j)),
    grandTotal: false,
  };
}

const has = (cells: readonly (readonly [number, number])[] | undefined, { row, column }: Place) =>
  cells?.some(([r, c]) => r === row && c === column) === true;

const cases = knownTables.flatMap(({ id, counts, audits }) => audits.map((audit) => ({ name: `${id}: ${audit.says}`, counts, audit })));

describe('intervalAudit', () => {
  it.each(cases)('finds the known intervals of $name', ({ counts, audit }) => {
    const knowledge = (place: Place): Knowledge => {
      if (has(audit.knownZero, place)) return { least: 0, most: 0 };
      if (has(audit.knownOneToTen, place)) return { least: 1, most: 10 };
      return { least: 0, most: Number.POSITIVE_INFINITY };
    };
    const intervals = intervalAudit({ counts }, hiding({ counts }, audit.hidden, audit.hiddenColumnTotals), { knowledge });
    const cells = intervals.filter(({ place }) => place.row !== 'total' && place.column !== 'total');
    expect(cells).toHaveLength(audit.intervals.length);
    for (const [row, column, low, high] of audit.intervals) {
      expect(cells).toContainEqual({ place: { row, column }, low, high });
    }
  });

  it.each(cases.filter(({ audit }) => audit.integerTables !== undefined))(
    'agrees with the number of tables known for $name',
    ({ counts, audit }) => {
      const least = (row: number, column: number) => (has(audit.knownOneToTen, { row, column }) ? 1 : 0);
      const most = (row: number, column: number) => {
        if (has(audit.knownZero, { row, column })) return 0;
        return has(audit.knownOneToTen, { row, column }) ? 10 : Number.POSITIVE_INFINITY;
      };
      expect(enumerateTables({ counts }, hiding({ counts }, audit.hidden), least, most).tables).toBe(audit.integerTables);
    },
  );

  it('narrows the intervals when the reader knows that zeros are shown', () => {
    const counts = [
      [3, 20],
      [15, 28],
    ];
    const all: HiddenPattern = hiding({ counts }, [
      [0, 0],
      [0, 1],
      [1, 0],
      [1, 1],
    ]);
    expect(intervalAudit({ counts }, all)[0]).toEqual({ place: { row: 0, column: 0 }, low: 1, high: 17 });
  });

  it('reports hidden totals, and no upper end when the grand total is hidden with them', () => {
    const counts = [[4], [30]];
    const intervals = intervalAudit(
      { counts },
      { cells: [[true], [false]], rowTotals: [true, false], columnTotals: [true], grandTotal: true },
    );
    expect(intervals).toEqual([
      { place: { row: 0, column: 0 }, low: 1, high: Number.POSITIVE_INFINITY },
      { place: { row: 0, column: 'total' }, low: 1, high: Number.POSITIVE_INFINITY },
      { place: { row: 'total', column: 0 }, low: 31, high: Number.POSITIVE_INFINITY },
      { place: { row: 'total', column: 'total' }, low: 31, high: Number.POSITIVE_INFINITY },
    ]);
  });

  it('equals exhaustive enumeration on random small tables and patterns', () => {
    const shape = fc.record({ rows: fc.integer({ min: 1, max: 3 }), columns: fc.integer({ min: 1, max: 3 }) });
    const arbitrary = shape.chain(({ rows, columns }) =>
      fc.record({
        counts: fc.array(fc.array(fc.integer({ min: 0, max: 6 }), { minLength: columns, maxLength: columns }), {
          minLength: rows,
          maxLength: rows,
        }),
        cells: fc.array(fc.array(fc.boolean(), { minLength: columns, maxLength: columns }), { minLength: rows, maxLength: rows }),
        rowTotals: fc.array(fc.boolean(), { minLength: rows, maxLength: rows }),
        columnTotals: fc.array(fc.boolean(), { minLength: columns, maxLength: columns }),
        least: fc.constantFrom(0, 1),
      }),
    );
    fc.assert(
      fc.property(arbitrary, ({ counts, cells, rowTotals, columnTotals, least }) => {
        const pattern = {
          cells: cells.map((row, i) => row.map((flag, j) => flag && (counts[i]?.[j] ?? 0) >= least)),
          rowTotals,
          columnTotals,
          grandTotal: false,
        };
        const truth = enumerateTables({ counts }, pattern, () => least);
        const intervals = intervalAudit({ counts }, pattern, { knowledge: () => ({ least: 0, most: Number.POSITIVE_INFINITY }) });
        const bounded = least === 0 ? intervals : intervalAudit({ counts }, pattern, { knowledge: onlyCells(least) });
        for (const { place, low, high } of bounded) {
          if (place.row === 'total' || place.column === 'total') continue;
          expect([low, high]).toEqual([truth.low[place.row]?.[place.column], truth.high[place.row]?.[place.column]]);
        }
      }),
      { seed: 20260112, numRuns: 300 },
    );
  });

  it('refuses a table that is ragged, empty or holds fractions, and a pattern of another shape', () => {
    const nothing: HiddenPattern = { cells: [[false]], rowTotals: [false], columnTotals: [false], grandTotal: false };
    expect(intervalAudit({ counts: [[4]] }, nothing)).toEqual([]);
    expect(() => intervalAudit({ counts: [] }, nothing)).toThrow(RangeError);
    expect(() => intervalAudit({ counts: [[1, 2], [3]] }, nothing)).toThrow(RangeError);
    expect(() => intervalAudit({ counts: [[1.5]] }, nothing)).toThrow(RangeError);
    expect(() => intervalAudit({ counts: [[-1]] }, nothing)).toThrow(RangeError);
    expect(() => intervalAudit({ counts: [[1, 2]] }, nothing)).toThrow(RangeError);
  });

  it('refuses knowledge that the table contradicts', () => {
    const pattern: HiddenPattern = { cells: [[true]], rowTotals: [true], columnTotals: [true], grandTotal: false };
    expect(() => intervalAudit({ counts: [[12]] }, pattern, { knowledge: () => ({ least: 1, most: 10 }) })).toThrow(RangeError);
  });
});

/** Totals that may be zero, cells that hold at least `least`. */
function onlyCells(least: number): (place: Place) => Knowledge {
  return ({ row, column }) => ({ least: row === 'total' || column === 'total' ? 0 : least, most: Number.POSITIVE_INFINITY });
}
