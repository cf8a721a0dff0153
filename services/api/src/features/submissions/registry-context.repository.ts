/** What the registry already holds of the people in a submission, as the checks need it. */
import { tableOf, type Row, type TableKey } from '@cairnstep/dictionary';
import { tableFromRows, type RegistryContext, type TypedTable, type TypedTables } from '@cairnstep/submission-files';
import type { Tx } from '../../database/as-actor.ts';
import { readReplacedCodes } from '../participant-codes/replaced-codes.repository.ts';
import { monthTables } from './table-sql.ts';

type StoredRow = Readonly<Record<string, string | number | null>>;
const withoutNulls = (row: StoredRow): Row =>
  Object.fromEntries(Object.entries(row).filter((entry): entry is [string, string | number] => entry[1] !== null));

async function readHeld(
  tx: Tx,
  key: TableKey,
  siteId: string,
  month: string,
  people: readonly string[],
  only: string | null,
): Promise<TypedTable | null> {
  const columns = tableOf(key).variables.map((variable) => variable.key);
  const rows = (await tx.query(
    `select ${columns.map((column) => `t.${column}`).join(', ')} from ${key} t
      where t.site_id = $1 and t.month <> $2 and t.participant = any($3::text[])${only === null ? '' : ` and ${only}`}`,
    [siteId, month, people],
  )) as StoredRow[];
  return rows.length === 0 ? null : tableFromRows(key, rows.map(withoutNulls));
}

/** Bouts are needed only of sessions that occur in the files. */
const ofStagedSessions = (sessions: TypedTable | undefined): string[] => {
  if (!sessions) return [];
  const [participant, day, number] = ['participant', 'session_day', 'session_no'].map((key) => sessions.column(key));
  return Array.from({ length: sessions.length }, (_, row) => `${participant?.cell(row)}|${day?.cell(row)}|${number?.cell(row)}`);
};

export async function loadRegistryContext(
  tx: Tx,
  siteId: string,
  month: string,
  tables: TypedTables,
  year: number,
): Promise<RegistryContext> {
  const people = new Set<string>();
  for (const table of Object.values(tables)) {
    const column = table.column('participant');
    for (let row = 0; row < table.length; row += 1) {
      const code = column.word(row);
      if (code !== null) people.add(code);
    }
  }
  const codes = [...people];
  // Only a table that came with a file is replaced; people and consents stay in any case.
  const replacedMonth = (key: TableKey): string => (tables[key] && monthTables.includes(key) ? month : '');
  const held: Partial<Record<TableKey, TypedTable>> = {};
  for (const key of ['participants', 'consents', 'exams', 'assessments', 'sessions', 'adverse_events'] as const) {
    const table = await readHeld(tx, key, siteId, replacedMonth(key), codes, null);
    if (table) held[key] = table;
  }
  const sessions = ofStagedSessions(tables.sessions);
  if (sessions.length > 0) {
    await tx.query('create temporary table if not exists checked_sessions (key text primary key) on commit drop');
    await tx.query('insert into checked_sessions select distinct unnest($1::text[])', [sessions]);
    const bouts = await readHeld(
      tx,
      'bouts',
      siteId,
      replacedMonth('bouts'),
      codes,
      `(t.participant || '|' || t.session_day || '|' || t.session_no) in (select key from checked_sessions)`,
    );
    if (bouts) held.bouts = bouts;
  }
  const others = await readOthers(tx, siteId, codes);
  const withdrawn = (await tx.query(
    `select participant from (select distinct on (participant) participant, status, withdrawal_scope from consents where site_id = $1 order by participant, consent_no desc) c
      where status = 'withdrawn'`,
    [siteId],
  )) as { participant: string }[];
  return {
    held,
    ...(others ? { otherParticipants: others } : {}),
    withdrawn: new Set(withdrawn.map((row) => row.participant)),
    replaced: await readReplacedCodes(tx, siteId),
    year,
  };
}

async function readOthers(tx: Tx, siteId: string, codes: readonly string[]): Promise<TypedTable | null> {
  const columns = tableOf('participants').variables.map((variable) => variable.key);
  const rows = (await tx.query(`select ${columns.join(', ')} from participants where site_id = $1 and not participant = any($2::text[])`, [
    siteId,
    codes,
  ])) as StoredRow[];
  return rows.length === 0 ? null : tableFromRows('participants', rows.map(withoutNulls));
}
