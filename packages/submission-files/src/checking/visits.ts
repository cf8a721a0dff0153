/** Assessments as the rules compare them: all results of one participant on one day. */
import { tableOf } from '@cairnstep/dictionary';
import type { CheckedTable } from './checked-table.ts';
import { partition } from './partition.ts';
import { RowGroups } from './row-groups.ts';
import type { Submission } from './submission.ts';

/** One row of the assessments. */
export interface Result {
  readonly row: number;
  readonly measure: string;
  readonly status: string;
  readonly inDevice: boolean;
  readonly trial: number | null;
  /** The result; null when there is none. */
  readonly value: number | null;
  readonly aid: string | null;
  readonly brace: string | null;
  readonly persons: number | null;
}

const attempted = new Set(['done', 'stopped_early']);
const unable = new Set(['unable_physical', 'unable_other']);

export const wasAttempted = (result: Result): boolean => attempted.has(result.status);
export const wasUnable = (result: Result): boolean => unable.has(result.status);

export class Visit {
  constructor(
    readonly table: CheckedTable,
    readonly person: number,
    readonly day: number,
    readonly results: readonly Result[],
  ) {}

  of(...measures: string[]): Result[] {
    return this.results.filter(({ measure }) => measures.includes(measure));
  }

  /** Results that have a value. */
  scored(measure: string): (Result & { readonly value: number })[] {
    return this.of(measure).filter((result): result is Result & { readonly value: number } => result.value !== null);
  }
}

export function visitsOf(submission: Submission): Visit[] {
  const table = submission.table('assessments');
  const column = (key: string) => table.column(key);
  const day = column('assessment_day');
  const measure = column('measure');
  const status = column('attempt_status');
  const inDevice = column('in_device');
  const trial = column('trial_no');
  const value = column('value');
  const aid = column('aid');
  const brace = column('brace');
  const persons = column('assist_persons');

  const result = (row: number): Result => ({
    row,
    measure: measure.word(row) ?? '',
    status: status.word(row) ?? '',
    inDevice: inDevice.word(row) === 'yes',
    trial: trial.number(row),
    value: value.number(row),
    aid: aid.word(row),
    brace: brace.word(row),
    persons: persons.number(row),
  });
  // Rows with the same key have a finding of their own; only the first takes part, so that a visit stays small.
  const keys = submission.keyNumbers(table, tableOf('assessments').rowKey.slice(1));
  const byKey = new RowGroups(keys);
  const days = submission.keyNumbers(table, ['assessment_day']);
  const groups = new RowGroups(days.map((visit, row) => (byKey.firstOf(keys[row] ?? -1) === row ? visit : -1)));
  return [...groups].map((rows) => new Visit(table, table.personOf(rows[0] ?? 0), day.number(rows[0] ?? 0) ?? 0, rows.map(result)));
}

/** Timed tests of one visit that may be compared: same aid, both with the device or both without it. Of repeated trials the fastest counts. */
export interface ComparableWalks {
  readonly selfSelected: Timed | null;
  readonly fast: Timed | null;
  readonly sixMinutes: Timed | null;
  readonly upAndGo: Timed | null;
}

/** A test and its number: speed in m/s, for timed up and go the time in seconds. */
export interface Timed {
  readonly row: number;
  readonly number: number;
}

export function comparableWalks(visit: Visit): ComparableWalks[] {
  const seconds = visit.table.column('seconds_walked');
  const walks = visit.of('tmwt_ss', 'tmwt_fast', 'six_mwt', 'tug').filter(({ value, aid }) => value !== null && aid !== null);
  const groups = partition(walks, ({ aid, inDevice }) => `${aid} ${inDevice}`);
  return [...groups.values()].map((results) => {
    const timed = (measure: string): Timed[] =>
      results.flatMap((result) => {
        if (result.measure !== measure || result.value === null) return [];
        const walked = measure === 'six_mwt' ? seconds.number(result.row) : 1;
        return walked ? [{ row: result.row, number: result.value / walked }] : [];
      });
    const best = (measure: string, isBetter: (a: number, b: number) => boolean): Timed | null =>
      timed(measure).reduce<Timed | null>((kept, next) => (kept && !isBetter(next.number, kept.number) ? kept : next), null);
    const faster = (a: number, b: number): boolean => a > b;
    return {
      selfSelected: best('tmwt_ss', faster),
      fast: best('tmwt_fast', faster),
      sixMinutes: best('six_mwt', faster),
      upAndGo: best('tug', (a, b) => a < b),
    };
  });
}
