/** The only file that knows the tables of submissions. */
import { randomUUID } from 'node:crypto';
import type { Submission, SubmissionReceipt } from '@cairnstep/contract';
import type { TableKey } from '@cairnstep/dictionary';
import type { Tx } from '../../database/as-actor.ts';
import type { FileKey } from './file-key.ts';
import { clearAllMends, clearMends } from './mends.repository.ts';

export type Status = Submission['status'];

export interface SubmissionRecord {
  readonly id: string;
  readonly siteId: string;
  readonly siteCode: string;
  readonly siteName: string;
  readonly month: string;
  readonly status: Status;
  readonly createdAt: Date;
  readonly createdBy: string;
  readonly settledAt: Date | null;
  readonly settledBy: string | null;
  readonly progress: (NonNullable<Submission['progress']> & { readonly startedAt: string }) | null;
  readonly findings: Submission['findings'];
  readonly preview: { readonly tables: NonNullable<Submission['preview']>['tables'] } | null;
  readonly previewDigest: string | null;
  readonly siteRevision: number | null;
  readonly receipt: SubmissionReceipt | null;
  /** Reasons given after an earlier check, until the next one. */
  readonly reasons: Submission['findings'] | null;
}

const columns = `m.id, m.site_id as "siteId", s.code as "siteCode", s.name as "siteName", m.month, m.status, m.created_at as "createdAt",
  coalesce(account_name(m.created_by), 'a former colleague') as "createdBy", m.settled_at as "settledAt", m.settled_by as "settledBy", m.progress, m.findings, m.preview,
  m.preview_digest as "previewDigest", m.site_revision as "siteRevision", m.receipt, m.reasons`;

export async function readSubmission(tx: Tx, id: string): Promise<SubmissionRecord | null> {
  const [row] = (await tx.query(`select ${columns} from submissions m join sites s on s.id = m.site_id where m.id = $1`, [
    id,
  ])) as SubmissionRecord[];
  return row ?? null;
}

/** Also keeps everyone else from changing this submission until the transaction ends. */
export async function lockSubmission(tx: Tx, id: string): Promise<SubmissionRecord | null> {
  const [row] = (await tx.query(`select ${columns} from submissions m join sites s on s.id = m.site_id where m.id = $1 for update of m`, [
    id,
  ])) as SubmissionRecord[];
  return row ?? null;
}

export async function findUnsettled(tx: Tx, siteId: string, month: string): Promise<string | null> {
  const [row] = (await tx.query(
    "select id from submissions where site_id = $1 and month = $2 and status in ('open', 'checking', 'checked') order by created_at desc limit 1",
    [siteId, month],
  )) as { id: string }[];
  return row?.id ?? null;
}

export async function insertSubmission(tx: Tx, siteId: string, month: string, createdBy: string): Promise<string> {
  const id = randomUUID();
  await tx.query("insert into submissions (id, site_id, month, status, created_by, findings) values ($1, $2, $3, 'open', $4, '[]')", [
    id,
    siteId,
    month,
    createdBy,
  ]);
  return id;
}

/** Back to collecting files: what an earlier check found no longer holds, but for the reasons given for it, which the next check may take over. */
export async function reopen(tx: Tx, id: string): Promise<void> {
  await clearCheck(tx, id);
  await tx.query(
    `update submissions set status = 'open', progress = null,
       reasons = case when findings = '[]' then reasons else jsonb_path_query_array(findings, '$[*] ? (@.acknowledgedReason != null)') end, findings = '[]', preview = null, preview_digest = null, site_revision = null where id = $1`,
    [id],
  );
}

export async function clearCheck(tx: Tx, id: string): Promise<void> {
  await tx.query('delete from submission_findings where submission_id = $1', [id]);
}

export const beginCheck = (tx: Tx, id: string, now: Date): Promise<unknown> =>
  tx.query("update submissions set status = 'checking', progress = $2, preview = null, preview_digest = null where id = $1", [
    id,
    { step: 'read', done: 0, of: 1, startedAt: now.toISOString() },
  ]);

export const setProgress = (tx: Tx, id: string, progress: NonNullable<SubmissionRecord['progress']>): Promise<unknown> =>
  tx.query("update submissions set progress = $2 where id = $1 and status = 'checking'", [id, progress]);

export interface CheckOutcome {
  readonly findings: Submission['findings'];
  readonly preview: SubmissionRecord['preview'];
  readonly previewDigest: string | null;
  readonly siteRevision: number | null;
}

export async function finishCheck(tx: Tx, id: string, outcome: CheckOutcome): Promise<void> {
  await tx.query(
    "update submissions set status = 'checked', progress = null, findings = $2, preview = $3, preview_digest = $4, site_revision = $5, reasons = null where id = $1",
    [id, JSON.stringify(outcome.findings), outcome.preview, outcome.previewDigest, outcome.siteRevision],
  );
}

export const setFindingGroups = (tx: Tx, id: string, findings: Submission['findings']): Promise<unknown> =>
  tx.query('update submissions set findings = $2 where id = $1', [id, JSON.stringify(findings)]);

export async function settle(
  tx: Tx,
  id: string,
  status: 'accepted' | 'discarded',
  by: string,
  receipt: SubmissionReceipt | null,
): Promise<void> {
  await tx.query(
    'update submissions set status = $2, settled_at = now(), settled_by = $3, receipt = $4, progress = null, reasons = null where id = $1',
    [id, status, by, receipt],
  );
  await tx.query('update submission_files set content = null where submission_id = $1', [id]);
  await clearAllMends(tx, id);
}

