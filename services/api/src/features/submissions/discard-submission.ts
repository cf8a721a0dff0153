import type { InputOf, Submission } from '@cairnstep/contract';
import type { discardSubmission as Discard } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireSubmitter } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { lockOwnSubmission } from './lock-own-submission.ts';
import { present } from './read-submissions.ts';
import { settle } from './submissions.repository.ts';

export const discardSubmission = (
  { database, clock }: Context,
  actor: Actor,
  { submissionId }: InputOf<typeof Discard>,
  requestId: string,
): Promise<Submission> =>
  asActor(database, actor, async (tx) => {
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    await settle(tx, submissionId, 'discarded', requireSubmitter(actor).id, null);
    await recordAudit(tx, actor, { act: 'submission.discard', object: submissionId, site: submission.siteId, requestId });
    return present(tx, submissionId);
  });
