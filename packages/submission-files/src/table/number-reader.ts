import type { AsciiText } from '../reading/ascii-text.ts';
import type { CellKind } from './cell-kind.ts';
import { rejectCell, trimmed } from './cell-reader.ts';
import type { CellPlace, CellReader } from './cell-reader.ts';
import type { UnitFactor } from './header-names.ts';
import { readNumber, readPlainNumber } from './read-number.ts';
import type { ReadNumber } from './read-number.ts';

/** How a file writes its decimals; shared by the readers of all its columns. */
export interface DecimalManner {
  /** Whether `1,234` may be a thousand as well as a decimal number. */
  readonly commaMayMarkThousands: boolean;
  /** Character code of the first decimal mark met; 0 until then. */
  mark: number;
}

const COMMA = 44;
const perhapsThousands = /^\D?\d{1,3},\d{3}$/;

export class NumberReader implements CellReader {
  private readonly into: ReadNumber = { value: 0, mark: 0 };
  private readonly whole: boolean;

  constructor(
    private readonly place: CellPlace,
    private readonly factor: UnitFactor,
    private readonly manner: DecimalManner,
  ) {
    this.whole = place.store.variable.type === 'integer';
  }

  readPlain(text: AsciiText, from: number, to: number, row: number): boolean {
    const { into, manner, whole } = this;
    if (!readPlainNumber(text.bytes, from, to, this.factor, into)) return false;
    if (into.mark !== 0) {
      if (whole || (manner.mark !== 0 && manner.mark !== into.mark)) return false;
      manner.mark = into.mark;
    } else if (whole && !Number.isInteger(into.value)) return false;
    this.place.store.setNumber(row, into.value);
    return true;
  }

  read(cell: string, row: number, line: number, kind: CellKind): void {
    const { into, manner } = this;
    let text = cell;
    let failure = readNumber(text, this.factor, into);
    if (failure) {
      text = trimmed(cell);
      if (text === '') return;
      failure = readNumber(text, this.factor, into);
    }
    const at = { row, line, text };
    const mark = kind === 'number' ? 0 : into.mark;
    if (failure === 'not-a-number') {
      const example = this.whole ? 'a whole number such as 12' : 'a number such as 12.5';
      rejectCell(this.place, at, 'F10', 'Something other than a number.', `Write ${example}, without a unit, or leave the cell empty.`);
    } else if (failure === 'too-many-digits') {
      rejectCell(this.place, at, 'F10', 'A number with more digits than can be kept.', 'Write at most 40 digits.');
    } else if (this.whole && !Number.isInteger(into.value)) {
      rejectCell(this.place, at, 'F10', 'A number with a fraction where only whole numbers stand.', 'Write a whole number.');
    } else if (mark === COMMA && manner.commaMayMarkThousands && perhapsThousands.test(text)) {
      rejectCell(
        this.place,
        at,
        'F14',
        'A comma that could mark thousands or decimals.',
        'Write a decimal point, or no mark at all when the number is whole.',
      );
    } else if (mark !== 0 && manner.mark !== 0 && mark !== manner.mark) {
      rejectCell(
        this.place,
        at,
        'F14',
        'Decimals with a point and with a comma in the same file.',
        'Write all numbers of the file with the same decimal mark.',
      );
    } else {
      if (mark !== 0) manner.mark = mark;
      this.place.store.setNumber(row, into.value);
    }
  }
}
