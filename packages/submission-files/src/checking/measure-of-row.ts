import { findMeasure } from '@cairnstep/dictionary';
import type { Measure, Variable } from '@cairnstep/dictionary';
import type { CheckedTable } from './checked-table.ts';

/** The measure that decides unit, limits and step of a column's cells, row by row; null for a column with limits of its own. */
export function measureOfRow(table: CheckedTable, { measuredBy }: Variable): ((row: number) => Measure | undefined) | null {
  if (!measuredBy) return null;
  const naming = table.column(measuredBy.column);
  const known = new Map<string, Measure | undefined>();
  return (row) => {
    const code = naming.word(row);
    if (code === null) return undefined;
    if (!known.has(code)) known.set(code, findMeasure(measuredBy.prefix + code));
    return known.get(code);
  };
}
