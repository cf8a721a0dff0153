import type { Rule } from '../../checking/rule.ts';

export const resolvedAfterOnset: Rule = {
  id: 'A07',
  evaluate: (submission, report) => {
    const events = submission.table('adverse_events');
    const began = events.column('event_day');
    const ended = events.column('resolved_day');
    for (let row = 0; row < events.fileRows; row += 1) {
      const from = began.number(row);
      const to = ended.number(row);
      if (from !== null && to !== null && to < from) report.add(events, row, 'resolved_day', 'An event resolved before it began.');
    }
  },
};
