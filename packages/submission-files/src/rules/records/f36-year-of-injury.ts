import { daysInAYear } from '../../checking/days-in-a-year.ts';
import type { Rule } from '../../checking/rule.ts';

export const yearOfInjury: Rule = {
  id: 'F36',
  evaluate: (submission, report) => {
    const participants = submission.table('participants');
    const year = participants.column('injury_year');
    const days = participants.column('days_injury_to_index');
    for (let row = 0; row < participants.fileRows; row += 1) {
      const injured = year.number(row);
      if (injured === null) continue;
      const { year: thisYear } = submission.context;
      if (injured > thisYear) report.add(participants, row, 'injury_year', 'A year of injury in the future.');
      else if (injured + Math.floor((days.number(row) ?? 0) / daysInAYear) > thisYear) {
        report.add(
          participants,
          row,
          'days_injury_to_index',
          'A first training day in the future, by the year of injury and the days since.',
        );
      }
    }
  },
};
