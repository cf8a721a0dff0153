/**
 * The rows of nearly every file: cells without quotation marks, each just what its column takes. They are read where they stand in the text,
 * without making a text of each cell, which takes a third of the time. Whatever is not plain is left to the thorough reader, from the first
 * cell of its row; nothing is reported here.
 */
import type { AsciiText } from '../reading/ascii-text.ts';
import type { CellReader } from './cell-reader.ts';
import { MeasuredReader } from './measured-reader.ts';

const LF = 10;
const CR = 13;
const QUOTE = 34;

interface Measured {
  readonly reader: MeasuredReader;
  readonly from: number;
  readonly to: number;
}

export class PlainRows {
  /** Cells that wait for the one that names their measure, which may stand behind them; the first `waiting` are of this row. */
  private readonly measured: Measured[] = [];
  private waiting = 0;
  /** Per character 1 when a cell ends before it. */
  private readonly ends = new Uint8Array(256);
  /** Per position in the file its reader; null where nothing is read. */
  private readonly readers: readonly (CellReader | null)[];

  constructor(
    readers: readonly { readonly position: number; readonly reader: CellReader }[],
    width: number,
    private readonly separator: number,
    private readonly longestCell: number,
  ) {
    const byPosition = new Map(readers.map(({ position, reader }) => [position, reader]));
    for (const character of [separator, LF, CR]) this.ends[character] = 1;
    this.readers = Array.from({ length: width }, (_, position) => byPosition.get(position) ?? null);
  }

  /**
   * Reads the record that begins at `start` into a row.
   * @returns where the next record begins, or -1 when this one is not plain or has not arrived as a whole.
   */
  read(text: AsciiText, start: number, row: number): number {
    const { bytes } = text;
    const { readers, separator, ends } = this;
    const end = bytes.length;
    const last = readers.length - 1;
    let at = start;
    let isBlank = true;
    this.waiting = 0;
    for (let position = 0; position <= last; position += 1) {
      const from = at;
      if (bytes[at] === QUOTE) return -1;
      while (at < end && ends[bytes[at] as number] === 0) at += 1;
      const character = bytes[at];
      if (at > from) {
        if (at - from > this.longestCell) return -1;
        const reader = readers[position];
        if (reader instanceof MeasuredReader) this.put(reader, from, at);
        else if (reader && !reader.readPlain(text, from, at, row)) return -1;
        isBlank = false;
      }
      if (position < last) {
        if (character !== separator) return -1;
      } else if (character === CR) {
        if (bytes[at + 1] !== LF) return -1;
        at += 1;
      } else if (character !== LF) return -1;
      at += 1;
    }
    return isBlank || !this.readWaiting(text, row) ? -1 : at;
  }

  private put(reader: MeasuredReader, from: number, to: number): void {
    this.measured[this.waiting] = { reader, from, to };
    this.waiting += 1;
  }

  private readWaiting(text: AsciiText, row: number): boolean {
    for (let index = 0; index < this.waiting; index += 1) {
      const { reader, from, to } = this.measured[index] as Measured;
      if (!reader.readPlain(text, from, to, row)) return false;
    }
    return true;
  }
}
