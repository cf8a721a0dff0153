/** Each variable and each measure of the dictionary has an address of its own. */
import { dictionary, findMeasure } from '@cairnstep/dictionary';
import type { Measure, TableKey, Variable } from '@cairnstep/dictionary';

export function variableAddress({ table, key }: Pick<Variable, 'table' | 'key'>): string {
  return `/dictionary/${table}/${key}`;
}

export function measureAddress(key: string): string {
  return `/dictionary/measures/${key}`;
}

/** All variables of one table. */
export function tableAddress(table: TableKey): string {
  return `/dictionary?show=${table}`;
}

/** What the parts of an address name; undefined when the dictionary has no such column. */
export function variableAt(table: string | undefined, column: string | undefined): Variable | undefined {
  return dictionary.tables.find(({ key }) => key === table)?.variables.find(({ key }) => key === column);
}

export function measureAt(key: string | undefined): Measure | undefined {
  return key === undefined ? undefined : findMeasure(key);
}
