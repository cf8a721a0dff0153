import type { InputOf, Submission } from '@cairnstep/contract';
import type { acknowledgeFindings as Acknowledge } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireFound } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { lockOwnSubmission } from './lock-own-submission.ts';
import { present } from './read-submissions.ts';
import { setFindingGroups } from './submissions.repository.ts';

/** The reason stays with the submission and its receipt; the log says only that one was given, for the words are the clinic's. */
export const acknowledgeFindings = (
  { database, clock }: Context,
  actor: Actor,
  { submissionId, rule, reason }: InputOf<typeof Acknowledge>,
  requestId: string,
): Promise<Submission> =>
  asActor(database, actor, async (tx) => {
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    const group = requireFound(submission.findings.find((one) => one.rule === rule && one.severity === 'warning'));
    await setFindingGroups(
      tx,
      submissionId,
      submission.findings.map((one) => (one === group ? { ...one, acknowledgedReason: reason } : one)),
    );
    await recordAudit(tx, actor, {
      act: 'submission.acknowledge',
      object: submissionId,
      site: submission.siteId,
      requestId,
      detail: { rule, count: group.count },
    });
    return present(tx, submissionId);
  });
