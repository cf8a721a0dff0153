/** Typed rows into the staging tables, in chunks, so that memory does not grow with the file. */
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { TypedTable } from '@cairnstep/submission-files';
import type { PoolClient } from 'pg';
import { from as copyFrom } from 'pg-copy-streams';
import type { Tx } from '../../database/as-actor.ts';
import { classOfExam } from './class-of-exam.ts';
import { tableSql } from './table-sql.ts';

type CopyValue = string | number | readonly string[] | null;

/** COPY's text format (PostgreSQL manual, COPY, "Text Format"). Codes and pseudonyms hold nothing to escape, but the format's own rules are kept. */
const escape = (text: string): string =>
  /[\\\t\n\r]/.test(text) ? text.replaceAll('\\', '\\\\').replaceAll('\t', '\\t').replaceAll('\n', '\\n').replaceAll('\r', '\\r') : text;

function copyValue(value: CopyValue): string {
  if (value === null) return '\\N';
  if (typeof value === 'number') return String(value);
  if (typeof value === 'string') return escape(value);
  return escape(`{${value.map((item) => `"${item}"`).join(',')}}`);
}

const rowsPerChunk = 2_000;

function* lines(table: TypedTable, submissionId: string, siteId: string): Generator<string> {
  const { columns } = table;
  const withClass = table.key === 'exams';
  const order = tableSql(table.key).stagedColumns;
  const byKey = new Map(columns.map((column) => [column.variable.key, column]));
  const ordered = order.flatMap((key) => byKey.get(key) ?? []);
  const prefix = `${submissionId}\t${siteId}`;
  let chunk: string[] = [];
  for (let row = 0; row < table.length; row += 1) {
    let line = prefix;
    for (const column of ordered) line += `\t${copyValue(column.cell(row))}`;
    if (withClass) for (const value of classOfExam(table, row)) line += `\t${copyValue(value)}`;
    chunk.push(`${line}\t${table.lines[row] ?? 0}\n`);
    if (chunk.length === rowsPerChunk) {
      yield chunk.join('');
      chunk = [];
    }
  }
  if (chunk.length > 0) yield chunk.join('');
}

/** COPY does not write where row-level security holds, so rows arrive in a table of the transaction's own and pass the policies from there. */
export async function stageRows(tx: Tx, table: TypedTable, submissionId: string, siteId: string): Promise<void> {
  const client = (await tx.queryRunner?.connect()) as PoolClient;
  const columns = tableSql(table.key).stagedColumns.join(', ');
  await tx.query(`create temporary table arriving on commit drop as select ${columns} from staged_${table.key} with no data`);
  await pipeline(Readable.from(lines(table, submissionId, siteId)), client.query(copyFrom(`copy arriving (${columns}) from stdin`)));
  await tx.query(`insert into staged_${table.key} (${columns}) select ${columns} from arriving`);
  await tx.query('drop table arriving');
}

export async function clearStaged(tx: Tx, tables: readonly string[], submissionId: string): Promise<void> {
  for (const table of tables) await tx.query(`delete from staged_${table} where submission_id = $1`, [submissionId]);
}
