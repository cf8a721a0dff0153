import type { Rule } from '../../checking/rule.ts';

/** Counters of devices and counts of therapists differ a little; the registry's own tolerance. */
const toleranceShare = 0.05;
const smallest = 5;

const totals = [
  { total: 'steps_total', part: 'steps', what: 'steps' },
  { total: 'distance_total_m', part: 'distance_m', what: 'distance' },
] as const;

export const sessionTotals: Rule = {
  id: 'F35',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const bouts = submission.table('bouts');
    const activity = bouts.column('activity');
    const sessionOf = submission.sessionNumbers(sessions);
    for (const { total, part, what } of totals) {
      const given = sessions.column(total);
      const parts = bouts.column(part);
      for (let row = 0; row < sessions.fileRows; row += 1) {
        const whole = given.number(row);
        if (whole === null) continue;
        const walks = submission.boutsBySession.rowsOf(sessionOf(row)).filter((bout) => activity.word(bout) === 'walking');
        const values = walks.map((bout) => parts.number(bout));
        // A bout without its count leaves nothing to compare.
        if (values.length === 0 || values.includes(null)) continue;
        const sum = values.reduce<number>((kept, value) => kept + (value ?? 0), 0);
        if (Math.abs(whole - sum) > Math.max(smallest, toleranceShare * whole))
          report.add(sessions, row, total, `A total of ${what} that differs from the sum of the bouts.`);
      }
    }
  },
};
