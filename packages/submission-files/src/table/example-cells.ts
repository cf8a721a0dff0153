import { exampleRow, tableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { formatNumber } from '../writing/format-number.ts';

/** Stands in the participant's cell of the example row of the template, so that the row is taken for nobody's. */
export const exampleMark = 'EXAMPLE';

/** The example row of a table's template by column, as its cells are written. */
export function exampleCells(table: TableKey): ReadonlyMap<string, string> {
  const example = exampleRow(table);
  return new Map(
    tableOf(table).variables.map(({ key, type }) => {
      const value = type === 'pseudonym' ? exampleMark : (example[key] ?? '');
      return [key, typeof value === 'number' ? formatNumber(value) : value];
    }),
  );
}
