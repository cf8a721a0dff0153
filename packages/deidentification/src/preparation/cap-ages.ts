import { revealsTopAge, topAge } from '../dates/age.ts';
import type { CodeBook } from '../key-file/code-book.ts';
import { dayVariables } from './day-variables.ts';
import type { CleanTable } from './month.ts';
import type { ProblemLog } from './problem-log.ts';

/** The end of a consent lies ahead of everything that happened, and says nothing about an age reached. */
const notYetLived = 'valid_until_day';

export interface CappedAges {
  readonly clean: readonly CleanTable[];
  readonly count: number;
}

/**
 * Makes an age on the first training day 90 where a study day, of this month or of an earlier one, would tell that the person has been 90
 * or more. Where the person's row was sent in an earlier month it is reported, to be sent again.
 */
export function capAges(tables: readonly CleanTable[], book: CodeBook, log: ProblemLog): CappedAges {
  rememberLastDays(tables, book);
  rememberAges(tables, book);
  const tells = (code: string): boolean => {
    const { age, lastDay } = book.person(code);
    return age !== undefined && revealsTopAge(age, lastDay ?? 0);
  };

  const capped = new Set<string>();
  const inThisMonth = new Set<string>();
  const clean = tables.map((each): CleanTable => {
    const column = each.headers.indexOf('age_at_index');
    if (column === -1) return each;
    const rows = each.rows.map((row) => {
      const [code = ''] = row;
      if (row[column] === '') return row;
      inThisMonth.add(code);
      if (row[column] === String(topAge)) capped.add(code);
      if (!tells(code) || row[column] === String(topAge)) return row;
      capped.add(code);
      return row.with(column, String(topAge));
    });
    return { ...each, rows };
  });
  reportAgesSentBefore(tables, (code) => !inThisMonth.has(code) && book.person(code).age !== topAge && tells(code), log);
  return { clean, count: capped.size };
}

function rememberLastDays(tables: readonly CleanTable[], book: CodeBook): void {
  for (const { table, headers, rows } of tables) {
    const columns = dayVariables(table)
      .filter(({ key }) => key !== notYetLived)
      .map(({ key }) => headers.indexOf(key))
      .filter((column) => column !== -1);
    for (const row of rows) {
      const days = columns.map((column) => row[column] ?? '').filter((cell) => cell !== '');
      const [code = ''] = row;
      const last = Math.max(...days.map(Number), book.person(code).lastDay ?? -Infinity);
      if (Number.isFinite(last)) book.remember(code, { lastDay: last });
    }
  }
}

function rememberAges(tables: readonly CleanTable[], book: CodeBook): void {
  for (const { headers, rows } of tables) {
    const column = headers.indexOf('age_at_index');
    for (const row of rows) if (column !== -1 && row[column] !== '') book.remember(row[0] ?? '', { age: Number(row[column]) });
  }
}

function reportAgesSentBefore(tables: readonly CleanTable[], isTold: (code: string) => boolean, log: ProblemLog): void {
  const reported = new Set<string>();
  for (const { table, rows, lines } of tables) {
    rows.forEach(([code = ''], row) => {
      if (reported.has(code) || !isTold(code)) return;
      reported.add(code);
      const message =
        'The participant has reached 90. Add the row of the participant to this month, so that the age sent before becomes 90.';
      log.add('age-to-correct', { table, line: lines[row] ?? 0 }, message);
    });
  }
}
