import type { Condition, Row, Variable } from './types.ts';

/** Whether another column of the row has one of the condition's values. */
export function holds(condition: Condition, row: Row): boolean {
  const value = row[condition.column];
  return value !== undefined && condition.isOneOf.includes(String(value));
}

/** Whether this cell must be filled, given the rest of its row. */
export function isRequired(variable: Variable, row: Row): boolean {
  const { required } = variable;
  switch (required.when) {
    case 'always':
      return true;
    case 'optional':
      return false;
    case 'with':
      return row[required.column] !== undefined;
    case 'if':
      return holds(required, row) && (required.and === undefined || holds(required.and, row));
  }
}

/** Whether this cell must stay empty, given the rest of its row. */
export function mustBeEmpty(variable: Variable, row: Row): boolean {
  return variable.emptyUnless !== undefined && !holds(variable.emptyUnless, row);
}
