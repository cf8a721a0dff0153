/**
 * CSV of an export (RFC 4180: comma, CRLF, UTF-8 without mark). A number matches a plain decimal, a text its code list or the pattern of
 * pseudonyms, so no cell can begin a spreadsheet formula. A cell that fits neither ends the build: nothing is written then.
 */
import { stringify } from 'csv-stringify/sync';
import { exportTables, type ExportCell, type ExportColumn, type ExportTableKey } from './export-tables.ts';

export const pseudonymPattern = /^R[0-9A-HJKMNP-TV-Z]{12}$/;

/** At most six decimals, which is finer than any instrument here and drops the dust of binary sums; never an exponent. */
const decimal = (value: number): string => (Number.isInteger(value) ? String(value) : value.toFixed(6).replace(/\.?0+$/, ''));

function written(column: ExportColumn, cell: ExportCell): string {
  if (cell === null) return '';
  const fits =
    column.type === 'pseudonym'
      ? typeof cell === 'string' && pseudonymPattern.test(cell)
      : column.type === 'code'
        ? typeof cell === 'string' && column.codes?.some((one) => one.code === cell) === true
        : typeof cell === 'number' && Number.isFinite(cell) && (column.type === 'decimal' || Number.isInteger(cell));
  if (!fits) throw new Error(`A cell of the column ${column.key} is not of its kind.`);
  return typeof cell === 'number' ? decimal(cell) : cell;
}

export function exportCsv(key: ExportTableKey, rows: readonly (readonly ExportCell[])[]): string {
  const columns = exportTables[key];
  const body = rows.map((row) => columns.map((column, index) => written(column, row[index] ?? null)));
  return stringify([columns.map((column) => column.key), ...body], { record_delimiter: '\r\n' });
}

export function codebookCsv(tables: readonly ExportTableKey[]): string {
  const rows = tables.flatMap((table) =>
    exportTables[table].map(({ key, definition, type, unit, codes }) => [
      table,
      key,
      definition,
      type,
      unit ?? '',
      (codes ?? []).map(({ code, label }) => (code === label ? code : `${code}: ${label}`)).join('; '),
      'empty = not recorded',
    ]),
  );
  return stringify([['table', 'column', 'definition', 'type', 'unit', 'codes', 'missing'], ...rows], { record_delimiter: '\r\n' });
}
