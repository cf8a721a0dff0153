/** The dictionary's conditions between cells of a row, made ready to be asked for many rows of one table. */
import type { Condition, Variable } from '@cairnstep/dictionary';
import type { CheckedTable } from './checked-table.ts';

export type RowTest = (row: number) => boolean;

/** The same as the dictionary's `holds`. */
export function conditionTest(table: CheckedTable, { column, isOneOf }: Condition): RowTest {
  const other = table.column(column);
  const wanted = new Set(isOneOf);
  return (row) => {
    const cell = other.cell(row);
    return cell !== null && wanted.has(String(cell));
  };
}

/** The same as the dictionary's `isRequired`; null for a cell that never is. */
export function requirementTest(table: CheckedTable, { required }: Variable): RowTest | null {
  switch (required.when) {
    case 'always':
      return () => true;
    case 'optional':
      return null;
    case 'with': {
      const other = table.column(required.column);
      return (row) => other.cell(row) !== null;
    }
    case 'if': {
      const first = conditionTest(table, required);
      const second = required.and && conditionTest(table, required.and);
      return second ? (row) => first(row) && second(row) : first;
    }
  }
}
