import type { Submission } from './submission.ts';

const trained = new Set(['completed', 'shortened']);

/** For each participant the rows of the sessions that took place, by day, hour and number. Rows with the same key count once. */
export function* attendedSessions(submission: Submission): Generator<number[]> {
  const sessions = submission.table('sessions');
  const day = sessions.column('session_day');
  const hour = sessions.column('start_hour');
  const number = sessions.column('session_no');
  const status = sessions.column('status');
  const numbers = submission.sessionNumbers('sessions');
  const order = (row: number): readonly [number, number, number] => [day.number(row) ?? 0, hour.number(row) ?? -1, number.number(row) ?? 0];
  for (const rows of submission.rowsByPerson('sessions')) {
    const attended = rows.filter(
      (row) => trained.has(status.word(row) ?? '') && submission.sessionsByNumber.firstOf(numbers[row] ?? -1) === row,
    );
    yield attended.sort((a, b) => {
      const [dayA, hourA, numberA] = order(a);
      const [dayB, hourB, numberB] = order(b);
      return dayA - dayB || hourA - hourB || numberA - numberB;
    });
  }
}
