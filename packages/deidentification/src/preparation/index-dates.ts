/** First training days: from the key file, from what the coordinator states, from a column, or from the first session of the month. */
import type { IsoDate } from '../dates/date-format.ts';
import { parseDate } from '../dates/parse-date.ts';
import type { CodeBook } from '../key-file/code-book.ts';
import { lineOf } from '../detection/line-of.ts';
import type { NewParticipant } from './month.ts';
import type { PeopleOfMonth, Place } from './people-of-month.ts';
import type { ProblemLog } from './problem-log.ts';
import type { DateColumn, TablePlan } from './table-plan.ts';

type Basis = NewParticipant['indexDate'];

/** Statuses of a session in which somebody trained. */
const trained = new Set(['completed', 'shortened']);

interface DatedPlace extends Place {
  readonly date: IsoDate;
}

/**
 * Fills the first training days that the book lacks, and reports those that do not agree. What the key file holds stays, because rows
 * have been sent that count from it; only what a coordinator states overrides it.
 *
 * @param stated first training days by participant code
 * @returns where the day of each person of this month came from, for those it did not come from the key file
 */
export function fillIndexDates(
  plans: readonly TablePlan[],
  people: PeopleOfMonth,
  stated: ReadonlyMap<string, IsoDate>,
  book: CodeBook,
  log: ProblemLog,
): ReadonlyMap<string, Basis> {
  const basis = new Map<string, Basis>();
  for (const [code, date] of stated) {
    const known = book.person(code).indexDate;
    const place = people.firstPlaces.get(code);
    if (known !== undefined && known !== date && place) {
      log.add('index-date-differs', place, 'The first training day was changed. Send all rows of this participant again.');
    }
    book.remember(code, { indexDate: date });
    basis.set(code, 'stated');
  }
  for (const [code, { date, ...place }] of indexColumn(plans, people)) {
    const known = book.person(code).indexDate;
    if (known === undefined) {
      book.remember(code, { indexDate: date });
      basis.set(code, 'index-column');
    } else if (known !== date) {
      log.add('index-date-differs', place, 'The first training day in the file is not the one in the key file, which was used.');
    }
  }
  for (const [code, { date, ...place }] of firstSessions(plans, people)) {
    const known = book.person(code).indexDate;
    if (known === undefined) {
      book.remember(code, { indexDate: date });
      basis.set(code, 'first-session');
    } else if (date < known) {
      log.add('index-date-differs', place, 'Training took place before the first training day in the key file. State the right day.');
    }
  }
  return basis;
}

/** The earliest date of each person in a column, and where it stands. */
function earliest(
  plan: TablePlan,
  { position, format }: DateColumn,
  people: PeopleOfMonth,
  counts: (cells: readonly string[]) => boolean,
  into: Map<string, DatedPlace>,
): void {
  const codes = people.codes.get(plan) ?? [];
  plan.raw.rows.forEach((cells, row) => {
    const code = codes[row];
    const parsed = parseDate(cells[position] ?? '', format);
    if (code == null || !parsed.ok || !counts(cells)) return;
    const before = into.get(code);
    if (before === undefined || parsed.date < before.date) {
      into.set(code, { date: parsed.date, table: plan.raw.table, line: lineOf(plan.raw, row) });
    }
  });
}

function indexColumn(plans: readonly TablePlan[], people: PeopleOfMonth): Map<string, DatedPlace> {
  const dates = new Map<string, DatedPlace>();
  for (const plan of plans) if (plan.indexDate) earliest(plan, plan.indexDate, people, () => true, dates);
  return dates;
}

/** Sessions in which somebody trained, and bouts, which are nothing but training. */
function firstSessions(plans: readonly TablePlan[], people: PeopleOfMonth): Map<string, DatedPlace> {
  const dates = new Map<string, DatedPlace>();
  for (const plan of plans) {
    const { table } = plan.raw;
    const day = plan.days.find(({ variable }) => variable.key === 'session_day');
    if (day === undefined || (table !== 'sessions' && table !== 'bouts')) continue;
    const status = table === 'sessions' ? plan.values.find(({ variable }) => variable.key === 'status') : undefined;
    const isTraining = (cells: readonly string[]): boolean => {
      if (status === undefined) return true;
      const cleaned = status.clean(cells[status.position] ?? '', '');
      return cleaned.ok && trained.has(cleaned.text);
    };
    earliest(plan, day, people, isTraining, dates);
  }
  return dates;
}
