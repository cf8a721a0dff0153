import { tableOf } from './dictionary.ts';
import { pseudonymPattern } from './pseudonym.ts';
import type { Code, TableKey, Variable } from './types.ts';

/** A field of a Frictionless Table Schema (version 2.0, readable as 1.0). Members of our own begin with `x-`. */
export interface DataPackageField {
  readonly name: string;
  readonly title: string;
  readonly description: string;
  readonly type: 'string' | 'integer' | 'number';
  /** Repeated in `constraints.enum`, because readers of version 1.0 do not know categories. */
  readonly categories?: readonly { readonly value: string; readonly label: string }[];
  readonly constraints?: {
    readonly required?: true;
    readonly minimum?: number;
    readonly maximum?: number;
    readonly pattern?: string;
    readonly enum?: readonly string[];
  };
  readonly 'x-unit'?: string;
  /** Codes that say why a value is absent. They are categories too: only an empty cell is missing to a reader. */
  readonly 'x-missing'?: readonly Code[];
}

const fieldTypes = { integer: 'integer', decimal: 'number', code: 'string', flag: 'string', pseudonym: 'string' } as const;

function dataPackageField(variable: Variable): DataPackageField {
  const { key, name, definition, type, unit, hard, codes, missingCodes, required } = variable;
  const allCodes = codes && [...codes, ...(missingCodes ?? [])];
  const constraints = {
    ...(required.when === 'always' ? { required: true as const } : {}),
    ...(hard ? { minimum: hard.min, maximum: hard.max } : {}),
    ...(type === 'pseudonym' ? { pattern: pseudonymPattern.source } : {}),
    ...(allCodes ? { enum: allCodes.map(({ code }) => code) } : {}),
  };
  return {
    name: key,
    title: name,
    description: definition,
    type: fieldTypes[type],
    ...(allCodes ? { categories: allCodes.map(({ code, label }) => ({ value: code, label })) } : {}),
    ...(Object.keys(constraints).length > 0 ? { constraints } : {}),
    ...(unit === undefined ? {} : { 'x-unit': unit }),
    ...(missingCodes ? { 'x-missing': missingCodes } : {}),
  };
}

/** The fields of a table for a data package descriptor, in the order of the columns. */
export function dataPackageFields(table: TableKey): DataPackageField[] {
  return tableOf(table).variables.map(dataPackageField);
}
