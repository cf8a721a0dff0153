import { fittingFormats, parseDate } from '@cairnstep/deidentification';
import { tableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import type { AssignedSource } from './source-shelf.ts';

/** How many dated rows of training lie in a month. */
export interface RowsInMonth {
  readonly table: TableKey;
  readonly inside: number;
  readonly dated: number;
}

/** Training is what a month is about; sessions say it best. */
const ofTraining: readonly TableKey[] = ['sessions', 'bouts'];

/**
 * Whether the files are of the month they are prepared for. Nobody can tell that later, because no date leaves this page.
 *
 * @param month `2026-11`
 * @returns null where no file says when training took place
 */
export function rowsInMonth(sources: readonly AssignedSource[], month: string): RowsInMonth | null {
  for (const table of ofTraining) {
    const dates = sources.flatMap((source) => (source.table === table ? datesOf(source) : []));
    if (dates.length > 0) return { table, inside: dates.filter((date) => date.startsWith(`${month}-`)).length, dated: dates.length };
  }
  return null;
}

function datesOf({ table, headers, rows, matches }: AssignedSource): string[] {
  const match = matches.find((each) => each.as === 'study-day' && each.variable === tableOf(table).studyDay);
  if (match?.as !== 'study-day') return [];
  const position = headers.indexOf(match.header);
  const cells = rows.map((row) => row[position] ?? '');
  const fitting = match.dateFormat === undefined ? fittingFormats(cells) : [match.dateFormat];
  const [format] = fitting;
  if (format === undefined || fitting.length > 1) return [];
  return cells.flatMap((cell) => {
    const parsed = parseDate(cell, format);
    return parsed.ok ? parsed.date : [];
  });
}
