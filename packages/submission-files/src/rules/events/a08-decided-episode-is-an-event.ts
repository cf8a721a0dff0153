import { eventsOfSessions } from '../../checking/events-of-sessions.ts';
import type { Rule } from '../../checking/rule.ts';

const decisions = [
  { column: 'dysreflexia_decision', kind: 'autonomic_dysreflexia' },
  { column: 'hypotension_decision', kind: 'orthostatic_hypotension' },
] as const;

export const decidedEpisodeIsAnEvent: Rule = {
  id: 'A08',
  evaluate: (submission, report) => {
    const sessions = submission.table('sessions');
    const hasEvent = eventsOfSessions(submission);
    for (const { column, kind } of decisions) {
      const decision = sessions.column(column);
      for (let row = 0; row < sessions.fileRows; row += 1) {
        if (decision.word(row) === 'present' && !hasEvent(row, kind))
          report.add(sessions, row, column, 'An episode decided as present without an adverse event of that kind.');
      }
    }
  },
};
