import { adverseEvents } from './tables/adverse-events.ts';
import { assessments } from './tables/assessments.ts';
import { bouts } from './tables/bouts.ts';
import { consents } from './tables/consents.ts';
import { exams } from './tables/exams.ts';
import { participants } from './tables/participants.ts';
import { sessions } from './tables/sessions.ts';
import type { Dictionary, Table, TableKey, Variable } from './types.ts';

/** The dictionary in force. Tables stand in the order in which they refer to each other. */
export const dictionary: Dictionary = {
  version: '1.0',
  tables: [participants, consents, exams, assessments, sessions, bouts, adverseEvents],
};

const tables = new Map(dictionary.tables.map((table) => [table.key, table]));
const variables = new Map(
  dictionary.tables.flatMap((table) => table.variables.map((variable) => [`${table.key}.${variable.key}`, variable] as const)),
);

/** The table with this key. */
export function tableOf(key: TableKey): Table {
  const found = tables.get(key);
  if (!found) throw new RangeError(`the dictionary has no table ${key}`);
  return found;
}

/** The variable of a table. Throws a RangeError when the table has no such column. */
export function variableOf(table: TableKey, key: string): Variable {
  const found = variables.get(`${table}.${key}`);
  if (!found) throw new RangeError(`the table ${table} has no such column`);
  return found;
}
