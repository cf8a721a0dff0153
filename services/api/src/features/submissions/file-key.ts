import type { TableKey } from '@cairnstep/dictionary';

/** A submission has at most one CSV file of each table, and one workbook. */
export type FileKey = TableKey | 'workbook';

/** The table of a CSV file; null for the workbook. */
export const tableOfFile = (key: FileKey): TableKey | null => (key === 'workbook' ? null : key);

/** The tables that come with these files, each once; of a workbook known after the check. */
export const tablesOf = (files: readonly { readonly tables: readonly TableKey[] | null }[]): TableKey[] => [
  ...new Set(files.flatMap(({ tables }) => tables ?? [])),
];
