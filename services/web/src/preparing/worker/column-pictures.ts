/** The columns of a clinic's file as the page shows them: recognisable by their header and a few cells, with what becomes of each. */
import { dateFormats, fittingFormats } from '@cairnstep/deidentification';
import type { ColumnMatch, DateFormat, PreparationProblem, SiteKey } from '@cairnstep/deidentification';
import { variableOf } from '@cairnstep/dictionary';
import type { ColumnPicture, TableColumns } from './protocol.ts';
import type { AssignedSource, Source } from './source-shelf.ts';

/** Cells of a column by which its dates are looked at; a longer column rarely says more. */
const datesSampled = 5_000;
const examplesShown = 3;
const exampleLength = 40;
const wordsShown = 30;

export function columnsOf(source: AssignedSource, key: SiteKey, problems: readonly PreparationProblem[]): TableColumns {
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
      unknownWords: unknownWordsIn(source, position, match, problems),
      isMatchable: own.length > 0,
    };
  });
  return { source: id, table, columns };
}

function examplesIn({ rows }: Source, position: number): string[] {
  const examples = new Set<string>();
  for (const row of rows) {
    const cell = row[position]?.trim() ?? '';
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

function unknownWordsIn(
  { table, rows, lines }: AssignedSource,
  position: number,
  match: ColumnMatch,
  problems: readonly PreparationProblem[],
): string[] {
  if (match.as !== 'value' || variableOf(table, match.variable).codes === undefined) return [];
  const words = new Set<string>();
  for (const problem of problems) {
    if (problem.kind !== 'unreadable-cell' || problem.table !== table || problem.columnNumber !== position + 1) continue;
    for (const line of problem.lines) words.add(rows[lines.indexOf(line)]?.[position]?.trim() ?? '');
  }
  words.delete('');
  return [...words].slice(0, wordsShown);
}
