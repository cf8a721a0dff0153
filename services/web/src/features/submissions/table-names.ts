/** Tables and columns as the dictionary names them. */
import { tableOf, tableKeys } from '@cairnstep/dictionary';
import type { TableKey } from './submissions.queries.ts';

/** In the order in which the tables refer to each other. */
export const tables = tableKeys.map((key) => ({ key, name: tableOf(key).name }));

/** "Workbook" for what is about all its tables together. */
export const tableName = (key: TableKey | null): string => (key === null ? 'Workbook' : tableOf(key).name);

/** "Distance, m"; the key itself for a column no table has. */
export function columnName(table: TableKey, key: string): string {
  const variable = tableOf(table).variables.find((known) => known.key === key);
  if (variable === undefined) return key;
  return variable.unit === undefined || variable.unit === '1' ? variable.name : `${variable.name}, ${variable.unit}`;
}

export const isColumn = (table: TableKey | null, key: string): boolean =>
  table !== null && tableOf(table).variables.some((known) => known.key === key);
