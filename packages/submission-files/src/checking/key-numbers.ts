/** Keys of rows as single numbers: mixed radix over the hard limits of the columns, so that no text is built for a row. */
import type { TypedColumn, TypedTable } from '../table/typed-table.ts';

/** Numbers participant codes across all tables of a submission. */
export class Persons {
  private readonly numbers = new Map<string, number>();

  number(code: string): number {
    let number = this.numbers.get(code);
    if (number === undefined) this.numbers.set(code, (number = this.numbers.size));
    return number;
  }
}

interface Digit {
  readonly size: number;
  /** -1 where the cell is empty or beyond the limits of its column. */
  readonly digitOf: (row: number) => number;
}

function digit(column: TypedColumn): Digit {
  const { codes, hard, key } = column.variable;
  if (codes) {
    const digits = new Map(codes.map(({ code }, index) => [code, index]));
    return { size: codes.length, digitOf: (row) => digits.get(column.word(row) ?? '') ?? -1 };
  }
  if (!hard) throw new Error(`The column ${key} has no limits and cannot be part of a key.`);
  const size = hard.max - hard.min + 1;
  const digitOf = (row: number): number => {
    const value = column.number(row);
    return value !== null && Number.isInteger(value) && value >= hard.min && value <= hard.max ? value - hard.min : -1;
  };
  return { size, digitOf };
}

/**
 * Per row the number of its key: equal for rows that agree in participant and in the columns given, in whatever table they
 * stand as long as the columns have the same limits; -1 when part of the key is empty or impossible.
 */
export function keyNumbers(table: Pick<TypedTable, 'column' | 'length'>, persons: Persons, columns: readonly string[]): Float64Array {
  const participant = table.column('participant');
  const digits = columns.map((key) => digit(table.column(key)));
  const keys = new Float64Array(table.length).fill(-1);
  for (let row = 0; row < table.length; row += 1) {
    const code = participant.word(row);
    if (code === null) continue;
    let number = persons.number(code);
    for (const { size, digitOf } of digits) {
      const next = digitOf(row);
      number = next < 0 || number < 0 ? -1 : number * size + next;
    }
    keys[row] = number;
  }
  return keys;
}
