import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { enumerateTables } from '../reference/enumerate-tables.ts';
import type { CountTable } from './index.ts';
import { groupsForMeans, HIDDEN, protectTable } from './index.ts';

const usableOf = (people: number[][], measured: number[][]) => {
  const table = { counts: people };
  return groupsForMeans({ table, protection: protectTable(table) }, { counts: measured });
};

describe('groupsForMeans', () => {
  it('lets every group with enough measured people show its mean', () => {
    const { usable, n } = usableOf([[20, 30]], [[15, 30]]);
    expect(usable).toEqual({ cells: [[true, true]], rowTotals: [true], columnTotals: [true, true], grandTotal: true });
    expect(n.published.rowTotals).toEqual([45]);
  });

  it('hides a second mean when too few of one group were measured, although everybody may be counted', () => {
    const people = [
      [20, 34, 31],
      [44, 41, 52],
    ];
    const { usable } = usableOf(people, [
      [6, 28, 25],
      [40, 22, 45],
    ]);
    expect(protectTable({ counts: people }).published.cells.flat()).not.toContain(HIDDEN);
    expect(usable.cells[0]?.[0]).toBe(false);
    expect(usable.cells[0]?.filter((flag) => !flag)).toHaveLength(2);
    expect(usable.cells.map((row) => row[0])).toEqual([false, false]);
    expect(usable.rowTotals).toEqual([true, true]);
  });

  it('shows no mean where the number of people is hidden', () => {
    const people = [
      [7, 20, 31],
      [25, 18, 40],
    ];
    const table = { counts: people };
    const protection = protectTable(table);
    const { usable } = groupsForMeans({ table, protection }, table);
    protection.hidden.cells.forEach((row, i) => row.forEach((isHidden, j) => isHidden && expect(usable.cells[i]?.[j]).toBe(false)));
    expect(usable.cells[0]?.[2]).toBe(true);
  });

  it('gives no mean of nobody, but says that nobody was measured', () => {
    const { usable, n } = usableOf([[20, 30]], [[0, 30]]);
    expect(usable.cells).toEqual([[false, true]]);
    expect(n.published.cells).toEqual([[0, 30]]);
  });

  it('reckons with a reader who knows that nobody is measured who is not counted', () => {
    // The two n's add up to 16 and neither can exceed 11, so each would be known to lie between 5 and 11.
    const { n, usable } = usableOf([[11, 11]], [[11, 5]]);
    expect(n.published.grandTotal).toBe(HIDDEN);
    expect(usable.grandTotal).toBe(false);
  });

  it('never isolates 1 to 10 measured people, by writing down every table of n that fits', () => {
    const cell = fc.record({ people: fc.integer({ min: 0, max: 22 }), missing: fc.integer({ min: 0, max: 12 }) });
    const tables = fc.array(fc.array(cell, { minLength: 3, maxLength: 3 }), { minLength: 2, maxLength: 2 });
    fc.assert(
      fc.property(tables, (cells) => {
        const table: CountTable = { counts: cells.map((row) => row.map(({ people }) => people)) };
        const measured: CountTable = { counts: cells.map((row) => row.map(({ people, missing }) => Math.max(0, people - missing))) };
        const protection = protectTable(table);
        const { n, usable } = groupsForMeans({ table, protection }, measured);
        const flags = [...usable.cells.flat(), ...usable.rowTotals, ...usable.columnTotals, usable.grandTotal];
        const shown = [...n.published.cells.flat(), ...n.published.rowTotals, ...n.published.columnTotals, n.published.grandTotal];
        flags.forEach((isUsable, at) => isUsable && expect(shown[at]).toBeGreaterThanOrEqual(11));
        if (n.hidden.grandTotal) return;
        const asked = (i: number, j: number) => protection.hidden.cells[i]?.[j] === true;
        const least = (i: number, j: number) => (n.published.withheld || asked(i, j) ? 0 : 1);
        const most = (i: number, j: number) => (asked(i, j) ? Number.POSITIVE_INFINITY : (table.counts[i]?.[j] ?? 0));
        const { low, high } = enumerateTables(measured, n.hidden, least, most);
        n.hidden.cells.forEach((row, i) =>
          row.forEach((isHidden, j) => {
            if (!isHidden) return;
            expect((high[i]?.[j] ?? 0) - (low[i]?.[j] ?? 0)).toBeGreaterThanOrEqual(10);
            expect(high[i]?.[j] ?? 0).toBeGreaterThanOrEqual(11);
          }),
        );
      }),
      { seed: 21, numRuns: 150 },
    );
  });

  it('refuses tables that do not belong together', () => {
    const table = { counts: [[20, 30]] };
    const people = { table, protection: protectTable(table) };
    expect(groupsForMeans(people, table).usable.grandTotal).toBe(true);
    expect(() => groupsForMeans(people, { counts: [[20]] })).toThrow(RangeError);
    expect(() => groupsForMeans(people, { counts: [[21, 30]] })).toThrow(RangeError);
  });
});
