/** Lines of a table that tell what everyone in them has in common, whatever their size. */
import type { CountTable, Place } from './count-table.ts';
import { placeAt, withTotals } from './count-table.ts';

/**
 * Rows, or columns, whose people all fall into one cell: whoever knows that somebody is in the line knows the cell. To be merged with
 * a neighbour or hidden when what the other direction says is sensitive (an outcome, not another label of the injury).
 *
 * @returns the totals of these lines, `{ row: 3, column: 'total' }` for row 3; lines of nobody disclose nothing
 * @throws RangeError for a malformed table
 */
export function homogeneousLines(table: CountTable, direction: 'rows' | 'columns'): Place[] {
  const full = withTotals(table);
  const lines = direction === 'rows' ? full.rows : full.columns;
  return Array.from({ length: lines }, (_, line) =>
    direction === 'rows' ? line * full.width + full.columns : full.rows * full.width + line,
  ).flatMap((totalAt, line) => {
    const total = full.values[totalAt] ?? 0;
    const cells = direction === 'rows' ? (table.counts[line] ?? []) : table.counts.map((row) => row[line] ?? 0);
    return total > 0 && cells.includes(total) ? [placeAt(full, totalAt)] : [];
  });
}
