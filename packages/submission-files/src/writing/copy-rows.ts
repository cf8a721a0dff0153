/**
 * Rows in PostgreSQL's COPY text format, written as bytes: making one text of millions of small ones took three times
 * as long as reading and typing the rows.
 */
import type { TypedColumn, TypedTable } from '../table/typed-table.ts';
import { formatNumber } from './format-number.ts';

const TAB = 9;
const LF = 10;
const MINUS = 45;
const POINT = 46;
const ZERO = 48;

/** Special characters of the format (PostgreSQL 15 documentation, COPY, "Text Format"). */
const escapes: Readonly<Record<string, string>> = { '\\': '\\\\', '\t': '\\t', '\n': '\\n', '\r': '\\r' };

const encoder = new TextEncoder();
const powersOfTen = Array.from({ length: 10 }, (_, exponent) => 10 ** exponent);
const mostWhole = 999_999_999;
const encoded = (text: string): Uint8Array => encoder.encode(text.replace(/[\\\t\n\r]/g, (character) => escapes[character] ?? character));
const empty = encoder.encode('\\N');

/** Large enough that the call for each piece costs nothing beside its rows. */
const pieceBytes = 65_536;

/** Bytes that grow as they are written. */
class ByteText {
  private bytes = new Uint8Array(2 * pieceBytes);
  private length = 0;

  /** Makes room for so many more bytes. */
  private reserve(more: number): void {
    if (this.length + more <= this.bytes.length) return;
    const larger = new Uint8Array(Math.max(this.bytes.length * 2, this.length + more));
    larger.set(this.bytes.subarray(0, this.length));
    this.bytes = larger;
  }

  byte(value: number): void {
    this.reserve(1);
    this.bytes[this.length] = value;
    this.length += 1;
  }

  copy(from: Uint8Array): void {
    this.reserve(from.length);
    // Most pieces are a few bytes long, for which a call to `set` costs more than the loop.
    for (let index = 0; index < from.length; index += 1) this.bytes[this.length + index] = from[index] ?? 0;
    this.length += from.length;
  }

  /** The number as `formatNumber` writes it. */
  number(value: number): void {
    const size = Math.abs(value);
    if (size <= mostWhole && Number.isInteger(size)) this.digits(value < 0, size, 0);
    else {
      for (let decimals = 1, scale = 10; decimals <= 3 && size * scale < 1e9; decimals += 1, scale *= 10) {
        const whole = Math.round(size * scale);
        if (whole / scale === size) return this.digits(value < 0, whole, decimals);
      }
      this.copy(encoder.encode(formatNumber(value)));
    }
  }

  /** A whole number of at most nine digits with a decimal point before its last `decimals` digits. */
  private digits(isNegative: boolean, whole: number, decimals: number): void {
    let places = decimals + 1;
    while (places < 10 && whole >= (powersOfTen[places] ?? 0)) places += 1;
    const width = (isNegative ? 1 : 0) + places + (decimals > 0 ? 1 : 0);
    this.reserve(width);
    const { bytes } = this;
    let at = this.length + width;
    const point = decimals > 0 ? at - 1 - decimals : -1;
    let rest = whole | 0;
    for (let left = places; left > 0;) {
      at -= 1;
      if (at === point) bytes[at] = POINT;
      else {
        const shorter = (rest / 10) | 0;
        bytes[at] = ZERO + rest - shorter * 10;
        rest = shorter;
        left -= 1;
      }
    }
    if (isNegative) bytes[at - 1] = MINUS;
    this.length += width;
  }

  get size(): number {
    return this.length;
  }

  /** Hands over what was written and begins anew. */
  take(): Uint8Array {
    const taken = this.bytes.slice(0, this.length);
    this.length = 0;
    return taken;
  }
}

/** Writes the cell of a row. */
function cellWriter(column: TypedColumn, to: ByteText): (row: number) => void {
  const words = new Map<string, Uint8Array>();
  return (row) => {
    const number = column.number(row);
    if (number !== null) {
      to.number(number);
      return;
    }
    const word = column.word(row);
    if (word === null) {
      to.copy(empty);
      return;
    }
    let bytes = words.get(word);
    if (!bytes) words.set(word, (bytes = encoded(word)));
    to.copy(bytes);
  };
}

export interface CopyOptions {
  /** Adds the line of the file on which the row begins. */
  readonly withLine?: boolean;
  /** Cells of a row that come last, such as what is worked out from it; null for an empty one. */
  readonly further?: (row: number) => readonly (string | null)[];
}

/**
 * The rows of a table in PostgreSQL's COPY text format, one line each, in UTF-8, piece by piece; a piece ends with a row.
 * @param columns Keys of the columns, in the order of the COPY statement; line and further cells come after them.
 */
export function* copyRows(table: TypedTable, columns: readonly string[], { withLine, further }: CopyOptions = {}): Generator<Uint8Array> {
  const text = new ByteText();
  const writers = columns.map((key) => cellWriter(table.column(key), text));
  for (let row = 0; row < table.length; row += 1) {
    writers.forEach((write, index) => {
      if (index > 0) text.byte(TAB);
      write(row);
    });
    if (withLine) {
      text.byte(TAB);
      text.number(table.lines[row] ?? 0);
    }
    for (const cell of further?.(row) ?? []) {
      text.byte(TAB);
      text.copy(cell === null ? empty : encoded(cell));
    }
    text.byte(LF);
    if (text.size >= pieceBytes) yield text.take();
  }
  if (text.size > 0) yield text.take();
}
