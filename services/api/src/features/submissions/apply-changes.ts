/** Brings a checked submission into the registry: set-based, inside the caller's transaction, all or nothing. */
import type { TableChange } from '@cairnstep/contract';
import { tableKeys, type TableKey } from '@cairnstep/dictionary';
import type { z } from 'zod';
import type { Tx } from '../../database/as-actor.ts';
import { bind } from '../../database/bind.ts';
import { clearFacts, courseFacts, outcomeFacts } from './facts-sql.ts';
import { tableSql } from './table-sql.ts';

export interface Applied {
  readonly submission: string;
  readonly site: string;
  readonly month: string;
  readonly tables: readonly TableKey[];
}

const run = (tx: Tx, sql: string, values: Readonly<Record<string, unknown>>): Promise<unknown> => tx.query(...bind(sql, values));

/** What a commit would do to each table, as the registry stands in this transaction. */
export async function countChanges(tx: Tx, of: Applied): Promise<z.output<typeof TableChange>[]> {
  const changes: z.output<typeof TableChange>[] = [];
  for (const table of tableKeys) {
    const [counts] = (await run(tx, tableSql(table).counts, { ...of })) as [{ staged: number; known: number; changed: number; removed: number }];
    const change = { table, added: counts.staged - counts.known, changed: counts.changed, unchanged: counts.known - counts.changed, removed: counts.removed };
    if (of.tables.includes(table) || change.removed > 0) changes.push(change);
  }
  return changes;
}

/** Bouts before sessions when rows go, so that a bout still finds the session it goes with. */
const order: readonly TableKey[] = ['participants', 'consents', 'exams', 'assessments', 'bouts', 'sessions', 'adverse_events'];

export async function applyChanges(tx: Tx, of: Applied): Promise<void> {
  for (const table of order) {
    for (const statement of tableSql(table).apply) await run(tx, statement, { ...of });
  }
  const people = await touchedPeople(tx, of.submission);
  if (people.length > 0) await refreshFacts(tx, of.site, people);
}

async function touchedPeople(tx: Tx, submission: string): Promise<string[]> {
  const staged = tableKeys.map((table) => `select participant from staged_${table} where submission_id = :submission`);
  const rows = (await run(tx, `${staged.join(' union ')} union select row_key->>'participant' from row_history where submission_id = :submission`, { submission })) as {
    participant: string;
  }[];
  return rows.map((row) => row.participant);
}

export async function refreshFacts(tx: Tx, site: string, people: readonly string[]): Promise<void> {
  for (const statement of [...clearFacts, courseFacts, outcomeFacts]) await run(tx, statement, { site, people });
}
