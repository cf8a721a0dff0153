/** A two-way table of people and what can be asked of it: totals, places, the pattern of what is hidden. */

/** Counts of people, rows by columns. Every row has the same length; every count is a whole number from 0. */
export interface CountTable {
  readonly counts: readonly (readonly number[])[];
}

/** A cell, or one of the totals: `{ row: 2, column: 'total' }` is the total of row 2, `total` twice the grand total. */
export interface Place {
  readonly row: number | 'total';
  readonly column: number | 'total';
}

/** Something said of every place of a table. `cells` are rows by columns, as the counts. */
export interface PerPlace<T> {
  readonly cells: readonly (readonly T[])[];
  readonly rowTotals: readonly T[];
  readonly columnTotals: readonly T[];
  readonly grandTotal: T;
}

/** What a reader does not see: `true` is hidden. */
export type HiddenPattern = PerPlace<boolean>;

/** A table with its totals as one more row and column, stored row by row: place (i, j) is at `i * width + j`. */
export interface TableWithTotals {
  readonly rows: number;
  readonly columns: number;
  readonly width: number;
  readonly values: readonly number[];
}

/**
 * Adds the totals.
 *
 * @throws RangeError when the table is empty, ragged, or holds anything but whole numbers from 0.
 */
export function withTotals(table: CountTable): TableWithTotals {
  const rows = table.counts.length;
  const columns = table.counts[0]?.length ?? 0;
  if (rows === 0 || columns === 0) throw new RangeError('A table needs at least one row and one column.');
  const width = columns + 1;
  const values = new Array<number>((rows + 1) * width).fill(0);
  const add = (at: number, count: number) => {
    values[at] = (values[at] ?? 0) + count;
  };
  table.counts.forEach((row, i) => {
    if (row.length !== columns) throw new RangeError('Every row of a table needs the same number of columns.');
    row.forEach((count, j) => {
      if (!Number.isSafeInteger(count) || count < 0) throw new RangeError('Counts of people are whole numbers from 0.');
      add(i * width + j, count);
      add(i * width + columns, count);
      add(rows * width + j, count);
      add(rows * width + columns, count);
    });
  });
  return { rows, columns, width, values };
}

/** The place stored at a position of a table with totals. */
export function placeAt(table: TableWithTotals, position: number): Place {
  const row = Math.floor(position / table.width);
  const column = position % table.width;
  return { row: row === table.rows ? 'total' : row, column: column === table.columns ? 'total' : column };
}

/** The position of a place; the reverse of `placeAt`. */
export function positionOf(table: TableWithTotals, place: Place): number {
  const row = place.row === 'total' ? table.rows : place.row;
  const column = place.column === 'total' ? table.columns : place.column;
  return row * table.width + column;
}

/** The pattern as one flag per place, in the order of the table with totals. */
export function flagsOf(table: TableWithTotals, pattern: HiddenPattern): boolean[] {
  const fits =
    pattern.cells.length === table.rows &&
    pattern.cells.every((row) => row.length === table.columns) &&
    pattern.rowTotals.length === table.rows &&
    pattern.columnTotals.length === table.columns;
  if (!fits) throw new RangeError('The pattern of hidden places does not have the shape of the table.');
  return [...pattern.cells.flatMap((row, i) => [...row, pattern.rowTotals[i] === true]), ...pattern.columnTotals, pattern.grandTotal];
}

/** Says something of every place, by its position in the table with totals. */
export function perPlace<T>(table: TableWithTotals, of: (position: number) => T): PerPlace<T> {
  const at = (row: number, column: number) => of(row * table.width + column);
  const rowNumbers = Array.from({ length: table.rows }, (_, i) => i);
  const columnNumbers = Array.from({ length: table.columns }, (_, j) => j);
  return {
    cells: rowNumbers.map((i) => columnNumbers.map((j) => at(i, j))),
    rowTotals: rowNumbers.map((i) => at(i, table.columns)),
    columnTotals: columnNumbers.map((j) => at(table.rows, j)),
    grandTotal: at(table.rows, table.columns),
  };
}
