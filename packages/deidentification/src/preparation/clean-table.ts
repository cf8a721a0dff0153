import { fitsRange, tableOf, variableOf } from '@cairnstep/dictionary';
import type { Variable } from '@cairnstep/dictionary';
import { ageOn, topCodedAge } from '../dates/age.ts';
import type { DateProblem, IsoDate } from '../dates/date-format.ts';
import { parseDate } from '../dates/parse-date.ts';
import { studyDay } from '../dates/study-day.ts';
import type { CodeBook } from '../key-file/code-book.ts';
import { lineOf } from '../detection/line-of.ts';
import type { CleanTable, ProblemKind } from './month.ts';
import type { ProblemLog } from './problem-log.ts';
import type { DateColumn, DayColumn, TablePlan, ValueColumn } from './table-plan.ts';

const dateMessages: Readonly<Record<DateProblem, string>> = {
  'not-a-date': 'Not a date as this column writes it.',
  'no-such-day': 'No such day in the calendar.',
  'two-digit-year': 'Write the year with four digits.',
  'universal-time': 'Write the date at the clinic, without universal time.',
  'outside-years': 'No year that a date of the registry can have.',
};

/** Why a row stays behind. */
const rowMessages = {
  'long-row': 'The row has more cells than the header. The row stays behind.',
  'participant-missing': 'The row has no record number. The row stays behind.',
  'index-date-unknown': 'The first training day is not known. State it, or send the rows once training has begun. The row stays behind.',
} as const;

const isFilled = (cell: string | undefined): boolean => cell !== undefined && cell.trim() !== '';

/** The variables of the dictionary that a plan fills, in the dictionary's order. */
function filledVariables({ raw, values, days, birthDate, injuryDate }: TablePlan): Variable[] {
  const keys = new Set(['participant', ...values.map(({ variable }) => variable.key), ...days.map(({ variable }) => variable.key)]);
  if (birthDate) keys.add('age_at_index');
  if (injuryDate) keys.add('injury_year').add('days_injury_to_index');
  return tableOf(raw.table).variables.filter(({ key }) => keys.has(key));
}

/**
 * The rows of a file as they may leave the site. Every cell is a code, a number or a study day made from what was read; what could not be
 * read is empty and reported, and a row without its person or its day stays behind.
 *
 * @param codes participant code of each row
 */
export function cleanTable(plan: TablePlan, codes: readonly (string | null)[], book: CodeBook, log: ProblemLog): CleanTable {
  const variables = filledVariables(plan);
  const rows: string[][] = [];
  const lines: number[] = [];
  if (plan.isReady) {
    plan.raw.rows.forEach((cells, row) => {
      const cleaned = cells.some(isFilled) ? new RowCleaner(plan, cells, lineOf(plan.raw, row), book, log).clean(codes[row] ?? null) : null;
      if (cleaned === null) return;
      rows.push(variables.map(({ key }) => cleaned.get(key) ?? ''));
      lines.push(lineOf(plan.raw, row));
    });
  }
  return { table: plan.raw.table, headers: variables.map(({ key }) => key), rows, lines };
}

/** Cleans one row. */
class RowCleaner {
  private readonly cleaned = new Map<string, string>();
  private staysBehind = false;

  constructor(
    private readonly plan: TablePlan,
    private readonly cells: readonly string[],
    private readonly line: number,
    private readonly book: CodeBook,
    private readonly log: ProblemLog,
  ) {}

  /** The cells by variable; null when the row stays behind. */
  clean(code: string | null): ReadonlyMap<string, string> | null {
    if (this.cells.slice(this.plan.raw.headers.length).some(isFilled)) return this.refuseRow('long-row');
    if (code === null) return this.refuseRow('participant-missing');
    this.cleaned.set('participant', code);
    const { days, birthDate, injuryDate } = this.plan;
    if ([...days, birthDate, injuryDate].some((column) => column && this.cellOf(column) !== '')) {
      const { indexDate } = this.book.person(code);
      if (indexDate === undefined) return this.refuseRow('index-date-unknown');
      for (const day of days) this.cleanDay(day, indexDate);
      if (birthDate) this.cleanBirth(birthDate, indexDate);
      if (injuryDate) this.cleanInjury(injuryDate, indexDate);
    }
    this.cleanValues();
    return this.staysBehind ? null : this.cleaned;
  }

  private cellOf({ position }: { readonly position: number }): string {
    return (this.cells[position] ?? '').trim();
  }

  private refuseRow(kind: keyof typeof rowMessages): null {
    this.log.add(kind, { table: this.plan.raw.table, line: this.line }, rowMessages[kind]);
    return null;
  }

  /** Reports a cell. A row that lacks a cell it cannot be told apart without stays behind. */
  private report(kind: ProblemKind, { position }: { readonly position: number }, key: string, message: string): void {
    const isKey = tableOf(this.plan.raw.table).rowKey.includes(key);
    this.staysBehind ||= isKey;
    const place = { table: this.plan.raw.table, columnNumber: position + 1, variable: key, line: this.line };
    this.log.add(kind, place, isKey ? `${message} The row stays behind.` : message);
  }

  private dateIn(column: DateColumn, key: string): IsoDate | null {
    const cell = this.cellOf(column);
    if (cell === '') return null;
    const parsed = parseDate(cell, column.format);
    if (parsed.ok) return parsed.date;
    this.report('unreadable-date', column, key, dateMessages[parsed.problem]);
    return null;
  }

  private put(column: DateColumn, key: string, value: number): void {
    const { hard } = variableOf(this.plan.raw.table, key);
    if (hard === undefined || fitsRange(value, hard)) this.cleaned.set(key, String(value));
    else this.report('value-withheld', column, key, 'The date lies outside what the registry takes.');
  }

  private cleanDay(column: DayColumn, indexDate: IsoDate): void {
    const { key } = column.variable;
    const date = this.dateIn(column, key);
    if (date !== null) this.put(column, key, studyDay(indexDate, date));
  }

  private cleanBirth(column: DateColumn, indexDate: IsoDate): void {
    const birth = this.dateIn(column, 'age_at_index');
    if (birth === null) return;
    if (birth > indexDate) this.report('unreadable-date', column, 'age_at_index', 'The birth lies after the first training day.');
    else this.put(column, 'age_at_index', topCodedAge(ageOn(birth, indexDate)));
  }

  private cleanInjury(column: DateColumn, indexDate: IsoDate): void {
    const injury = this.dateIn(column, 'days_injury_to_index');
    if (injury === null) return;
    this.put(column, 'injury_year', Number(injury.slice(0, 4)));
    this.put(column, 'days_injury_to_index', studyDay(injury, indexDate));
  }

  /** A result is read by the measure that another column names, so those others come first. */
  private cleanValues(): void {
    const { values } = this.plan;
    for (const value of values) if (value.variable.measuredBy === undefined) this.cleanValue(value, '');
    for (const value of values) {
      const { measuredBy } = value.variable;
      if (measuredBy) this.cleanValue(value, this.cleaned.get(measuredBy.column) ?? '');
    }
  }

  private cleanValue(column: ValueColumn, namedMeasure: string): void {
    const { key } = column.variable;
    const value = column.clean(this.cellOf(column), namedMeasure);
    if (!value.ok) this.report(value.isReadable ? 'value-withheld' : 'unreadable-cell', column, key, value.message);
    else if (value.text !== '') this.cleaned.set(key, value.text);
  }
}
