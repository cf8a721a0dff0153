import { fitsRange, pseudonymPattern } from '@cairnstep/dictionary';
import type { Variable } from '@cairnstep/dictionary';
import type { ColumnRole } from './detection-context.ts';

/** The role a variable's column has. */
export function roleOf({ type }: Variable): ColumnRole {
  if (type === 'pseudonym') return 'pseudonym';
  return type === 'integer' || type === 'decimal' ? 'number' : 'unknown';
}

const plainNumber = /^-?\d{1,12}(?:\.\d{1,12})?$/;

/** Tells the cells that hold just what the dictionary allows in this column; they identify nobody beyond what it has weighed. */
export function declaredCells({ type, hard, codes = [], missingCodes = [] }: Variable): (cell: string) => boolean {
  const words = new Set([...codes, ...missingCodes].map(({ code }) => code.toLowerCase()));
  switch (type) {
    case 'pseudonym':
      return (cell) => pseudonymPattern.test(cell);
    case 'integer':
    case 'decimal':
      return (cell) => (plainNumber.test(cell) && hard !== undefined && fitsRange(Number(cell), hard)) || words.has(cell.toLowerCase());
    case 'code':
    case 'flag':
      return (cell) => words.has(cell.toLowerCase());
  }
}
