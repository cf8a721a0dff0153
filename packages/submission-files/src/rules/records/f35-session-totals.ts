import type { Rule } from '../../checking/rule.ts';

/** Counters of devices and counts of therapists differ a little; the registry's own tolerance. */
const toleranceShare = 0.05;
const smallest = 5;

const totals = [
  { column: 'steps_total', part: 'steps', what: 'steps' },
  { column: 'distance_total_m', part: 'distanceM', what: 'distance' },
] as const;

export const sessionTotals: Rule = {
  id: 'F35',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    for (const { column, part, what } of totals) {
      const total = sessions.column(column);
      for (let row = 0; row < sessions.fileRows; row += 1) {
        const whole = total.number(row);
        const sum = whole === null ? undefined : submission.boutSums(row)?.[part];
        if (whole === null || sum == null || Math.abs(whole - sum) <= Math.max(smallest, toleranceShare * whole)) continue;
        report.add(sessions, row, column, `A total of ${what} that differs from the sum of the bouts.`);
      }
    }
  },
};
