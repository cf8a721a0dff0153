/** The job that reads and checks a submission and works out what a commit would change. What it writes, it writes in one transaction at its end. */
import { setImmediate as nextTurn } from 'node:timers/promises';
import { checkSteps, FindingLog, type Finding, type RuleFindings } from '@cairnstep/submission-files';
import { recordAudit } from '../../audit/record-audit.ts';
import { registry } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { countChanges } from './apply-changes.ts';
import { tablesOf } from './file-key.ts';
import { previewDigest } from './preview-digest.ts';
import { readSubmissionFiles, type FilesRead } from './read-submission-files.ts';
import { loadRegistryContext } from './registry-context.repository.ts';
import { beginStaging, clearStaged } from './stage-rows.ts';
import {
  clearCheck,
  finishCheck,
  lockSubmission,
  readFiles,
  readSubmission,
  refuseFile,
  setFileRows,
  setProgress,
  type SubmissionRecord,
} from './submissions.repository.ts';

type Step = NonNullable<SubmissionRecord['progress']>['step'];

interface Checked extends FilesRead {
  readonly groups: readonly RuleFindings[];
  readonly errors: number;
}

const findingsPerInsert = 2_000;

async function insertFindings(tx: Tx, submission: SubmissionRecord, findings: readonly Finding[]): Promise<void> {
  for (let start = 0; start < findings.length; start += findingsPerInsert) {
    const part = findings.slice(start, start + findingsPerInsert);
    await tx.query(
      `insert into submission_findings (submission_id, site_id, ordinal, rule, severity, table_key, line, column_key, found, mend)
       select $1, $2, * from unnest($3::int[], $4::text[], $5::text[], $6::text[], $7::int[], $8::text[], $9::text[], $10::text[])`,
      [
        submission.id,
        submission.siteId,
        part.map((_, index) => start + index + 1),
        part.map((one) => one.rule),
        part.map((one) => one.severity),
        part.map((one) => one.table),
        part.map((one) => one.line),
        part.map((one) => one.column),
        part.map((one) => one.found),
        part.map((one) => one.mend),
      ],
    );
  }
}

/** A reason given for the same warnings before is kept while their number stays the same. */
function groupsOf(checked: Checked, { findings, reasons }: SubmissionRecord): SubmissionRecord['findings'] {
  const earlier = [...findings, ...(reasons ?? [])];
  return checked.groups.map(({ id, severity, statement, why, mend, count }) => ({
    rule: id,
    severity,
    statement,
    why,
    mend,
    count,
    acknowledgedReason:
      earlier.find((group) => group.rule === id && group.severity === severity && group.count === count)?.acknowledgedReason ?? null,
  }));
}

export async function checkSubmission(context: Context, submissionId: string): Promise<void> {
  const { database, clock } = context;
  const start = await asActor(database, registry, async (tx) => ({
    submission: await readSubmission(tx, submissionId),
    files: await readFiles(tx, submissionId),
  }));
  const { submission, files } = start;
  if (submission?.status !== 'checking') return;
  const startedAt = submission.progress?.startedAt ?? clock().toISOString();
  const progress = (step: Step, done: number, of: number) =>
    asActor(database, registry, (tx) => setProgress(tx, submissionId, { step, done, of, startedAt }));

  const log = new FindingLog();
  const read = await readSubmissionFiles(context, submission, files, log, (done) => progress('read', done, files.length));
  await progress('check', 0, 1);
  const held = await asActor(database, registry, (tx) =>
    loadRegistryContext(tx, submission.siteId, submission.month, read.tables, clock().getUTCFullYear()),
  );
  await asActor(database, registry, async (tx) => {
    // Whoever else checks the same submission, as after a lost connection, waits here and finds it done.
    await tx.query("select pg_advisory_xact_lock(hashtext('check'), hashtext($1))", [submissionId]);
    if (!isSameCheck(await readSubmission(tx, submissionId), submission)) return;
    await tx.query('savepoint before');
    // Where reading has found errors, nothing will be staged.
    const staging = await beginStaging(tx, log.counts.errors > 0 ? [] : Object.values(read.tables), submissionId, submission.siteId);
    for (const _ of checkSteps(read.tables, held, log)) await nextTurn();
    const { failure } = await staging.done;
    const checked: Checked = { ...read, groups: log.byRule(), errors: log.counts.errors };
    if (checked.errors > 0) {
      await tx.query('rollback to savepoint before');
      await clearStaged(tx, submissionId);
    } else if (failure) throw failure.error;
    await progress('compare', 0, 1);
    // Another run of this job has finished, or the files have changed since: what was staged here goes.
    if (!(await writeOutcome(tx, submission, checked))) await tx.query('rollback to savepoint before');
  });
}

const isSameCheck = (now: SubmissionRecord | null, before: SubmissionRecord): now is SubmissionRecord =>
  now?.status === 'checking' && now.progress?.startedAt === before.progress?.startedAt;

/** False when the submission is no longer being checked, or is by a later run; then nothing was written. */
async function writeOutcome(tx: Tx, before: SubmissionRecord, checked: Checked): Promise<boolean> {
  const submission = await lockSubmission(tx, before.id);
  if (!isSameCheck(submission, before)) return false;
  await clearCheck(tx, submission.id);
  await insertFindings(
    tx,
    submission,
    checked.groups.flatMap((group) => group.kept),
  );
  for (const [file, rows] of checked.rows) await setFileRows(tx, submission.id, file, rows);
  for (const file of checked.refused) await refuseFile(tx, submission.id, file);
  const findings = groupsOf(checked, submission);
  if (checked.errors > 0) {
    await finishCheck(tx, submission.id, { findings, preview: null, previewDigest: null, siteRevision: null });
  } else {
    const [{ revision }] = (await tx.query('select revision from sites where id = $1', [submission.siteId])) as [{ revision: number }];
    const files = await readFiles(tx, submission.id);
    const changes = await countChanges(tx, {
      submission: submission.id,
      site: submission.siteId,
      month: submission.month,
      tables: tablesOf(files),
    });
    const digest = previewDigest({ submission: submission.id, revision, files, tables: changes });
    await finishCheck(tx, submission.id, { findings, preview: { tables: changes }, previewDigest: digest, siteRevision: revision });
  }
  await recordAudit(tx, registry, {
    act: 'submission.checked',
    object: submission.id,
    site: submission.siteId,
    detail: {
      errors: checked.errors,
      warnings: findings.filter((group) => group.severity === 'warning').reduce((sum, group) => sum + group.count, 0),
      ...(checked.refused.length > 0 ? { refused: checked.refused } : {}),
    },
  });
  return true;
}
