/** Cells typed in place of those in the files of a submission. They go with their file, and when the submission is settled. */
import { createHash } from 'node:crypto';
import type { TableKey } from '@cairnstep/dictionary';
import type { Mends } from '@cairnstep/submission-files';
import { canonicalJson } from '../../audit/canonical-json.ts';
import type { Tx } from '../../database/as-actor.ts';
import type { FileKey } from './file-key.ts';

export interface Mend {
  readonly table: TableKey;
  readonly line: number;
  readonly column: string;
  readonly value: string;
}

export async function putMends(tx: Tx, submissionId: string, siteId: string, mends: readonly Mend[]): Promise<void> {
  await tx.query(
    `insert into submission_mends (submission_id, site_id, table_key, line, column_key, value)
     select $1, $2, * from unnest($3::text[], $4::int[], $5::text[], $6::text[])
     on conflict (submission_id, table_key, line, column_key) do update set value = excluded.value`,
    [
      submissionId,
      siteId,
      mends.map(({ table }) => table),
      mends.map(({ line }) => line),
      mends.map(({ column }) => column),
      mends.map(({ value }) => value),
    ],
  );
}

export const countMends = async (tx: Tx, submissionId: string): Promise<number> =>
  ((await tx.query('select count(*)::int as n from submission_mends where submission_id = $1', [submissionId])) as [{ n: number }])[0].n;

const readAll = async (tx: Tx, submissionId: string): Promise<Mend[]> =>
  (await tx.query(
    `select table_key as "table", line, column_key as "column", value from submission_mends where submission_id = $1
      order by table_key, line, column_key`,
    [submissionId],
  )) as Mend[];

export type MendsByTable = Readonly<Partial<Record<TableKey, Mends>>>;

export async function readMends(tx: Tx, submissionId: string): Promise<MendsByTable> {
  const tables: Partial<Record<TableKey, Map<number, Map<string, string>>>> = {};
  for (const { table, line, column, value } of await readAll(tx, submissionId)) {
    const lines = (tables[table] ??= new Map());
    const cells = lines.get(line) ?? new Map<string, string>();
    lines.set(line, cells.set(column, value));
  }
  return tables;
}

/** Tables without a CSV file of their own are the workbook's. */
const ofFile = `submission_id = $1 and case when $2 = 'workbook' then table_key not in (select table_key from submission_files where submission_id = $1)
  else table_key = $2 end`;

/** To be called after the file itself has changed, so that a later file is not read with what was typed for an earlier one. */
export async function clearMends(tx: Tx, submissionId: string, file: FileKey): Promise<void> {
  await tx.query(`delete from submission_mends where ${ofFile}`, [submissionId, file]);
  await tx.query('update submission_files set mended = 0, mends_digest = null where submission_id = $1 and table_key = $2', [
    submissionId,
    file,
  ]);
}

export const clearAllMends = (tx: Tx, submissionId: string): Promise<unknown> =>
  tx.query('delete from submission_mends where submission_id = $1', [submissionId]);

/** Binds what a preview shows to the mended cells as well as to the files. */
export async function setMendsDigest(tx: Tx, submissionId: string, file: FileKey): Promise<void> {
  const mends = (await tx.query(
    `select table_key as "table", line, column_key as "column", value from submission_mends where ${ofFile} order by table_key, line, column_key`,
    [submissionId, file],
  )) as Mend[];
  const digest =
    mends.length === 0
      ? null
      : createHash('sha256')
          .update(canonicalJson(mends.map((mend) => ({ ...mend }))))
          .digest('hex');
  await tx.query('update submission_files set mended = $3, mends_digest = $4 where submission_id = $1 and table_key = $2', [
    submissionId,
    file,
    mends.length,
    digest,
  ]);
}
