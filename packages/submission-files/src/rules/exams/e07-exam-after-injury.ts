import type { Rule } from '../../checking/rule.ts';

export const examAfterInjury: Rule = {
  id: 'E07',
  evaluate: (submission, report) => {
    const { table } = submission.exams;
    for (let row = 0; row < table.fileRows; row += 1) {
      const day = submission.exams.dayOf(row);
      const injured = submission.injuryDay(table.personOf(row));
      if (day !== null && injured !== null && day < injured) report.add(table, row, 'exam_day', 'An exam before the injury.');
    }
  },
};
