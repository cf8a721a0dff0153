/** Slices of one table (by sex, by site group …) and the table of all of them together, as linked figures for the audit. */
import type { CountTable, HiddenPattern, Place, TableWithTotals } from './count-table.ts';
import { flagsOf, placeAt, withTotals } from './count-table.ts';
import type { LinkedFigure, LinkedTables } from './linked-audit.ts';

/** Where a figure stands: in a slice, or in the table of all. */
export interface SlicePlace extends Place {
  readonly slice: string | 'all';
}

export interface Slice {
  readonly name: string;
  readonly table: CountTable;
  readonly hidden: HiddenPattern;
}

/**
 * @param slices tables of the same shape; everybody is in exactly one
 * @param collapsed what is hidden in the table of all
 * @throws RangeError when the slices differ in shape
 */
export function linkSlices(slices: readonly Slice[], collapsed: HiddenPattern): LinkedTables<SlicePlace> {
  const tables = slices.map((slice) => ({ ...slice, full: withTotals(slice.table) }));
  const [first] = tables;
  if (first === undefined) throw new RangeError('There is no slice.');
  const { rows, columns } = first.full;
  if (tables.some(({ full }) => full.rows !== rows || full.columns !== columns)) throw new RangeError('The slices differ in shape.');

  const perSlice = rows * columns;
  const atoms = slices.flatMap(({ table }) => table.counts.flat());
  const figuresOf = (slice: string, full: TableWithTotals, hidden: HiddenPattern, offsets: readonly number[]): LinkedFigure<SlicePlace>[] =>
    flagsOf(full, hidden).map((isHidden, position) => {
      const place = placeAt(full, position);
      const cells = cellsOf(full, place);
      return { label: { slice, ...place }, atoms: offsets.flatMap((offset) => cells.map((cell) => offset + cell)), hidden: isHidden };
    });
  return {
    atoms,
    figures: [
      ...tables.flatMap(({ name, full, hidden }, at) => figuresOf(name, full, hidden, [at * perSlice])),
      ...figuresOf(
        'all',
        first.full,
        collapsed,
        tables.map((_, at) => at * perSlice),
      ),
    ],
  };
}

/** Cells that add up to a place, numbered row by row without totals. */
function cellsOf({ rows, columns }: TableWithTotals, { row, column }: Place): number[] {
  const inRows = row === 'total' ? Array.from({ length: rows }, (_, i) => i) : [row];
  const inColumns = column === 'total' ? Array.from({ length: columns }, (_, j) => j) : [column];
  return inRows.flatMap((i) => inColumns.map((j) => i * columns + j));
}
