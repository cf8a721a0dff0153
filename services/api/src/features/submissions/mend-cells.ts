/** Cells mended on screen: values typed in place of those in a file, read in its place at the next check. */
import type { InputOf, Submission } from '@cairnstep/contract';
import type { mendCells as MendCells } from '@cairnstep/contract';
import { detectIdentifiers } from '@cairnstep/deidentification';
import { tableOf, type TableKey } from '@cairnstep/dictionary';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { Refusal, type LocatedIssue } from '../../http/refusal.ts';
import type { FileKey } from './file-key.ts';
import { lockOwnSubmission } from './lock-own-submission.ts';
import { countMends, putMends, setMendsDigest, type Mend } from './mends.repository.ts';
import { present } from './read-submissions.ts';
import { readFiles, reopen, type FileRecord } from './submissions.repository.ts';

/** The file whose row is meant: the table's own, or the workbook. */
function fileOf(table: TableKey, files: readonly FileRecord[]): FileKey | null {
  const file =
    files.find(({ key }) => key === table) ??
    files.find(({ key, tables }) => key === 'workbook' && (tables === null || tables.includes(table)));
  return file === undefined || file.refused ? null : file.key;
}

function issueWith({ table, column }: Mend, files: readonly FileRecord[]): string | null {
  if (fileOf(table, files) === null) return 'No file of this table is there. Send one first.';
  return tableOf(table).variables.some(({ key }) => key === column) ? null : 'The table has no such column.';
}

/** More than anybody types: who has as many mistakes mends them in the file. */
const mostMends = 20_000;

/** What identifies somebody is refused at once: unlike a file, it is not kept until the check. */
const identifies = ({ table, column, value }: Mend): boolean =>
  detectIdentifiers({ headers: [column], rows: [[value]] }, { dictionaryTable: table }).some(({ strength }) => strength === 'block');

function refuseUnusable(mends: readonly Mend[], files: readonly FileRecord[]): void {
  const issues = mends.flatMap((mend, index): LocatedIssue[] => {
    const detail = issueWith(mend, files);
    return detail === null ? [] : [{ pointer: `/body/mends/${index}`, detail }];
  });
  if (issues.length > 0) throw new Refusal('invalid-input', 'Nothing was kept. Mend what is listed and send it again.', issues);
  const refused = mends.flatMap((mend, index): LocatedIssue[] =>
    identifies(mend) ? [{ pointer: `/body/mends/${index}/value`, detail: 'This could identify a person.' }] : [],
  );
  if (refused.length > 0)
    throw new Refusal(
      'identifies-somebody',
      'Nothing of it was kept. Type study days, plain numbers and codes: no names, dates or numbers of people.',
      refused,
    );
}

export const mendCells = (
  { database, clock }: Context,
  actor: Actor,
  { submissionId, mends }: InputOf<typeof MendCells>,
  requestId: string,
): Promise<Submission> =>
  asActor(database, actor, async (tx) => {
    const submission = await lockOwnSubmission(tx, actor, submissionId, clock());
    const files = await readFiles(tx, submissionId);
    refuseUnusable(mends, files);
    // Of two values for one cell the later counts.
    const last = new Map(mends.map((mend) => [`${mend.table} ${mend.line} ${mend.column}`, mend]));
    await reopen(tx, submissionId);
    await putMends(tx, submissionId, submission.siteId, [...last.values()]);
    if ((await countMends(tx, submissionId)) > mostMends)
      throw new Refusal(
        'too-large',
        `At most ${mostMends.toLocaleString('en')} cells can be mended on screen. Nothing of these was kept; send a corrected file.`,
      );
    const changed = new Set([...last.values()].map(({ table }) => fileOf(table, files) ?? table));
    for (const file of changed) await setMendsDigest(tx, submissionId, file);
    await recordAudit(tx, actor, {
      act: 'submission.mend',
      object: submissionId,
      site: submission.siteId,
      requestId,
      detail: countsByColumn([...last.values()]),
    });
    return present(tx, submissionId);
  });

/** `{"bouts.steps": 2}`: which columns, and in how many rows. */
function countsByColumn(mends: readonly Mend[]): Record<string, number> {
  const counts: Record<string, number> = {};
  for (const { table, column } of mends) counts[`${table}.${column}`] = (counts[`${table}.${column}`] ?? 0) + 1;
  return counts;
}
