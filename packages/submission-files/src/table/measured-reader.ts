import { measureOf, measureParser, measures } from '@cairnstep/dictionary';
import type { CellParser } from '@cairnstep/dictionary';
import type { AsciiText } from '../reading/ascii-text.ts';
import type { CellKind } from './cell-kind.ts';
import { rejectCell, trimmed } from './cell-reader.ts';
import type { CellPlace, CellReader } from './cell-reader.ts';
import type { ColumnStore } from './column-store.ts';

/** Parsers of the measures whose results are grades rather than numbers. */
const gradeParsers = new Map(measures.filter(({ grades }) => grades).map((measure) => [measure.key, measureParser(measure)]));

/** Results whose form depends on the measure that another cell of the row names: grades for some (`1+`), numbers for all others. */
export class MeasuredReader implements CellReader {
  /** What named the measure last: rows of one measure often follow each other. */
  private lastWord: string | null = null;
  private lastGrades: CellParser | undefined;

  constructor(
    private readonly place: CellPlace,
    private readonly naming: { readonly store: ColumnStore; readonly prefix: string },
    private readonly numbers: CellReader,
  ) {}

  /** The naming cell of the row must have been read before, as for `read`. */
  readPlain(text: AsciiText, from: number, to: number, row: number): boolean {
    return !this.grades(row) && this.numbers.readPlain(text, from, to, row);
  }

  /** The naming cell of the row must have been read before. */
  read(text: string, row: number, line: number, kind: CellKind): void {
    const parseGrade = this.grades(row);
    if (!parseGrade) {
      this.numbers.read(text, row, line, kind);
      return;
    }
    const parsed = parseGrade(trimmed(text));
    if (!parsed.ok)
      rejectCell(
        this.place,
        { row, line, text },
        'F11',
        `A grade that the ${measureOf(this.measure(row)).name} does not have.`,
        parsed.problem.message,
      );
    else if (typeof parsed.value === 'number') this.place.store.setNumber(row, parsed.value);
  }

  private measure(row: number): string {
    return this.naming.prefix + this.naming.store.wordAt(row);
  }

  /** The parser of grades, when the measure of the row has them. */
  private grades(row: number): CellParser | undefined {
    const word = this.naming.store.wordAt(row);
    if (word !== this.lastWord) {
      this.lastWord = word;
      this.lastGrades = gradeParsers.get(this.measure(row));
    }
    return this.lastGrades;
  }
}
