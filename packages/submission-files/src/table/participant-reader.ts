import { pseudonymPattern } from '@cairnstep/dictionary';
import type { AsciiText } from '../reading/ascii-text.ts';
import { rejectCell, saysAt, trimmed } from './cell-reader.ts';
import type { CellPlace, CellReader } from './cell-reader.ts';

const mend = 'Prepare the file on the submission page: it puts codes made at your site in place of your own numbers.';

/** Participant codes. Nothing of a cell that is no such code is kept or repeated: it may be a name or a record number. */
export class ParticipantReader implements CellReader {
  /** The cell read last: rows of one person usually follow each other. */
  private lastText = '';
  private lastNumber = 0;
  private lastPlain = { bytes: new Uint8Array(0), number: 0 };

  constructor(private readonly place: CellPlace) {}

  readPlain(text: AsciiText, from: number, to: number, row: number): boolean {
    if (!saysAt(text, from, to, this.lastPlain.bytes)) {
      const number = this.place.store.vocabulary.known(text.source.slice(from, to));
      if (number === undefined) return false;
      this.lastPlain = { bytes: text.bytes.slice(from, to), number };
    }
    this.place.store.setWord(row, this.lastPlain.number);
    return true;
  }

  read(text: string, row: number, line: number): void {
    if (text !== this.lastText) {
      const code = trimmed(text);
      if (code === '') return;
      if (!pseudonymPattern.test(code)) {
        rejectCell(this.place, { row, line, text }, 'F12', 'Something other than a participant code.', mend);
        return;
      }
      this.lastText = text;
      this.lastNumber = this.place.store.vocabulary.number(code);
    }
    this.place.store.setWord(row, this.lastNumber);
  }
}
