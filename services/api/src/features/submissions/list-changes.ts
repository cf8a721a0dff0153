/** The preview, row by row: what a commit would add, change, leave or remove. */
import type { InputOf, ResponseOf, RowChange } from '@cairnstep/contract';
import type { listChanges as ListChanges } from '@cairnstep/contract';
import { tableOf } from '@cairnstep/dictionary';
import type { z } from 'zod';
import type { Actor } from '../../authority/actor.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { bind } from '../../database/bind.ts';
import { joinWholeTables } from '../../database/join-whole-tables.ts';
import { Refusal } from '../../http/refusal.ts';
import { tablesOf } from './file-key.ts';
import { visibleSubmission } from './read-submissions.ts';
import { readFiles } from './submissions.repository.ts';
import { tableSql } from './table-sql.ts';

const rowsPerPage = 50;

type Stored = Readonly<Record<string, string | number | null>>;

const asText = (value: string | number | null | undefined): string | null => (value === null || value === undefined ? null : String(value));

function presentRow(
  kind: z.output<typeof RowChange>['kind'],
  keys: readonly string[],
  values: readonly string[],
  before: Stored | null,
  after: Stored | null,
): z.output<typeof RowChange> {
  const either = after ?? before ?? {};
  const cells = values.map((column) => ({ column, before: asText(before?.[column]), after: asText(after?.[column]) }));
  return {
    kind,
    line: typeof after?.['line'] === 'number' ? after['line'] : null,
    key: Object.fromEntries(keys.map((column) => [column, asText(either[column]) ?? ''])),
    cells:
      kind === 'changed'
        ? cells.filter((cell) => cell.before !== cell.after)
        : kind === 'unchanged'
          ? []
          : cells.filter((cell) => cell.before !== null || cell.after !== null),
  };
}

export const listChanges = (
  { database }: Context,
  actor: Actor,
  { submissionId, table, kind, page }: InputOf<typeof ListChanges>,
): Promise<ResponseOf<typeof ListChanges>> =>
  asActor(database, actor, async (tx) => {
    const submission = await visibleSubmission(tx, actor, submissionId);
    const total = submission.preview?.tables.find((one) => one.table === table)?.[kind] ?? 0;
    const settled = submission.status !== 'checked';
    if (total === 0 || settled) return { items: [], page, pageSize: rowsPerPage, total: settled ? 0 : total };
    const { rowKey, variables } = tableOf(table);
    const values = variables.map((variable) => variable.key).filter((column) => !rowKey.includes(column));
    await joinWholeTables(tx);
    const rows = (await tx.query(
      ...bind(tableSql(table).list[kind], {
        submission: submissionId,
        site: submission.siteId,
        month: submission.month,
        tables: tablesOf(await readFiles(tx, submissionId)),
        limit: rowsPerPage,
        offset: (page - 1) * rowsPerPage,
      }),
    )) as { before: Stored | null; after: Stored | null }[];
    if (rows.length === 0 && total > (page - 1) * rowsPerPage) {
      throw new Refusal(
        'submission-stale',
        'What was checked has been lost in a fault of the database. Your files are still here: check again.',
      );
    }
    return { items: rows.map((row) => presentRow(kind, rowKey, values, row.before, row.after)), page, pageSize: rowsPerPage, total };
  });
