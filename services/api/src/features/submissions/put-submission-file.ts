/** Files of a submission come and go until it is settled. Their bytes are kept as sent until then. */
import { createHash } from 'node:crypto';
import type { InputOf, Submission } from '@cairnstep/contract';
import type { putSubmissionFile as PutFile, removeSubmissionFile as RemoveFile } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import type { RequestFacts } from '../../http/route.ts';
import { lockOwnSubmission } from './lock-own-submission.ts';
import { present } from './read-submissions.ts';
import { putFile, removeFile, reopen } from './submissions.repository.ts';

/** Counts the bytes that arrive, whatever the header announced. */
async function readLimited(stream: AsyncIterable<Buffer>, limit: number): Promise<Buffer> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of stream) {
    size += chunk.length;
    if (size > limit)
      throw new Refusal(
        'too-large',
        `A file may hold at most ${Math.floor(limit / 1_000_000)} MB. Nothing was kept. Send the table in parts, or only the columns of the template.`,
      );
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
}

export async function putSubmissionFile(
  context: Context,
  actor: Actor,
  { submissionId, table, fileName }: InputOf<typeof PutFile>,
  facts: RequestFacts,
): Promise<Submission> {
  const { database, config, clock } = context;
  // Refuse before reading what would be refused after it.
  await asActor(database, actor, (tx) => lockOwnSubmission(tx, actor, submissionId, clock()));
  const content = await readLimited(facts.upload, config.UPLOAD_LIMIT_BYTES);
  const sha256 = createHash('sha256').update(content).digest('hex');
  return asActor(database, actor, async (tx) => {
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    await reopen(tx, submissionId);
    await putFile(tx, submissionId, submission.siteId, { table, fileName, sha256, content });
    await recordAudit(tx, actor, {
      act: 'submission.file',
      object: submissionId,
      site: submission.siteId,
      requestId: facts.requestId,
      detail: { table, bytes: content.length, sha256 },
    });
    return present(tx, submissionId);
  });
}

export const removeSubmissionFile = (
  { database, clock }: Context,
  actor: Actor,
  { submissionId, table }: InputOf<typeof RemoveFile>,
  requestId: string,
): Promise<Submission> =>
  asActor(database, actor, async (tx) => {
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    await reopen(tx, submissionId);
    await removeFile(tx, submissionId, table);
    await recordAudit(tx, actor, {
      act: 'submission.file-removed',
      object: submissionId,
      site: submission.siteId,
      requestId,
      detail: { table },
    });
    return present(tx, submissionId);
  });
