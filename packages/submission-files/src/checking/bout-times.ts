import type { Submission } from './submission.ts';

/** What the bouts of one session add up to, in minutes. */
export interface BoutTimes {
  readonly bouts: number;
  /** Minutes walked: bouts of walking only. */
  readonly walking: number;
  /** Minutes of rest between the bouts; the rest behind the last one is not counted. */
  readonly restsBetween: number;
}

/** The bout times of a session, by its row; null when none of its bouts is known. */
export function boutTimes(submission: Submission): (session: number) => BoutTimes | null {
  const bouts = submission.table('bouts');
  const sessionOf = submission.sessionNumbers(submission.table('sessions'));
  const duration = bouts.column('duration_s');
  const rest = bouts.column('rest_after_s');
  const activity = bouts.column('activity');
  const number = bouts.column('bout_no');
  return (session) => {
    const rows = submission.boutsBySession.rowsOf(sessionOf(session));
    if (rows.length === 0) return null;
    const last = rows.reduce((kept, row) => (Number(number.number(row)) > Number(number.number(kept)) ? row : kept));
    let walking = 0;
    let restsBetween = 0;
    for (const row of rows) {
      if (activity.word(row) === 'walking') walking += Number(duration.number(row));
      if (row !== last) restsBetween += Number(rest.number(row));
    }
    return { bouts: rows.length, walking: walking / 60, restsBetween: restsBetween / 60 };
  };
}
