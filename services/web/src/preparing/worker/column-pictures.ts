/** The columns of a clinic's file as the page shows them: recognisable by their header and a few cells, with what becomes of each. */
import { dateFormats, fittingFormats, unknownWords } from '@cairnstep/deidentification';
import type { ColumnMatch, DateFormat, SiteKey } from '@cairnstep/deidentification';
import type { ColumnPicture, TableColumns } from './protocol.ts';
import type { AssignedSource, Source } from './source-shelf.ts';

/** Cells of a column by which its dates are looked at; a longer column rarely says more. */
const datesSampled = 5_000;
const examplesShown = 3;
const exampleLength = 40;
const wordsShown = 30;

export function columnsOf(source: AssignedSource, key: SiteKey): TableColumns {
  const { id, table, headers, matches } = source;
  const remembered = key.matches.get(table) ?? [];
  const columns = headers.map((header, position): ColumnPicture => {
    const own = matches.filter((match) => match.header === header);
    const match = own[0] ?? { header, as: 'left-out' as const };
    const before = remembered.filter((each) => each.header === header);
    return {
      number: position + 1,
      header,
      examples: examplesIn(source, position),
      match,
      isNew: JSON.stringify(before) !== JSON.stringify(own),
      dateFormats: datesIn(source, position, match),
      unknownWords: unknownWords(table, match, cellsOf(source, position), wordsShown),
      isMatchable: own.length > 0,
    };
  });
  return { source: id, table, columns };
}

function* cellsOf({ rows }: Source, position: number): Generator<string> {
  for (const row of rows) yield row[position] ?? '';
}

function examplesIn(source: Source, position: number): string[] {
  const examples = new Set<string>();
  for (const each of cellsOf(source, position)) {
    const cell = each.trim();
    if (cell !== '') examples.add(cell.length > exampleLength ? `${cell.slice(0, exampleLength)}…` : cell);
    if (examples.size === examplesShown) break;
  }
  return [...examples];
}

/** Formats to choose from: those that fit all cells, or all there are where none does and somebody has said the column holds dates. */
function datesIn({ rows }: Source, position: number, match: ColumnMatch): readonly DateFormat[] {
  const fitting = fittingFormats(rows.slice(0, datesSampled).map((row) => row[position] ?? ''));
  const isMeantAsDate = match.as === 'study-day' || match.as.endsWith('-date');
  return fitting.length === 0 && isMeantAsDate ? dateFormats : fitting;
}
