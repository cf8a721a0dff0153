/** Everything that a commit writes, counted past row-level security: all of it is there or nothing. */
import type { Client } from 'pg';
import { tableKeys, type TableKey } from '../../packages/dictionary/src/index.ts';
import { verifyChain, type ChainVerdict } from '../../services/api/src/audit/chain.ts';

export type RowCounts = Partial<Readonly<Record<TableKey, number>>>;

export interface CommitState {
  readonly status: string;
  readonly hasReceipt: boolean;
  /** Commits that the site counts. */
  readonly revision: number;
  readonly rows: Readonly<Record<TableKey, number>>;
  readonly courses: number;
  readonly filesEmptied: boolean;
  readonly mails: number;
  readonly mailJobs: number;
  readonly auditEntries: number;
}

export async function readCommitState(owner: Client, submissionId: string): Promise<CommitState> {
  // The process that served the killed one may still hold the submission: waits until it has let go.
  await owner.query('select from submissions where id = $1 for update', [submissionId]);
  const rows = tableKeys.map((table) => `'${table}', (select count(*) from ${table} where submission_id = m.id)`).join(', ');
  const { rows: found } = await owner.query<CommitState>(
    `select m.status, m.receipt is not null as "hasReceipt", s.revision, json_build_object(${rows}) as rows,
       (select count(*)::int from course_facts f where f.site_id = m.site_id) as courses,
       (select bool_and(f.content is null) from submission_files f where f.submission_id = m.id) as "filesEmptied",
       (select count(*)::int from mail_messages where event like 'submission-accepted:' || m.id || ':%') as mails,
       (select count(*)::int from pgboss.job j join mail_messages l on j.data->>'mailId' = l.id::text
         where l.event like 'submission-accepted:' || m.id || ':%') as "mailJobs",
       (select count(*)::int from audit_entries where act = 'submission.commit' and object = m.id::text) as "auditEntries"
     from submissions m join sites s on s.id = m.site_id where m.id = $1`,
    [submissionId],
  );
  const [state] = found;
  if (!state) throw new Error(`There is no submission ${submissionId}.`);
  return state;
}

const everyTable = (counts: RowCounts): CommitState['rows'] =>
  Object.fromEntries(tableKeys.map((table) => [table, counts[table] ?? 0])) as CommitState['rows'];

/** Before a site's first commit. */
export const nothing: CommitState = {
  status: 'checked',
  hasReceipt: false,
  revision: 0,
  rows: everyTable({}),
  courses: 0,
  filesEmptied: false,
  mails: 0,
  mailJobs: 0,
  auditEntries: 0,
};

/** After it, exactly once. */
export const everything = (rows: RowCounts): CommitState => ({
  status: 'accepted',
  hasReceipt: true,
  revision: 1,
  rows: everyTable(rows),
  courses: rows.participants ?? 0,
  filesEmptied: true,
  mails: 1,
  mailJobs: 1,
  auditEntries: 1,
});

export async function readChain(owner: Client): Promise<ChainVerdict> {
  const { rows } = await owner.query<{ seq: string; event: string; prev: string; hash: string }>(
    'select seq, event, prev, hash from audit_entries order by seq',
  );
  return verifyChain(rows.map((row) => ({ ...row, seq: Number(row.seq) })));
}
