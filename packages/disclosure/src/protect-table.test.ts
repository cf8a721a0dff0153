import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { enumerateTables, visitTables } from '../reference/enumerate-tables.ts';
import { knownTables } from '../reference/two-way-tables.ts';
import type { CountTable, HiddenPattern, ProtectedTable } from './index.ts';
import { HIDDEN, intervalAudit, protectTable } from './index.ts';

const unlimited = () => Number.POSITIVE_INFINITY;
const sum = (numbers: readonly number[]) => numbers.reduce((a, b) => a + b, 0);

/** Tables small enough to write down every table a reader must consider. */
const smallTables = fc
  .record({ rows: fc.integer({ min: 1, max: 3 }), columns: fc.integer({ min: 1, max: 3 }) })
  .chain(({ rows, columns }) =>
    fc.array(
      fc.array(fc.oneof(fc.integer({ min: 0, max: 13 }), fc.constant(0), fc.integer({ min: 11, max: 24 })), {
        minLength: columns,
        maxLength: columns,
      }),
      {
        minLength: rows,
        maxLength: rows,
      },
    ),
  )
  .map((counts): CountTable => ({ counts }));

const leastInCell =
  ({ published }: ProtectedTable) =>
  () =>
    published.withheld ? 0 : 1;

function hiddenPeople({ counts }: CountTable, hidden: HiddenPattern) {
  const inRow = counts.map((row, i) => sum(row.filter((_, j) => hidden.cells[i]?.[j] === true)));
  const inColumn = (counts[0] ?? []).map((_, j) => sum(counts.map((row, i) => (hidden.cells[i]?.[j] === true ? (row[j] ?? 0) : 0))));
  return { inRow, inColumn };
}

