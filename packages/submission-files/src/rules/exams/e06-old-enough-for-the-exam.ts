import { daysInAYear } from '../../checking/days-in-a-year.ts';
import { limitOf } from '../../checking/rule.ts';
import type { Rule } from '../../checking/rule.ts';

const youngestYears = limitOf('E06', 'youngestYears');

export const oldEnoughForTheExam: Rule = {
  id: 'E06',
  evaluate: (submission, report) => {
    const { table } = submission.exams;
    const participants = submission.table('participants');
    const age = participants.column('age_at_index');
    for (let row = 0; row < table.fileRows; row += 1) {
      const day = submission.exams.dayOf(row);
      const person = submission.rowsByPerson('participants').firstOf(table.personOf(row));
      const years = person < 0 ? null : age.number(person);
      // Completed years: up to one more may have passed on the first training day.
      if (day === null || years === null || years + 1 + day / daysInAYear > youngestYears) continue;
      report.add(table, row, 'exam_day', `An exam of a child under ${youngestYears}.`);
    }
  },
};
