import type { Rule } from '../../checking/rule.ts';

export const eventNamesASession: Rule = {
  id: 'R03',
  evaluate: (submission, report) => {
    const events = submission.table('adverse_events');
    const numbers = submission.sessionNumbers('adverse_events');
    for (let row = 0; row < events.fileRows; row += 1) {
      const number = numbers[row] ?? -1;
      if (number >= 0 && !submission.sessionsByNumber.has(number))
        report.add(events, row, 'session_no', 'An event of a session that is neither in the file of sessions nor in the registry.');
    }
  },
};
