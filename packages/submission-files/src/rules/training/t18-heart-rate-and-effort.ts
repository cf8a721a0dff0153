import { attendedSessions } from '../../checking/attended-sessions.ts';
import { limitOf } from '../../checking/rule.ts';
import type { Rule, RuleReport } from '../../checking/rule.ts';
import type { Submission } from '../../checking/submission.ts';

const inSessions = limitOf('T18', 'sessions');
const walkingTimeFactor = limitOf('T18', 'walkingTimeFactor');

function heartRates(submission: Submission, report: RuleReport): void {
  const sessions = submission.table('sessions');
  const rest = sessions.column('hr_rest');
  const peak = sessions.column('hr_peak');
  for (let row = 0; row < sessions.fileRows; row += 1) {
    const resting = rest.number(row);
    const highest = peak.number(row);
    if (resting !== null && highest !== null && highest < resting)
      report.add(sessions, row, 'hr_peak', 'A highest heart rate below the resting one.');
  }
}

/** Sessions in a row of one course, rated on one scale, with the bouts of each at hand. */
function effort(submission: Submission, report: RuleReport): void {
  const sessions = submission.table('sessions');
  const rating = sessions.column('rpe');
  const scale = sessions.column('rpe_scale');
  const course = sessions.column('course_no');
  for (const attended of attendedSessions(submission)) {
    const walked = attended.map((row) => submission.boutSums(row)?.walkingMin ?? null);
    for (let end = inSessions - 1; end < attended.length; end += 1) {
      const rows = attended.slice(end - inSessions + 1, end + 1);
      const isOneSeries = new Set(rows.map((row) => `${course.number(row) ?? ''} ${scale.word(row) ?? ''}`)).size === 1;
      const ratings = rows.map((row) => rating.number(row));
      const isRising = ratings.every((value, index) => value !== null && (index === 0 || value > (ratings[index - 1] ?? Infinity)));
      const first = walked[end - inSessions + 1];
      const last = walked[end];
      if (!isOneSeries || !isRising || first == null || last == null || first === 0 || last > first * walkingTimeFactor) continue;
      report.addToOneOf(
        sessions,
        [...rows].reverse(),
        'rpe',
        `Exertion that rose over ${inSessions} sessions while walking time fell by half.`,
      );
    }
  }
}

export const heartRateAndEffort: Rule = {
  id: 'T18',
  evaluate: (submission, report) => {
    heartRates(submission, report);
    effort(submission, report);
  },
};