/** The month's earlier accepted submission makes way; its receipt stays readable. */
export const supersedeEarlier = (tx: Tx, id: string, siteId: string, month: string): Promise<unknown> =>
  tx.query("update submissions set status = 'superseded' where site_id = $1 and month = $2 and status = 'accepted' and id <> $3", [
    siteId,
    month,
    id,
  ]);

export interface FileRecord {
  readonly key: FileKey;
  /** What it has rows of; of a workbook known after the check. */
  readonly tables: readonly TableKey[] | null;
  readonly fileName: string;
  readonly bytes: number;
  readonly sha256: string;
  readonly addedAt: Date;
  readonly rows: number | null;
  readonly mended: number;
  readonly mendsDigest: string | null;
  readonly refused: boolean;
}

export async function readFiles(tx: Tx, id: string): Promise<FileRecord[]> {
  return (await tx.query(
    `select table_key as key, tables, file_name as "fileName", bytes, sha256, added_at as "addedAt", rows, refused, mended, mends_digest as "mendsDigest"
       from submission_files where submission_id = $1 order by table_key`,
    [id],
  )) as FileRecord[];
}

export async function putFile(
  tx: Tx,
  id: string,
  siteId: string,
  file: { table: FileKey; fileName: string; sha256: string; content: Buffer; bytes?: number },
): Promise<void> {
  const tables = file.table === 'workbook' ? null : [file.table];
  await tx.query(
    `insert into submission_files (submission_id, table_key, site_id, file_name, bytes, sha256, content, tables) values ($1, $2, $3, $4, $5, $6, $7, $8)
     on conflict (submission_id, table_key) do update
       set file_name = excluded.file_name, bytes = excluded.bytes, sha256 = excluded.sha256, content = excluded.content, tables = excluded.tables,
           added_at = now(), rows = null, refused = false`,
    [id, file.table, siteId, file.fileName, file.bytes ?? file.content.length, file.sha256, file.content, tables],
  );
  await clearMends(tx, id, file.table);
}

export async function removeFile(tx: Tx, id: string, file: FileKey): Promise<void> {
  await clearMends(tx, id, file);
  await tx.query('delete from submission_files where submission_id = $1 and table_key = $2', [id, file]);
}

export const setFileRows = (tx: Tx, id: string, file: FileKey, tables: ReadonlyMap<TableKey, number>): Promise<unknown> =>
  tx.query('update submission_files set rows = $3, tables = $4 where submission_id = $1 and table_key = $2', [
    id,
    file,
    [...tables.values()].reduce((sum, rows) => sum + rows, 0),
    [...tables.keys()],
  ]);

/** Nothing of such a file stays but that it was there. */
export async function refuseFile(tx: Tx, id: string, file: FileKey): Promise<void> {
  await clearMends(tx, id, file);
  await tx.query('update submission_files set content = null, rows = null, refused = true where submission_id = $1 and table_key = $2', [
    id,
    file,
  ]);
}

export interface SubmissionLine {
  readonly id: string;
  readonly month: string;
  readonly status: Status;
  readonly createdAt: Date;
  readonly createdBy: string;
  readonly settledAt: Date | null;
  readonly rows: number | null;
}

export async function listSubmissions(
  tx: Tx,
  siteId: string,
  limit: number,
  offset: number,
): Promise<{ items: SubmissionLine[]; total: number }> {
  const [{ total }] = (await tx.query('select count(*)::int as total from submissions where site_id = $1', [siteId])) as [
    { total: number },
  ];
  const items = (await tx.query(
    `select m.id, m.month, m.status, m.created_at as "createdAt", coalesce(account_name(m.created_by), 'a former colleague') as "createdBy",
            m.settled_at as "settledAt", (select sum(f.rows)::int from submission_files f where f.submission_id = m.id) as rows
       from submissions m where m.site_id = $1 order by m.created_at desc, m.id limit $2 offset $3`,
    [siteId, limit, offset],
  )) as SubmissionLine[];
  return { items, total };
}

export interface FindingRecord {
  readonly id: number;
  readonly rule: string;
  readonly severity: 'error' | 'warning';
  readonly table: TableKey | null;
  readonly line: number | null;
  readonly column: string | null;
  readonly found: string;
  readonly mend: string;
}

export async function listFindings(
  tx: Tx,
  id: string,
  filter: { rule?: string | undefined; table?: string | undefined; severity?: string | undefined },
  limit: number,
  offset: number,
): Promise<{ items: FindingRecord[]; total: number }> {
  const where = `submission_id = $1 and ($2::text is null or rule = $2) and ($3::text is null or table_key = $3) and ($4::text is null or severity = $4)`;
  const parameters = [id, filter.rule ?? null, filter.table ?? null, filter.severity ?? null];
  const [{ total }] = (await tx.query(`select count(*)::int as total from submission_findings where ${where}`, parameters)) as [
    { total: number },
  ];
  const items = (await tx.query(
    `select ordinal as id, rule, severity, table_key as "table", line, column_key as "column", found, mend
       from submission_findings where ${where} order by ordinal limit $5 offset $6`,
    [...parameters, limit, offset],
  )) as FindingRecord[];
  return { items, total };
}
