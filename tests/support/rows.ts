/** Rows and files of a submission: the dictionary's example with what a test cares about. */
import { exampleRow, type Row, type TableKey } from '../../packages/dictionary/src/index.ts';
import { tableFromRows, writeCsv } from '../../packages/submission-files/src/index.ts';

/** Null empties a cell of the example. */
export type Overrides = Readonly<Record<string, string | number | null>>;

export const participantCode = (number: number): string => `S${String(number).padStart(21, '0')}`;

export function rowOf(table: TableKey, overrides: Overrides = {}): Row {
  const row = { ...exampleRow(table), ...overrides };
  return Object.fromEntries(Object.entries(row).filter((entry): entry is [string, string | number] => entry[1] !== null));
}

export const csvOf = (table: TableKey, rows: readonly Row[]): string => writeCsv(tableFromRows(table, rows));
