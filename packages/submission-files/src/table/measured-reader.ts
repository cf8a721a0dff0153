import { measureOf, measureParser, measures } from '@cairnstep/dictionary';
import type { CellKind } from './cell-kind.ts';
import { rejectCell, trimmed } from './cell-reader.ts';
import type { CellPlace, CellReader } from './cell-reader.ts';
import type { ColumnStore } from './column-store.ts';

/** Parsers of the measures whose results are grades rather than numbers. */
const gradeParsers = new Map(measures.filter(({ grades }) => grades).map((measure) => [measure.key, measureParser(measure)]));

/** Results whose form depends on the measure that another cell of the row names: grades for some (`1+`), numbers for all others. */
export class MeasuredReader implements CellReader {
  constructor(
    private readonly place: CellPlace,
    private readonly naming: { readonly store: ColumnStore; readonly prefix: string },
    private readonly numbers: CellReader,
  ) {}

  /** The naming cell of the row must have been read before. */
  read(text: string, row: number, line: number, kind: CellKind): void {
    const measure = this.naming.prefix + this.naming.store.wordAt(row);
    const parseGrade = gradeParsers.get(measure);
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
        `A grade that the ${measureOf(measure).name} does not have.`,
        parsed.problem.message,
      );
    else if (typeof parsed.value === 'number') this.place.store.setNumber(row, parsed.value);
  }
}
