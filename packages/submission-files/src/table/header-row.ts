/** The header row of a file: what each column means, and how a finding may name it. */
import type { TableKey } from '@cairnstep/dictionary';
import { isFormulaLike } from './formula-like.ts';
import { HeaderNames } from './header-names.ts';
import type { HeaderMeaning } from './header-names.ts';

const longestShownHeader = 60;

export interface HeaderColumn {
  readonly meaning: HeaderMeaning;
  /** The header as a finding may show it: the letters of the column where it may not be shown, '' where it is blank. */
  readonly shown: string;
}

/**
 * The columns of a header row up to the last one that is filled.
 * @param mayShow Whether findings may repeat a header that the dictionary does not have.
 */
export function readHeaderRow(
  table: TableKey,
  cells: readonly string[],
  count: number,
  mayShow: (header: string) => boolean = () => true,
): readonly HeaderColumn[] {
  const names = new HeaderNames(table);
  const headers = cells.slice(0, lastFilled(cells, count) + 1);
  const meanings = headers.map((header) => names.meaning(header));
  // Where most of the row is not a header, its cells may be somebody's data and are not repeated.
  const isHeaderRow = meanings.filter(({ kind }) => kind === 'column').length * 2 >= headers.length;
  return meanings.map((meaning, position) => {
    const header = headers[position] ?? '';
    return { meaning, shown: shownHeader(header, position, isHeaderRow && (meaning.kind !== 'undeclared' || mayShow(header))) };
  });
}

/** The name by which findings about cells of a column call it. */
export function columnName({ meaning, shown }: HeaderColumn, position: number): string {
  if (meaning.kind !== 'undeclared') return meaning.variable.key;
  return shown === '' || isFormulaLike(shown) ? columnLetters(position) : shown;
}

/** The column as a spreadsheet names it: A to Z, AA, AB, … */
export function columnLetters(position: number): string {
  const letter = String.fromCharCode(65 + (position % 26));
  return position < 26 ? letter : columnLetters(Math.floor(position / 26) - 1) + letter;
}

/** Position of the last cell that is not blank; -1 when all are. */
export function lastFilled(cells: readonly string[], count: number): number {
  let last = count - 1;
  while (last >= 0 && !cells[last]?.trim()) last -= 1;
  return last;
}

/** The header without control and direction marks, cut to a readable length; or the column's letters. */
function shownHeader(header: string, position: number, isShowable: boolean): string {
  if (header.trim() === '') return '';
  if (!isShowable) return columnLetters(position);
  const plain = header.replace(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]+/gu, ' ').trim();
  return plain.length > longestShownHeader ? `${plain.slice(0, longestShownHeader)}…` : plain;
}
