/** Commits just what was previewed. One transaction, one site at a time: either all of it is in the registry or none. */
import type { InputOf, SubmissionReceipt } from '@cairnstep/contract';
import type { commitSubmission as Commit } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireFound, requireMayAtSite, requireSubmitter, type Submitter } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { queueMail } from '../../mail/queue-mail.ts';
import { coordinatorAddresses, lockSite } from '../people/sites.repository.ts';
import { applyChanges, checkAgain } from './apply-changes.ts';
import { tableOfFile, tablesOf } from './file-key.ts';
import { lockOwnSubmission } from './lock-own-submission.ts';
import { receiptMail } from './receipt-mail.ts';
import { lockSubmission, readFiles, settle, supersedeEarlier, type SubmissionRecord } from './submissions.repository.ts';

export async function accept(
  tx: Tx,
  submitter: Submitter,
  submission: SubmissionRecord,
  digest: string,
  now: Date,
): Promise<SubmissionReceipt> {
  const revision = await lockSite(tx, submission.siteId);
  const { preview } = submission;
  if (submission.findings.some((group) => group.severity === 'error')) {
    throw new Refusal(
      'submission-has-errors',
      'Mend what the findings name, add the corrected files and check again. Nothing was committed.',
    );
  }
  const stale =
    preview === null || submission.previewDigest === null || submission.previewDigest !== digest || submission.siteRevision !== revision;
  if (stale) throw new Refusal('submission-stale', checkAgain);
  if (submission.findings.some((group) => group.acknowledgedReason === null)) {
    throw new Refusal('submission-has-open-warnings', 'Say why each of these warnings stands, or mend the rows. Nothing was committed.');
  }
  const files = await readFiles(tx, submission.id);
  await applyChanges(
    tx,
    { submission: submission.id, site: submission.siteId, month: submission.month, tables: tablesOf(files) },
    preview.tables,
  );
  await tx.query('update sites set revision = revision + 1 where id = $1', [submission.siteId]);
  await supersedeEarlier(tx, submission.id, submission.siteId, submission.month);
  const receipt: SubmissionReceipt = {
    submissionId: submission.id,
    site: { id: submission.siteId, code: submission.siteCode, name: submission.siteName },
    month: submission.month,
    acceptedAt: now.toISOString(),
    acceptedBy: submitter.name,
    digest,
    tables: preview.tables,
    files: files.map(({ key, fileName, sha256, rows, mended }) => ({ table: tableOfFile(key), fileName, sha256, rows: rows ?? 0, mended })),
    acknowledged: submission.findings.map(({ rule, count, acknowledgedReason }) => ({ rule, count, reason: acknowledgedReason ?? '' })),
  };
  await settle(tx, submission.id, 'accepted', submitter.id, receipt);
  return receipt;
}

/** The receipt, when this very commit by the same submitter went through before and its answer was lost on the way. */
async function receiptGivenBefore(tx: Tx, actor: Actor, by: string, id: string, digest: string): Promise<SubmissionReceipt | null> {
  const { siteId, status, settledBy, receipt } = requireFound(await lockSubmission(tx, id));
  requireMayAtSite(actor, 'submit', siteId);
  return status === 'accepted' && settledBy === by && receipt?.digest === digest ? receipt : null;
}

/** Whoever committed. What a site's system has done, its coordinators are told: nobody sat before a screen. */
async function recipientsOf(tx: Tx, actor: Actor, siteId: string, now: Date): Promise<string[]> {
  if (actor.kind === 'site-system') return coordinatorAddresses(tx, siteId, now.toISOString().slice(0, 10));
  const [account] = (await tx.query('select email from accounts where id = $1', [requireSubmitter(actor).id])) as {
    email: string | null;
  }[];
  return account?.email ? [account.email] : [];
}

export const commitSubmission = (
  { config, database, clock }: Context,
  actor: Actor,
  { submissionId, previewDigest }: InputOf<typeof Commit>,
  requestId: string,
): Promise<SubmissionReceipt> =>
  asActor(database, actor, async (tx) => {
    const submitter = requireSubmitter(actor);
    const before = await receiptGivenBefore(tx, actor, submitter.id, submissionId, previewDigest);
    if (before) return before;
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    const receipt = await accept(tx, submitter, submission, previewDigest, clock());
    for (const recipient of await recipientsOf(tx, actor, submission.siteId, clock())) {
      await queueMail(tx, {
        event: `submission-accepted:${submissionId}`,
        recipient,
        ...receiptMail(receipt, `${config.PUBLIC_URL}/submissions/${submissionId}/receipt`),
      });
    }
    await recordAudit(tx, actor, {
      act: 'submission.commit',
      object: submissionId,
      site: submission.siteId,
      requestId,
      detail: { digest: receipt.digest, month: receipt.month },
    });
    return receipt;
  });
