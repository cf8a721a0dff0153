/** The findings of a submission to work through elsewhere: as a list, and in the cells of the files they are about. */
import type { InputOf } from '@cairnstep/contract';
import type { downloadFindings as Download } from '@cairnstep/contract';
import { tableOf, type TableKey } from '@cairnstep/dictionary';
import { isFormulaLike, writeFindingsWorkbook, type Finding, type RuleFindings, type SubmittedFile } from '@cairnstep/submission-files';
import { stringify } from 'csv-stringify/sync';
import type { Actor } from '../../authority/actor.ts';
import { mayAtSite } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import type { FileAnswer } from '../../http/route.ts';
import { allOf } from './all-of.ts';
import { readMends } from './mends.repository.ts';
import { visibleSubmission } from './read-submissions.ts';
import { readPieces } from './read-pieces.ts';
import { listFindings, readFiles, type FindingRecord, type SubmissionRecord } from './submissions.repository.ts';

const findingsAtATime = 5_000;

async function* readAll(tx: Tx, submissionId: string): AsyncGenerator<readonly FindingRecord[]> {
  for (let offset = 0; ; offset += findingsAtATime) {
    const { items } = await listFindings(tx, submissionId, {}, findingsAtATime, offset);
    if (items.length === 0) return;
    yield items;
  }
}

const fileName = ({ siteCode, month }: SubmissionRecord, ending: string): string => `${siteCode}-${month}-findings.${ending}`;

const header = ['Severity', 'Rule', 'Table', 'Line', 'Column', 'Found', 'Mend', 'Why'];

/** A header of the clinic may begin like a formula; behind an apostrophe no program carries it out. */
const harmless = (cell: string | number | null): string | number | null =>
  typeof cell === 'string' && isFormulaLike(cell) ? `'${cell}` : cell;

export const downloadFindings = ({ database }: Context, actor: Actor, { submissionId }: InputOf<typeof Download>): Promise<FileAnswer> =>
  asActor(database, actor, async (tx) => {
    const submission = await visibleSubmission(tx, actor, submissionId);
    const why = new Map(submission.findings.map((group) => [group.rule, group.why]));
    const pieces = [Buffer.from(`\ufeff${stringify([header], { record_delimiter: '\r\n' })}`)];
    for await (const findings of readAll(tx, submissionId)) {
      const rows = findings.map(({ severity, rule, table, line, column, found, mend }) =>
        [severity, rule, table === null ? 'workbook' : tableOf(table).name, line, column, found, mend, why.get(rule) ?? null].map(harmless),
      );
      pieces.push(Buffer.from(stringify(rows, { record_delimiter: '\r\n' })));
    }
    return { fileName: fileName(submission, 'csv'), bytes: Buffer.concat(pieces) };
  });

async function groupsOf(tx: Tx, { id, findings }: SubmissionRecord): Promise<RuleFindings[]> {
  const kept = new Map<string, Finding[]>(findings.map(({ rule }) => [rule, []]));
  for await (const page of readAll(tx, id)) for (const finding of page) kept.get(finding.rule)?.push(finding);
  return findings.map(({ rule, severity, statement, why, mend, count }) => ({
    id: rule,
    severity,
    statement,
    why,
    mend,
    count,
    kept: kept.get(rule) ?? [],
  }));
}

/**
 * The files as they were checked, for those who sent them. Rows that are in no registry yet are nobody else's to see, and a file that has not
 * been screened is not given out again.
 */
async function filesFor(tx: Tx, actor: Actor, submission: SubmissionRecord): Promise<SubmittedFile[]> {
  if (submission.status !== 'checked' || !mayAtSite(actor, 'submit', submission.siteId)) return [];
  const mends = await readMends(tx, submission.id);
  return (await readFiles(tx, submission.id))
    .filter(({ refused }) => !refused)
    .map(({ key }): SubmittedFile => {
      const content = readPieces(tx, submission.id, key);
      if (key !== 'workbook') return { table: key, csv: content, ...mendsIn(mends[key]) };
      return { workbook: content, mendsOf: (table: TableKey) => mends[table] };
    });
}

const mendsIn = <Mends>(mends: Mends | undefined): { mends?: Mends } => (mends === undefined ? {} : { mends });

export const downloadFindingsWorkbook = (
  { database }: Context,
  actor: Actor,
  { submissionId }: InputOf<typeof Download>,
): Promise<FileAnswer> =>
  asActor(database, actor, async (tx) => {
    const submission = await visibleSubmission(tx, actor, submissionId);
    const workbook = writeFindingsWorkbook(await filesFor(tx, actor, submission), await groupsOf(tx, submission));
    return { fileName: fileName(submission, 'xlsx'), bytes: await allOf(workbook) };
  });
