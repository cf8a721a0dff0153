import { findMeasure, tableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { stringify } from 'csv-stringify/browser/esm/sync';
import type { TypedColumn, TypedTable } from '../table/typed-table.ts';
import { formatNumber } from './format-number.ts';

const manner = { record_delimiter: '\r\n' } as const;

/** The header row of a table's template, with the line end. */
export function csvHeader(table: TableKey): string {
  return stringify([tableOf(table).variables.map(({ key }) => key)], manner);
}

/** How the cells of a column are written; grades in their own spelling (`1+`). An empty cell is an empty text. */
function cellWriter(table: TypedTable, column: TypedColumn): (row: number) => string {
  const { measuredBy } = column.variable;
  const naming = measuredBy && table.column(measuredBy.column);
  const gradesOf = (row: number) => (naming ? findMeasure(`${measuredBy.prefix}${naming.word(row) ?? ''}`)?.grades : undefined);
  return (row) => {
    const cell = column.cell(row);
    if (cell === null) return '';
    if (typeof cell === 'string') return cell;
    return gradesOf(row)?.find(({ stored }) => stored === cell)?.written ?? formatNumber(cell);
  };
}

/**
 * A typed table as CSV text: every column of the dictionary in its order, comma separated, CRLF line ends. Encode it as
 * UTF-8 without a mark. Reading it back gives the same table.
 */
export function writeCsv(table: TypedTable): string {
  const writers = table.columns.map((column) => cellWriter(table, column));
  const rows = Array.from({ length: table.length }, (_, row) => writers.map((write) => write(row)));
  return csvHeader(table.key) + stringify(rows, manner);
}
