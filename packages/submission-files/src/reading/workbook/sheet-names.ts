/** Which table a sheet is, by its name. */
import { dictionary } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { foldName } from '../../table/header-names.ts';

/** Sheets that the template and the workbook of findings bring besides the tables. They are not read. */
export const otherSheets = {
  start: 'Start',
  definitions: 'Definitions',
  measures: 'Measures',
  lists: 'Lists',
  findings: 'Findings',
} as const;

const tables = new Map(dictionary.tables.flatMap(({ key, name }) => [key, name].map((written) => [foldName(written), key] as const)));
const others: ReadonlySet<string> = new Set(Object.values(otherSheets).map(foldName));

/** The table, by its key or name, however it is spaced or capitalised; `other` for a sheet that is not read; null for one nobody declared. */
export function meaningOfSheet(name: string): TableKey | 'other' | null {
  const folded = foldName(name);
  return tables.get(folded) ?? (others.has(folded) ? 'other' : null);
}
