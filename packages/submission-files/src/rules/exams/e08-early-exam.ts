import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const withinDays = limitOf('E08', 'withinDays');

export const earlyExam: Rule = {
  id: 'E08',
  evaluate: (submission, report) => {
    const { table } = submission.exams;
    for (let row = 0; row < table.fileRows; row += 1) {
      const day = submission.exams.dayOf(row);
      const injured = submission.injuryDay(table.personOf(row));
      if (day === null || injured === null) continue;
      const since = day - injured;
      if (since >= 0 && since <= withinDays) report.add(table, row, 'exam_day', `An exam within ${withinDays} day of the injury.`);
    }
  },
};
