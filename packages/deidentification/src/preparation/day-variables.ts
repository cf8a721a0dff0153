import { tableOf } from '@cairnstep/dictionary';
import type { TableKey, Variable } from '@cairnstep/dictionary';

/** The variables of a table that hold a study day, so that a column of dates can be turned into them. */
export function dayVariables(table: TableKey): Variable[] {
  return tableOf(table).variables.filter(({ exposure, unit, key }) => exposure === 'time' && unit === 'days' && key.endsWith('_day'));
}
