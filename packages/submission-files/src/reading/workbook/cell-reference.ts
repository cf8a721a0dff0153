/** Places in a sheet as workbooks write them: `B12`, `A1:C3`. Columns count from 0, rows from 1. */
export interface SheetRange {
  readonly firstColumn: number;
  readonly firstRow: number;
  readonly lastColumn: number;
  readonly lastRow: number;
}

const A = 65;
const Z = 90;
/** More letters than any program writes; as a number still exact. */
const mostLetters = 7;

/** The column of a reference such as `B12` or `B`; -1 when it begins with no column. */
export function columnOf(reference: string): number {
  let column = 0;
  let at = 0;
  for (; at < reference.length; at += 1) {
    const letter = reference.charCodeAt(at);
    if (letter < A || letter > Z) break;
    if (at === mostLetters) return -1;
    column = column * 26 + (letter - A + 1);
  }
  return column - 1;
}

const rangePattern = /^\$?([A-Z]{1,3})\$?(\d{1,7})(?::\$?([A-Z]{1,3})\$?(\d{1,7}))?$/;

/** The cells that a reference covers, null when it is no such reference. */
export function rangeOf(reference: string): SheetRange | null {
  const [, first, firstRow, last = first, lastRow = firstRow] = rangePattern.exec(reference) ?? [];
  if (first === undefined || last === undefined) return null;
  return { firstColumn: columnOf(first), firstRow: Number(firstRow), lastColumn: columnOf(last), lastRow: Number(lastRow) };
}