describe('protectTable', () => {
  it('hides a second cell in the row and in the column of a small one', () => {
    const { published } = protectTable({
      counts: [
        [7, 20, 31],
        [25, 18, 40],
      ],
    });
    expect(published.cells).toEqual([
      [HIDDEN, HIDDEN, 31],
      [HIDDEN, HIDDEN, 40],
    ]);
    expect(published.rowTotals).toEqual([58, 83]);
    expect(published.columnTotals).toEqual([32, 38, 71]);
    expect(published.grandTotal).toBe(141);
  });

  it.each(knownTables.flatMap(({ id, counts, leastCost }) => (leastCost === undefined ? [] : [{ id, counts, leastCost }])))(
    'hides as few people as possible in $id',
    ({ counts, leastCost }) => {
      const { audit } = protectTable({ counts });
      expect(audit.cost).toBe(leastCost);
      expect(audit.provenLeast).toBe(true);
    },
  );

  it('repairs what a count of hidden cells per line would miss', () => {
    const bridge = knownTables.find(({ id }) => id === 'bridge')?.counts ?? [];
    const twoPerLine: HiddenPattern = {
      cells: [
        [true, true, false, false],
        [true, true, true, false],
        [false, false, true, true],
        [false, false, true, true],
      ],
      rowTotals: [false, false, false, false],
      columnTotals: [false, false, false, false],
      grandTotal: false,
    };
    expect(intervalAudit({ counts: bridge }, twoPerLine)).toContainEqual({ place: { row: 1, column: 2 }, low: 7, high: 7 });
    const { audit } = protectTable({ counts: bridge }, { alsoHide: twoPerLine });
    expect(audit.intervals.every(({ low, high }) => high - low >= 10)).toBe(true);
  });

  it('uses one mark, so that cells hidden for their size and for protection look alike', () => {
    const { published, audit } = protectTable({
      counts: [
        [10, 10, 40],
        [14, 21, 30],
        [25, 33, 28],
      ],
    });
    expect(audit.primary).toHaveLength(2);
    expect(audit.complementary.length).toBeGreaterThan(0);
    expect(new Set(published.cells.flat().filter((count) => typeof count === 'string'))).toEqual(new Set([HIDDEN]));
    expect(JSON.stringify(published)).not.toMatch(/primary|complement/);
  });

  it('hides totals when a whole line is small, and shows the grand total', () => {
    const { published } = protectTable({
      counts: [
        [3, 2],
        [40, 50],
        [30, 25],
      ],
    });
    expect(published.rowTotals[0]).toBe(HIDDEN);
    expect(published.rowTotals.filter((total) => total === HIDDEN)).toHaveLength(2);
    expect(published.grandTotal).toBe(150);
  });

  it('withholds the whole table when nothing less is safe, and the size of the cohort only if that is small', () => {
    const thin = protectTable({
      counts: [
        [4, 0],
        [0, 7],
      ],
    });
    expect(thin.published).toEqual({
      cells: [
        [HIDDEN, HIDDEN],
        [HIDDEN, HIDDEN],
      ],
      rowTotals: [HIDDEN, HIDDEN],
      columnTotals: [HIDDEN, HIDDEN],
      grandTotal: 11,
      withheld: true,
    });
    const tiny = protectTable({ counts: [[4, 0]] });
    expect(tiny.published.grandTotal).toBe(HIDDEN);
    expect(tiny.published.cells).toEqual([[HIDDEN, HIDDEN]]);
  });

  it('shows an empty table', () => {
    expect(protectTable({ counts: [[0, 0]] }).published).toEqual({
      cells: [[0, 0]],
      rowTotals: [0],
      columnTotals: [0, 0],
      grandTotal: 0,
      withheld: false,
    });
  });

  it('leaves a reader at least ten possibilities more than one for every hidden cell, by writing down every table that fits', () => {
    fc.assert(
      fc.property(smallTables, (table) => {
        const result = protectTable(table);
        if (result.hidden.grandTotal) return;
        const { low, high } = enumerateTables(table, result.hidden, leastInCell(result));
        result.hidden.cells.forEach((row, i) =>
          row.forEach((isHidden, j) => {
            if (!isHidden) return;
            expect((high[i]?.[j] ?? 0) - (low[i]?.[j] ?? 0)).toBeGreaterThanOrEqual(10);
            expect(high[i]?.[j] ?? 0).toBeGreaterThanOrEqual(11);
          }),
        );
      }),
      { seed: 11, numRuns: 300 },
    );
  });

  it('leaves no set of hidden cells alone whose total is certain and between 1 and 10', () => {
    fc.assert(
      fc.property(smallTables, (table) => {
        const result = protectTable(table);
        if (result.hidden.grandTotal) return;
        const cells = result.hidden.cells.flatMap((row, i) => row.flatMap((isHidden, j) => (isHidden ? [{ i, j }] : [])));
        const members = (subset: number) => cells.filter((_, at) => ((subset >> at) & 1) === 1);
        const people = (counts: CountTable['counts'], subset: number) => sum(members(subset).map(({ i, j }) => counts[i]?.[j] ?? 0));
        let suspects = Array.from({ length: 2 ** cells.length - 1 }, (_, at) => at + 1).filter(
          (subset) => people(table.counts, subset) <= 10,
        );
        visitTables(table, result.hidden, leastInCell(result), unlimited, (counts) => {
          suspects = suspects.filter((subset) => people(counts, subset) === people(table.counts, subset));
        });
        expect(suspects).toEqual([]);
      }),
      { seed: 12, numRuns: 150 },
    );
  });

  it('never shows 1 to 10, nor leaves a shown total with a hidden rest of 1 to 10', () => {
    fc.assert(
      fc.property(
        fc.array(fc.array(fc.integer({ min: 0, max: 40 }), { minLength: 4, maxLength: 4 }), { minLength: 1, maxLength: 6 }),
        (counts) => {
          const { published, hidden } = protectTable({ counts });
          const shown = [...published.cells.flat(), ...published.rowTotals, ...published.columnTotals, published.grandTotal];
          for (const count of shown) if (typeof count === 'number') expect(count === 0 || count >= 11).toBe(true);
          const rest = hiddenPeople({ counts }, hidden);
          rest.inRow.forEach((people, i) => expect(hidden.rowTotals[i] === true || people === 0 || people >= 11).toBe(true));
          rest.inColumn.forEach((people, j) => expect(hidden.columnTotals[j] === true || people === 0 || people >= 11).toBe(true));
        },
      ),
      { seed: 13, numRuns: 150 },
    );
  });

  it('finds no dearer pattern than an exhaustive search over cells', () => {
    fc.assert(
      fc.property(smallTables, (table) => {
        const cheapest = cheapestByTrial(table);
        const { audit, hidden } = protectTable(table);
        const hidesTotals = hidden.rowTotals.includes(true) || hidden.columnTotals.includes(true) || hidden.grandTotal;
        expect(hidesTotals ? undefined : audit.cost).toBe(cheapest);
      }),
      { seed: 14, numRuns: 120 },
    );
  });

  it('gives the same answer again, and adds nothing when its own answer is protected once more', () => {
    fc.assert(
      fc.property(smallTables, (table) => {
        const once = protectTable(table);
        expect(protectTable(table)).toEqual(once);
        const again = protectTable(table, { alsoHide: once.hidden });
        expect(again.hidden).toEqual(once.hidden);
        expect(again.published).toEqual(once.published);
      }),
      { seed: 15, numRuns: 150 },
    );
  });

  it('protects larger tables too, and says whether the choice is proven to be the least', () => {
    const counts = Array.from({ length: 30 }, (_, i) => Array.from({ length: 6 }, (_, j) => (i * 7 + j * 13 + i * j * 5) % 41));
    const { audit } = protectTable({ counts });
    expect(audit.intervals.length).toBeGreaterThan(40);
    expect(audit.intervals.every(({ low, high }) => high - low >= 10 && high >= 11)).toBe(true);
    expect(typeof audit.provenLeast).toBe('boolean');
  });

  it('takes a higher threshold from policy and refuses a lower one', () => {
    const counts = [
      [15, 40, 50],
      [60, 70, 80],
      [90, 30, 20],
    ];
    expect(protectTable({ counts }).published.cells[0]?.[0]).toBe(15);
    const strict = protectTable({ counts }, { smallestShown: 20 });
    expect(strict.published.cells[0]?.[0]).toBe(HIDDEN);
    expect(strict.audit.intervals.every(({ low, high }) => high - low >= 19 && high >= 20)).toBe(true);
    expect(() => protectTable({ counts }, { smallestShown: 10 })).toThrow(RangeError);
  });
});

