import type { Range, Variable } from '@cairnstep/dictionary';
import type { TypedColumn } from '../table/typed-table.ts';
import type { CheckedTable } from './checked-table.ts';
import { measureOfRow } from './measure-of-row.ts';

/** Limits of a number: the column's own, or those of the measure that the row names. */
export interface Limits {
  readonly hard?: Range | undefined;
  readonly plausible?: Range | undefined;
  readonly unit?: string | undefined;
  /** The numbers that grades are stored as, where only certain ones exist. */
  readonly grades?: ReadonlySet<number> | undefined;
}

function limitsOfRow(table: CheckedTable, variable: Variable): ((row: number) => Limits) | null {
  const measure = measureOfRow(table, variable);
  if (!measure) return null;
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

/** What is wrong with a number under its limits, in words; null when nothing is. */
export type Judge = (value: number, limits: Limits) => string | null;

/**
 * Judges every number of the file's rows in a table.
 * @param isClear Whether a column whose numbers all lie between these two needs no look at each.
 */
export function judgeNumbers(
  table: CheckedTable,
  isClear: (extent: { readonly min: number; readonly max: number }, limits: Limits) => boolean,
  judge: Judge,
  tell: (row: number, column: TypedColumn, found: string) => void,
): void {
  for (const column of table.columns) {
    const { variable } = column;
    const limitsOf = limitsOfRow(table, variable);
    const extent = column.extent(table.fileRows);
    if (extent.min > extent.max || (!limitsOf && isClear(extent, variable))) continue;
    for (let row = 0; row < table.fileRows; row += 1) {
      const value = column.number(row);
      const found = value === null ? null : judge(value, limitsOf?.(row) ?? variable);
      if (found !== null) tell(row, column, found);
    }
  }
}

export function isWithin(value: number, range: Range | undefined): boolean {
  return !range || (value >= range.min && value <= range.max);
}

/** `above the hard limit of 3 m/s`, without the value. */
export function beyond(value: number, kind: string, range: Range, unit: string | undefined): string {
  const [side, limit] = value < range.min ? ['below', range.min] : ['above', range.max];
  return `A number ${side} the ${kind} limit of ${limit}${unit === undefined ? '' : ` ${unit}`}.`;
}
