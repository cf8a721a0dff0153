import type { Range, Variable } from '@cairnstep/dictionary';
import type { CheckedTable } from './checked-table.ts';
import { measureOfRow } from './measure-of-row.ts';

export interface Limits {
  readonly hard?: Range | undefined;
  readonly plausible?: Range | undefined;
  readonly unit?: string | undefined;
  /** The numbers that grades are stored as, where only certain ones exist. */
  readonly grades?: ReadonlySet<number> | undefined;
}

/**
 * The limits of a column's numbers, row by row: those of the measure that the row names, else the column's own.
 * Null for a column of words.
 */
export function limitsOfRow(table: CheckedTable, variable: Variable): ((row: number) => Limits) | null {
  if (variable.type !== 'integer' && variable.type !== 'decimal') return null;
  const measure = measureOfRow(table, variable);
  if (!measure) return () => variable;
  const known = new Map<string, Limits>();
  return (row) => {
    const named = measure(row);
    if (!named) return variable;
    let limits = known.get(named.key);
    if (!limits) {
      const { hard, plausible, unit, grades } = named;
      known.set(named.key, (limits = { hard, plausible, unit, grades: grades && new Set(grades.map(({ stored }) => stored)) }));
    }
    return limits;
  };
}
