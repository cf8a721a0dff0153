/** Brings a checked submission into the registry: set-based, inside the caller's transaction, all or nothing. */
import type { TableChange } from '@cairnstep/contract';
import { tableKeys, type TableKey } from '@cairnstep/dictionary';
import type { QueryResult } from 'typeorm';
import type { z } from 'zod';
import type { Tx } from '../../database/as-actor.ts';
import { bind } from '../../database/bind.ts';
import { joinWholeTables } from '../../database/join-whole-tables.ts';
import { Refusal } from '../../http/refusal.ts';
import { clearFacts, courseFacts, outcomeFacts } from './facts-sql.ts';
import { tableSql } from './table-sql.ts';

export interface Applied {
  readonly submission: string;
  readonly site: string;
  readonly month: string;
  readonly tables: readonly TableKey[];
}

export const checkAgain = 'Nothing was committed. Check again to see a fresh preview; your files are still here.';

/** Runs a statement and says how many rows it wrote. */
async function countRows(tx: Tx, sql: string, values: Readonly<Record<string, unknown>>): Promise<number> {
  const result = (await tx.queryRunner?.query(...bind(sql, values), true)) as QueryResult;
  return result.affected ?? 0;
}

const run = (tx: Tx, sql: string, values: Readonly<Record<string, unknown>>): Promise<unknown> => tx.query(...bind(sql, values));

/** What a commit would do to each table, as the registry stands in this transaction. */
export async function countChanges(tx: Tx, of: Applied): Promise<z.output<typeof TableChange>[]> {
  await joinWholeTables(tx);
  const changes: z.output<typeof TableChange>[] = [];
  // Bouts go with their sessions, so they are looked at whenever sessions came.
  for (const table of tableKeys.filter((key) => of.tables.includes(key) || (key === 'bouts' && of.tables.includes('sessions')))) {
    const [counts] = (await run(tx, tableSql(table).counts, { ...of })) as [
      { staged: number; known: number; changed: number; removed: number },
    ];
    const change = {
      table,
      added: counts.staged - counts.known,
      changed: counts.changed,
      unchanged: counts.known - counts.changed,
      removed: counts.removed,
    };
    if (of.tables.includes(table) || change.removed > 0) changes.push(change);
  }
  return changes;
}

/** Bouts before sessions when rows go, so that a bout still finds the session it goes with. */
const order: readonly TableKey[] = ['participants', 'consents', 'exams', 'assessments', 'bouts', 'sessions', 'adverse_events'];

/**
 * Does what the preview counted, to the row; the caller has made sure that it still holds.
 *
 * Staged rows are not kept through a crash of the database. Were they gone, a table of the month would look as if its file were empty.
 *
 * @throws Refusal when it would do anything else
 */
export async function applyChanges(tx: Tx, of: Applied, preview: readonly z.output<typeof TableChange>[]): Promise<void> {
  await joinWholeTables(tx);
  for (const table of order) {
    const change = preview.find((one) => one.table === table);
    if (!change) continue;
    const { apply } = tableSql(table);
    for (const kind of ['removed', 'changed', 'added'] as const) {
      if (change[kind] === 0) continue;
      for (const statement of apply[kind]) {
        if ((await countRows(tx, statement, { ...of })) !== change[kind]) throw new Refusal('submission-stale', checkAgain);
      }
    }
  }
  const people = await touchedPeople(tx, of);
  if (people.length > 0) await refreshFacts(tx, of.site, people);
}

async function touchedPeople(tx: Tx, { submission, tables }: Applied): Promise<string[]> {
  const staged = tables.map((table) => `select distinct participant from staged_${table} where submission_id = :submission`);
  const rows = (await run(
    tx,
    `${staged.join(' union ')} union select row_key->>'participant' from row_history where submission_id = :submission`,
    { submission },
  )) as {
    participant: string;
  }[];
  return rows.map((row) => row.participant);
}

export async function refreshFacts(tx: Tx, site: string, people: readonly string[]): Promise<void> {
  for (const statement of [...clearFacts, courseFacts, outcomeFacts]) await run(tx, statement, { site, people });
}
