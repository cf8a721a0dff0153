import type { InputOf, Submission } from '@cairnstep/contract';
import type { checkSubmission as CheckSubmission } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { enqueue } from '../../jobs/enqueue.ts';
import { lockOwnSubmission } from './lock-own-submission.ts';
import { present } from './read-submissions.ts';
import { beginCheck, readFiles } from './submissions.repository.ts';

/** The worker reads and checks; whoever asked may leave and come back. */
export const requestCheck = (
  { database, clock }: Context,
  actor: Actor,
  { submissionId }: InputOf<typeof CheckSubmission>,
  requestId: string,
): Promise<Submission> =>
  asActor(database, actor, async (tx) => {
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    if ((await readFiles(tx, submissionId)).length === 0) throw new Refusal('submission-empty', 'Add at least one file, then check.');
    await beginCheck(tx, submissionId, clock());
    await enqueue(tx, 'check-submission', { submissionId });
    await recordAudit(tx, actor, { act: 'submission.check', object: submissionId, site: submission.siteId, requestId });
    return present(tx, submissionId);
  });
