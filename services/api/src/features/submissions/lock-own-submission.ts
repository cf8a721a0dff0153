import type { Actor } from '../../authority/actor.ts';
import { requireFound, requireMayAtSite } from '../../authority/require-may.ts';
import type { Tx } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { lockSubmission, type Status, type SubmissionRecord } from './submissions.repository.ts';

/** A check that has run longer than this has lost its worker; the submission may be taken up again. */
const lostCheckMinutes = 5;

export const checkIsLost = (submission: SubmissionRecord, now: Date): boolean =>
  submission.status === 'checking' &&
  now.getTime() - Date.parse(submission.progress?.startedAt ?? '1970-01-01T00:00:00Z') > lostCheckMinutes * 60_000;

const unsettled: readonly Status[] = ['open', 'checked'];

/** Locks a submission of the actor's own site that still takes changes. */
export async function lockOwnSubmission(tx: Tx, actor: Actor, id: string, now: Date): Promise<SubmissionRecord> {
  const submission = requireFound(await lockSubmission(tx, id));
  requireMayAtSite(actor, 'submit', submission.siteId);
  if (submission.status === 'checking' && !checkIsLost(submission, now)) {
    throw new Refusal('submission-busy', 'Wait until the check has finished. Nothing was changed.');
  }
  if (submission.status !== 'checking' && !unsettled.includes(submission.status)) {
    throw new Refusal(
      'submission-closed',
      'It was accepted or given up before. To correct the month, open it again: a new submission replaces the earlier one.',
    );
  }
  return submission;
}
