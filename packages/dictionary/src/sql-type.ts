import type { Variable } from './types.ts';

/** PostgreSQL type of the column that holds a variable. Decimals are double precision: a converted unit has no last digit. */
export function sqlType(variable: Variable): 'text' | 'integer' | 'double precision' {
  switch (variable.type) {
    case 'integer':
      return 'integer';
    case 'decimal':
      return 'double precision';
    case 'code':
    case 'flag':
    case 'pseudonym':
      return 'text';
  }
}
