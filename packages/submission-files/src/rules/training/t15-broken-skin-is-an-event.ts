import { eventsOfSessions } from '../../checking/events-of-sessions.ts';
import type { Rule } from '../../checking/rule.ts';

export const brokenSkinIsAnEvent: Rule = {
  id: 'T15',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const before = sessions.column('skin_check_pre');
    const after = sessions.column('skin_check_post');
    const hasEvent = eventsOfSessions(submission);
    for (let row = 0; row < sessions.fileRows; row += 1) {
      if (before.word(row) !== 'intact' || after.word(row) !== 'broken' || hasEvent(row, 'skin_breakdown')) continue;
      report.add(sessions, row, 'skin_check_post', 'Skin broken in training without an adverse event.');
    }
  },
};
