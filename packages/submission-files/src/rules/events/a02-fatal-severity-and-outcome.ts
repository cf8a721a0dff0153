import type { Rule } from '../../checking/rule.ts';

export const fatalSeverityAndOutcome: Rule = {
  id: 'A02',
  evaluate: (submission, report) => {
    const events = submission.table('adverse_events');
    const severity = events.column('severity');
    const outcome = events.column('outcome');
    for (let row = 0; row < events.fileRows; row += 1) {
      const grade = severity.word(row);
      const ended = outcome.word(row);
      if (grade === null || ended === null) continue;
      if (grade === '5' && ended !== 'fatal') report.add(events, row, 'outcome', 'Severity 5 with an outcome that is not fatal.');
      if (grade !== '5' && ended === 'fatal') report.add(events, row, 'severity', 'A fatal outcome with a severity below 5.');
    }
  },
};
