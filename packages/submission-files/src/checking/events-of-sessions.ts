import type { Submission } from './submission.ts';

/**
 * Whether an adverse event of a kind is on record for a session: one that names the session, or one of the same
 * participant that names none and began on its day.
 */
export function eventsOfSessions(submission: Submission): (session: number, kind: string) => boolean {
  const sessions = submission.table('sessions');
  const events = submission.table('adverse_events');
  const sessionDay = sessions.column('session_day');
  const sessionNumbers = submission.sessionNumbers('sessions');
  const namedNumbers = submission.sessionNumbers('adverse_events');
  const eventDay = events.column('event_day');
  const kinds = events.column('kind');
  const known = new Set<string>();
  for (let row = 0; row < events.length; row += 1) {
    const kind = kinds.word(row) ?? '';
    const named = namedNumbers[row] ?? -1;
    known.add(named >= 0 ? `${kind} of ${named}` : `${kind} on ${events.personOf(row)} ${eventDay.number(row) ?? ''}`);
  }
  return (session, kind) =>
    known.has(`${kind} of ${sessionNumbers[session] ?? ''}`) ||
    known.has(`${kind} on ${sessions.personOf(session)} ${sessionDay.number(session) ?? ''}`);
}
