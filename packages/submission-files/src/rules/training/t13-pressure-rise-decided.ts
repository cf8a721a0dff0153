import { levels } from '@cairnstep/scoring';
import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';
import type { Submission } from '../../checking/submission.ts';

const riseMmHg = limitOf('T13', 'riseMmHg');
const t6 = levels.indexOf('T6');

/** Whether the last exam up to a day puts every possible level at T6 or above. */
function isT6OrAbove({ exams }: Submission, person: number, day: number | null): boolean {
  const exam = day === null ? null : exams.lastBetween(person, -Infinity, day);
  const possible = exam === null ? [] : (exams.classification(exam)?.nli.values ?? []);
  return possible.length > 0 && possible.every((level) => levels.indexOf(level) <= t6);
}

export const pressureRiseDecided: Rule = {
  id: 'T13',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const day = sessions.column('session_day');
    const before = sessions.column('sbp_pre');
    const later = [sessions.column('sbp_max'), sessions.column('sbp_post')];
    const decision = sessions.column('dysreflexia_decision');
    for (let row = 0; row < sessions.fileRows; row += 1) {
      const pre = before.number(row);
      if (pre === null || !decision.isEmpty(row)) continue;
      const rose = later.some((column) => {
        const reading = column.number(row);
        return reading !== null && reading - pre >= riseMmHg;
      });
      if (!rose) continue;
      const found = isT6OrAbove(submission, sessions.personOf(row), day.number(row))
        ? `A rise of ${riseMmHg} mmHg or more without a decision, at a level of T6 or above, where dysreflexia is to be expected.`
        : `A rise of ${riseMmHg} mmHg or more without a decision on dysreflexia.`;
      report.add(sessions, row, 'dysreflexia_decision', found);
    }
  },
};
