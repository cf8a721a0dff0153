import { variableOf } from '@cairnstep/dictionary';
import type { CleanTable, TablePreview } from './month.ts';

const rowsShown = 20;

/** What a person looks over before anything is sent: the first rows, and every different word of the columns that hold words. */
export function previewOf({ table, headers, rows }: CleanTable): TablePreview {
  const distinct = headers.flatMap((column, position) => {
    const { type, missingCodes = [] } = variableOf(table, column);
    const isNumber = (type === 'integer' || type === 'decimal') && missingCodes.length === 0;
    if (isNumber || type === 'pseudonym') return [];
    const counts = new Map<string, number>();
    for (const row of rows) {
      const value = row[position] ?? '';
      if (value !== '') counts.set(value, (counts.get(value) ?? 0) + 1);
    }
    const values = [...counts].sort(([one], [other]) => (one < other ? -1 : 1)).map(([value, count]) => ({ value, count }));
    return [{ column, values }];
  });
  return { table, headers, rows: rows.slice(0, rowsShown), distinct };
}
