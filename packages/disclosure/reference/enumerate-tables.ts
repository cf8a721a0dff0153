/** The slow, obvious way: writes down every whole-number table that fits what is published. For tests on small tables. */
import type { CountTable, HiddenPattern } from '../src/index.ts';

export interface Enumeration {
  readonly tables: number;
  /** Smallest and largest value per cell over all tables, rows by columns. */
  readonly low: number[][];
  readonly high: number[][];
}

type OfCell = (row: number, column: number) => number;
const unlimited: OfCell = () => Number.POSITIVE_INFINITY;

/** How many tables there are, and how far each cell varies. */
export function enumerateTables(table: CountTable, hidden: HiddenPattern, least: OfCell, most: OfCell = unlimited): Enumeration {
  const low = table.counts.map((row) => row.map(() => Number.POSITIVE_INFINITY));
  const high = table.counts.map((row) => row.map(() => Number.NEGATIVE_INFINITY));
  let tables = 0;
  visitTables(table, hidden, least, most, (counts) => {
    tables++;
    counts.forEach((row, i) =>
      row.forEach((count, j) => {
        (low[i] as number[])[j] = Math.min(low[i]?.[j] ?? 0, count);
        (high[i] as number[])[j] = Math.max(high[i]?.[j] ?? 0, count);
      }),
    );
  });
  return { tables, low, high };
}

/**
 * Calls `visit` with each table; the array is reused, so copy what is kept.
 *
 * @param least what a reader knows a hidden cell to hold at least
 * @param most the same at most
 */
export function visitTables(
  { counts }: CountTable,
  hidden: HiddenPattern,
  least: OfCell,
  most: OfCell,
  visit: (counts: readonly (readonly number[])[]) => void,
): void {
  const sum = (numbers: readonly number[]) => numbers.reduce((a, b) => a + b, 0);
  const columns = counts[0]?.length ?? 0;
  const places = counts.flatMap((row, i) => row.flatMap((_, j) => (hidden.cells[i]?.[j] === true ? [{ i, j }] : [])));
  const open = places.map(({ i, j }, at) => ({
    i,
    j,
    lastInRow: !places.slice(at + 1).some((later) => later.i === i),
    lastInColumn: !places.slice(at + 1).some((later) => later.j === j),
  }));
  const shownIn = (row: readonly number[], i: number) => sum(row.filter((_, j) => hidden.cells[i]?.[j] !== true));
  const rowLeft = counts.map((row, i) => (hidden.rowTotals[i] === true ? Number.POSITIVE_INFINITY : sum(row) - shownIn(row, i)));
  const columnLeft = Array.from({ length: columns }, (_, j) =>
    hidden.columnTotals[j] === true
      ? Number.POSITIVE_INFINITY
      : sum(counts.map((row, i) => (hidden.cells[i]?.[j] === true ? (row[j] ?? 0) : 0))),
  );
  let allLeft = hidden.grandTotal ? Number.POSITIVE_INFINITY : sum(counts.map((row, i) => sum(row) - shownIn(row, i)));
  if (allLeft === Number.POSITIVE_INFINITY) throw new RangeError('Without a published grand total there is no end of tables.');

  const current = counts.map((row) => [...row]);
  const isDone = (left: number) => left === 0 || left === Number.POSITIVE_INFINITY;
  const fill = (at: number): void => {
    const cell = open[at];
    if (cell === undefined) {
      if (allLeft !== 0 || !rowLeft.every(isDone) || !columnLeft.every(isDone)) return;
      visit(current);
      return;
    }
    const { i, j, lastInRow, lastInColumn } = cell;
    const forced = [...(lastInRow ? [rowLeft[i] ?? 0] : []), ...(lastInColumn ? [columnLeft[j] ?? 0] : [])].filter(Number.isFinite);
    const from = Math.max(least(i, j), ...forced);
    const top = Math.min(rowLeft[i] ?? 0, columnLeft[j] ?? 0, allLeft, most(i, j), ...forced);
    for (let value = from; value <= top; value++) {
      (current[i] as number[])[j] = value;
      rowLeft[i] = (rowLeft[i] ?? 0) - value;
      columnLeft[j] = (columnLeft[j] ?? 0) - value;
      allLeft -= value;
      fill(at + 1);
      rowLeft[i] = (rowLeft[i] ?? 0) + value;
      columnLeft[j] = (columnLeft[j] ?? 0) + value;
      allLeft += value;
    }
  };
  fill(0);
}