/** Fewest people in complementary cells over all patterns that hide cells only; `undefined` when none is safe. */
function cheapestByTrial(table: CountTable): number | undefined {
  const cells = table.counts.flatMap((row, i) => row.map((count, j) => ({ i, j, count })));
  const isSmall = (count: number) => count > 0 && count < 11;
  const columns = table.counts[0]?.length ?? 0;
  const totals = [...table.counts.map(sum), ...Array.from({ length: columns }, (_, j) => sum(table.counts.map((row) => row[j] ?? 0)))];
  if (totals.some(isSmall)) return undefined;
  const free = cells.filter(({ count }) => count >= 11);
  let best: number | undefined;
  for (let choice = 0; choice < 2 ** free.length; choice++) {
    const chosen = free.filter((_, at) => ((choice >> at) & 1) === 1);
    const cost = sum(chosen.map(({ count }) => count));
    if (best !== undefined && cost >= best) continue;
    const isHidden = (i: number, j: number, count: number) => isSmall(count) || chosen.some((cell) => cell.i === i && cell.j === j);
    const intervals = intervalAudit(table, {
      cells: table.counts.map((row, i) => row.map((count, j) => isHidden(i, j, count))),
      rowTotals: table.counts.map(() => false),
      columnTotals: Array.from({ length: columns }, () => false),
      grandTotal: false,
    });
    if (intervals.every(({ low, high }) => high - low >= 10 && high >= 11)) best = cost;
  }
  return best;
}
