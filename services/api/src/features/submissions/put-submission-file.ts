/** Files of a submission come and go until it is settled. Their bytes are kept until then; a workbook is written again from its cells first. */
import { createHash } from 'node:crypto';
import { setImmediate as nextTurn } from 'node:timers/promises';
import type { InputOf, Submission } from '@cairnstep/contract';
import type {
  putSubmissionFile as PutFile,
  putSubmissionWorkbook as PutWorkbook,
  removeSubmissionFile as RemoveFile,
  removeSubmissionWorkbook as RemoveWorkbook,
} from '@cairnstep/contract';
import { showableFileName } from '@cairnstep/deidentification';
import { plainWorkbook, type Unreadable } from '@cairnstep/submission-files';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import type { RequestFacts } from '../../http/route.ts';
import type { FileKey } from './file-key.ts';
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

interface Arriving {
  readonly submissionId: string;
  readonly key: FileKey;
  readonly fileName: string;
  /** What is kept of the bytes. */
  readonly keep: (bytes: Buffer) => Buffer | Promise<Buffer>;
}

async function put(
  context: Context,
  actor: Actor,
  { submissionId, key, fileName, keep }: Arriving,
  facts: RequestFacts,
): Promise<Submission> {
  const { database, config, clock } = context;
  // Refuse before reading what would be refused after it.
  await asActor(database, actor, (tx) => lockOwnSubmission(tx, actor, submissionId, clock()));
  const sent = await readLimited(facts.upload, config.UPLOAD_LIMIT_BYTES);
  const content = await keep(sent);
  const sha256 = createHash('sha256').update(sent).digest('hex');
  return asActor(database, actor, async (tx) => {
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    await reopen(tx, submissionId);
    await putFile(tx, submissionId, submission.siteId, {
      table: key,
      fileName: showableFileName(fileName, { table: key, siteCode: submission.siteCode, month: submission.month }),
      sha256,
      content,
      bytes: sent.length,
    });
    await recordAudit(tx, actor, {
      act: 'submission.file',
      object: submissionId,
      site: submission.siteId,
      requestId: facts.requestId,
      detail: { table: key, bytes: sent.length, sha256 },
    });
    return present(tx, submissionId);
  });
}

export const putSubmissionFile = (
  context: Context,
  actor: Actor,
  { submissionId, table, fileName }: InputOf<typeof PutFile>,
  facts: RequestFacts,
): Promise<Submission> => put(context, actor, { submissionId, key: table, fileName, keep: (bytes) => bytes }, facts);

const lineOf = ({ line }: Unreadable): string => (line === null ? '' : ` That is in row ${line} of a sheet.`);

export const putSubmissionWorkbook = (
  context: Context,
  actor: Actor,
  { submissionId, fileName }: InputOf<typeof PutWorkbook>,
  facts: RequestFacts,
): Promise<Submission> => {
  const keep = async (bytes: Buffer): Promise<Buffer> => {
    const plain = await plainWorkbook(bytes, undefined, nextTurn);
    if (!plain.ok) throw new Refusal('file-unreadable', `${plain.found}${lineOf(plain)} Nothing was kept. ${plain.mend}`);
    return Buffer.from(plain.bytes.buffer, plain.bytes.byteOffset, plain.bytes.byteLength);
  };
  return put(context, actor, { submissionId, key: 'workbook', fileName, keep }, facts);
};

const takeOut = ({ database, clock }: Context, actor: Actor, submissionId: string, key: FileKey, requestId: string): Promise<Submission> =>
  asActor(database, actor, async (tx) => {
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    await reopen(tx, submissionId);
    await removeFile(tx, submissionId, key);
    await recordAudit(tx, actor, {
      act: 'submission.file-removed',
      object: submissionId,
      site: submission.siteId,
      requestId,
      detail: { table: key },
    });
    return present(tx, submissionId);
  });

export const removeSubmissionFile = (
  context: Context,
  actor: Actor,
  { submissionId, table }: InputOf<typeof RemoveFile>,
  requestId: string,
): Promise<Submission> => takeOut(context, actor, submissionId, table, requestId);

export const removeSubmissionWorkbook = (
  context: Context,
  actor: Actor,
  { submissionId }: InputOf<typeof RemoveWorkbook>,
  requestId: string,
): Promise<Submission> => takeOut(context, actor, submissionId, 'workbook', requestId);
