/** Typed rows into the staging tables, piece by piece, so that memory does not grow with the file. */
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { tableKeys } from '@cairnstep/dictionary';
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
async function sendRows(tx: Tx, table: TypedTable): Promise<void> {
  const { fileColumns, stagedColumns } = tableSql(table.key);
  const list = stagedColumns.join(', ');
  await tx.query(`create temporary table arriving_${table.key} on commit drop as select ${list} from staged_${table.key} with no data`);
  const rows = copyRows(table, fileColumns, { withLine: true, ...(table.key === 'exams' ? { further: classCells(table) } : {}) });
  const client = (await tx.queryRunner?.connect()) as PoolClient;
  await pipeline(Readable.from(rows), client.query(copyFrom(`copy arriving_${table.key} (${list}) from stdin`)));
}

async function stageSentRows(tx: Tx, table: TypedTable, submissionId: string, siteId: string): Promise<void> {
  const list = tableSql(table.key).stagedColumns.join(', ');
  await tx.query(`insert into staged_${table.key} (submission_id, site_id, ${list}) select $1, $2, ${list} from arriving_${table.key}`, [
    submissionId,
    siteId,
  ]);
}

export async function clearStaged(tx: Tx, submissionId: string): Promise<void> {
  for (const table of tableKeys) await tx.query(`delete from staged_${table} where submission_id = $1`, [submissionId]);
}

type Outcome = { readonly failure: { readonly error: unknown } | null };

const outcomeOf = (work: () => Promise<void>): Promise<Outcome> =>
  work().then(
    () => ({ failure: null }),
    (error: unknown) => ({ failure: { error } }),
  );

/**
 * Stages rows in place of earlier ones of the submission. Resolves when the database has them all and goes on by itself, so that this process
 * can check them meanwhile; `done` tells how it ended, and never rejects, because rows with errors may fail to be staged.
 */
export async function beginStaging(
  tx: Tx,
  tables: readonly TypedTable[],
  submissionId: string,
  siteId: string,
): Promise<{ readonly done: Promise<Outcome> }> {
  const sent = await outcomeOf(async () => {
    await clearStaged(tx, submissionId);
    for (const table of tables) await sendRows(tx, table);
  });
  if (sent.failure) return { done: Promise.resolve(sent) };
  return {
    done: outcomeOf(async () => {
      for (const table of tables) await stageSentRows(tx, table, submissionId, siteId);
    }),
  };
}
