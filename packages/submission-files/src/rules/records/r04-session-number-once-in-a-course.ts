import { RowGroups } from '../../checking/row-groups.ts';
import type { Rule } from '../../checking/rule.ts';

export const sessionNumberOnceInACourse: Rule = {
  id: 'R04',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const day = sessions.column('session_day');
    const groups = new RowGroups(submission.keyNumbers(sessions, ['course_no', 'session_no']));
    for (const rows of groups) {
      const [first, ...others] = rows;
      if (first === undefined) continue;
      // The same number on the same day is the same key, which has a rule of its own.
      for (const row of others) {
        if (day.number(row) !== day.number(first))
          report.addToOneOf(sessions, [row, first], 'session_no', 'A session number that occurs on two days of the same course.');
      }
    }
  },
};
