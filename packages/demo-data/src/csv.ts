import type { Row, TableKey } from '@cairnstep/dictionary';
import { tableOf } from '@cairnstep/dictionary';
import { tableFromRows, writeCsv } from '@cairnstep/submission-files';
import type { DemoRow } from './types.ts';

/** Rows by column, as the dictionary types them. */
export function typedRows(table: TableKey, rows: readonly DemoRow[]): Row[] {
  const { variables } = tableOf(table);
  return rows.map((row) => Object.fromEntries(variables.flatMap(({ key }, column) => (row[column] == null ? [] : [[key, row[column]]]))));
}

/** The CSV file of a table, UTF-8, as a clinic would send it. */
export function demoCsv(table: TableKey, rows: readonly DemoRow[]): Uint8Array {
  return new TextEncoder().encode(writeCsv(tableFromRows(table, typedRows(table, rows))));
}
