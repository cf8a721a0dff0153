import { tableOf } from './dictionary.ts';
import type { TableKey, Variable } from './types.ts';

const literal = (text: string): string => `'${text.replaceAll("'", "''")}'`;

function conditionOf({ key, type, codes = [], missingCodes = [], hard }: Variable): string | undefined {
  if (type === 'code' || type === 'flag') {
    const allowed = [...codes, ...missingCodes].map(({ code }) => literal(code));
    return allowed.length > 0 ? `${key} in (${allowed.join(', ')})` : undefined;
  }
  return hard && `${key} between ${String(hard.min)} and ${String(hard.max)}`;
}

/**
 * What a row of a table must satisfy column by column, as one SQL condition: codes and hard limits. An empty cell satisfies it; whether it may
 * be empty is `isRequired`'s business. Limits that depend on another column are checked before a row comes to the database.
 */
export function sqlCheck(table: TableKey): string {
  return tableOf(table)
    .variables.flatMap((variable) => conditionOf(variable) ?? [])
    .join(' and ');
}
