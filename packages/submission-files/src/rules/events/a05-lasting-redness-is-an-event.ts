import { eventsOfSessions } from '../../checking/events-of-sessions.ts';
import type { Rule } from '../../checking/rule.ts';

export const lastingRednessIsAnEvent: Rule = {
  id: 'A05',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const after = sessions.column('skin_check_post');
    const hasEvent = eventsOfSessions(submission);
    for (let row = 0; row < sessions.fileRows; row += 1) {
      if (after.word(row) !== 'redness_stays' || hasEvent(row, 'skin_breakdown')) continue;
      report.add(sessions, row, 'skin_check_post', 'Redness that stays, without an adverse event.');
    }
  },
};
