import { cellParser } from '@cairnstep/dictionary';
import type { CellParser } from '@cairnstep/dictionary';
import type { AsciiText } from '../reading/ascii-text.ts';
import { rejectCell, saysAt, trimmed } from './cell-reader.ts';
import type { CellPlace, CellReader } from './cell-reader.ts';

/** Spellings of one column that are remembered, so that a hostile file cannot fill the memory with them. */
const mostSpellings = 10_000;

/** Codes, flags and reasons of absence, in any spelling the dictionary reads; its own spelling is stored. */
export class CodeReader implements CellReader {
  /** Spelling met in the file → number of the code, 0 for blanks. */
  private readonly spellings = new Map<string, number>();
  private readonly parse: CellParser;
  /** The spelling read last: the same code often stands in many rows. */
  private last = { bytes: new Uint8Array(0), number: 0 };

  constructor(private readonly place: CellPlace) {
    this.parse = cellParser(place.store.variable);
  }

  read(text: string, row: number, line: number): void {
    const number = this.spellings.get(text) ?? this.recognise(text, row, line);
    if (number > 0) this.place.store.setWord(row, number);
  }

  readPlain(text: AsciiText, from: number, to: number, row: number): boolean {
    if (!saysAt(text, from, to, this.last.bytes)) {
      const number = this.spellings.get(text.source.slice(from, to));
      if (!number) return false;
      this.last = { bytes: text.bytes.slice(from, to), number };
    }
    this.place.store.setWord(row, this.last.number);
    return true;
  }

  /** The number of a spelling not met before; 0 when it is blank or has been rejected. */
  private recognise(text: string, row: number, line: number): number {
    const parsed = this.parse(trimmed(text));
    if (!parsed.ok) {
      rejectCell(this.place, { row, line, text }, 'F11', 'A code that this column does not have.', parsed.problem.message);
      return 0;
    }
    const number = typeof parsed.value === 'string' ? this.place.store.vocabulary.number(parsed.value) : 0;
    if (this.spellings.size < mostSpellings) this.spellings.set(text, number);
    return number;
  }
}
