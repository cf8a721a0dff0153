import { variableOf } from '@cairnstep/dictionary';
import { daysInAYear } from '../../checking/days-in-a-year.ts';
import type { Rule } from '../../checking/rule.ts';

/** The highest age stands for everyone of that age or more. */
const topAge = variableOf('participants', 'age_at_index').hard?.max ?? Infinity;

export const injuryAfterBirth: Rule = {
  id: 'R05',
  evaluate: (submission, report) => {
    const participants = submission.table('participants');
    const age = participants.column('age_at_index');
    const days = participants.column('days_injury_to_index');
    for (let row = 0; row < participants.fileRows; row += 1) {
      const years = age.number(row);
      const since = days.number(row);
      if (years === null || since === null || years >= topAge) continue;
      // Completed years: up to one more may have passed.
      if (since / daysInAYear > years + 1) report.add(participants, row, 'days_injury_to_index', 'An injury before birth.');
    }
  },
};
