/** Typed rows into the staging tables, piece by piece, so that memory does not grow with the file. */
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { copyRows, type TypedTable } from '@cairnstep/submission-files';
import type { PoolClient } from 'pg';
import { from as copyFrom } from 'pg-copy-streams';
import type { Tx } from '../../database/as-actor.ts';
import { classOfExam } from './class-of-exam.ts';
import { tableSql } from './table-sql.ts';

/** An array as PostgreSQL reads it from text; levels and grades hold nothing to escape. */
const arrayText = (values: readonly string[]): string => `{${values.map((value) => `"${value}"`).join(',')}}`;

const classCells =
  (exams: TypedTable) =>
  (row: number): (string | null)[] =>
    classOfExam(exams, row).map((value) => (value === null ? null : typeof value === 'object' ? arrayText(value) : String(value)));

/** COPY does not write where row-level security holds, so rows arrive in a table of the transaction's own and pass the policies from there. */
export async function stageRows(tx: Tx, table: TypedTable, submissionId: string, siteId: string): Promise<void> {
  const { fileColumns, stagedColumns } = tableSql(table.key);
  const list = stagedColumns.join(', ');
  await tx.query(`create temporary table arriving on commit drop as select ${list} from staged_${table.key} with no data`);
  const rows = copyRows(table, fileColumns, { withLine: true, ...(table.key === 'exams' ? { further: classCells(table) } : {}) });
  const client = (await tx.queryRunner?.connect()) as PoolClient;
  await pipeline(Readable.from(rows), client.query(copyFrom(`copy arriving (${list}) from stdin`)));
  await tx.query(`insert into staged_${table.key} (submission_id, site_id, ${list}) select $1, $2, ${list} from arriving`, [
    submissionId,
    siteId,
  ]);
  await tx.query('drop table arriving');
}

export async function clearStaged(tx: Tx, tables: readonly string[], submissionId: string): Promise<void> {
  for (const table of tables) await tx.query(`delete from staged_${table} where submission_id = $1`, [submissionId]);
}
