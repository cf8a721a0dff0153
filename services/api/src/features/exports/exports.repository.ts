/** The only file that knows the tables of exports, and what a build reads of the registry. */
import { randomUUID } from 'node:crypto';
import type { Tx } from '../../database/as-actor.ts';
import { codeToday } from '../participant-codes/replaced-codes.repository.ts';

export interface ExportRecord {
  readonly id: string;
  readonly number: string;
  readonly requestId: string;
  readonly requestTitle: string;
  readonly status: 'building' | 'ready' | 'failed' | 'stale';
  readonly builtAt: Date | null;
  readonly participants: number | null;
  readonly bytes: number | null;
  readonly sha256: string | null;
  readonly accessEndsOn: string;
}

const columns = `e.id, e.number, e.request_id as "requestId", r.form->>'title' as "requestTitle", e.status, e.built_at as "builtAt", e.participants,
  octet_length(e.content) as bytes, e.sha256, coalesce(r.access_ends_on, e.created_at::date)::text as "accessEndsOn"`;

export async function readExport(tx: Tx, id: string): Promise<ExportRecord | null> {
  const [row] = (await tx.query(`select ${columns} from exports e join access_requests r on r.id = e.request_id where e.id = $1`, [
    id,
  ])) as ExportRecord[];
  return row ?? null;
}

/** Only those of the actor's own teams: a steward sees that exports exist in the request, not here. */
export const listTeamExports = async (tx: Tx): Promise<ExportRecord[]> =>
  (await tx.query(
    `select ${columns} from exports e join access_requests r on r.id = e.request_id where actor_is_member(e.request_id) order by e.created_at desc`,
  )) as ExportRecord[];

export async function findBuilding(tx: Tx, requestId: string): Promise<string | null> {
  const [row] = (await tx.query("select id from exports where request_id = $1 and status = 'building'", [requestId])) as { id: string }[];
  return row?.id ?? null;
}

export async function insertExport(tx: Tx, requestId: string, requestedBy: string, year: number): Promise<string> {
  await tx.query("select pg_advisory_xact_lock(hashtext('export-number'))");
  const [{ next }] = (await tx.query('select next_export_number($1) as next', [`EX-${year}-`])) as [{ next: string }];
  const id = randomUUID();
  await tx.query("insert into exports (id, number, request_id, requested_by, status) values ($1, $2, $3, $4, 'building')", [
    id,
    next,
    requestId,
    requestedBy,
  ]);
  return id;
}

export const setExportStatus = (tx: Tx, id: string, status: ExportRecord['status']): Promise<unknown> =>
  tx.query('update exports set status = $2 where id = $1', [id, status]);

export async function storeExport(tx: Tx, id: string, built: { content: Buffer; sha256: string; participants: number }): Promise<void> {
  await tx.query("update exports set status = 'ready', built_at = now(), content = $2, sha256 = $3, participants = $4 where id = $1", [
    id,
    built.content,
    built.sha256,
    built.participants,
  ]);
}

export async function readExportContent(tx: Tx, id: string): Promise<Buffer | null> {
  const [row] = (await tx.query('select content from exports where id = $1', [id])) as { content: Buffer | null }[];
  return row?.content ?? null;
}

export async function replacePseudonyms(
  tx: Tx,
  exportId: string,
  people: readonly { pseudonym: string; siteId: string; participant: string }[],
): Promise<void> {
  await tx.query('delete from export_pseudonyms where export_id = $1', [exportId]);
  await tx.query(
    'insert into export_pseudonyms (export_id, pseudonym, site_id, participant) select $1, * from unnest($2::text[], $3::uuid[], $4::text[])',
    [exportId, people.map((one) => one.pseudonym), people.map((one) => one.siteId), people.map((one) => one.participant)],
  );
}

/** People of an export whose newest consent is no longer the one in force. */
export async function countNoLongerConsenting(tx: Tx, exportId: string): Promise<number> {
  const [{ count }] = (await tx.query(
    `select count(*)::int as count from export_pseudonyms x where x.export_id = $1 and not exists (
       select from (select distinct on (site_id, participant) site_id, participant, status from consents c
                     where c.site_id = x.site_id and c.participant = ${codeToday('x.site_id', 'x.participant')} order by site_id, participant, consent_no desc) newest where newest.status = 'active')`,
    [exportId],
  )) as [{ count: number }];
  return count;
}

export interface CohortPerson {
  readonly siteId: string;
  readonly participant: string;
  readonly levelGroup: string;
  readonly ais: string;
  readonly age: number | null;
  readonly sex: string | null;
}

/** First courses of a release in the chosen cells; all of them when none is chosen. */
export async function readCohort(
  tx: Tx,
  release: number,
  cells: readonly { levelGroup: string; grade: string }[],
): Promise<CohortPerson[]> {
  return (await tx.query(
    `select site_id as "siteId", participant, level_group as "levelGroup", ais, age, sex from release_courses
      where release_number = $1 and course_no = 1 and (cardinality($2::text[]) = 0 or level_group || ' ' || ais = any($2::text[])) order by site_id, participant`,
    [release, cells.map((cell) => `${cell.levelGroup} ${cell.grade}`)],
  )) as CohortPerson[];
}

/** The newest consent row of each person, as stored. People are named as a release names them, whatever code they have had since. */
export async function readNewestConsents(
  tx: Tx,
  people: readonly { siteId: string; participant: string }[],
): Promise<Map<string, Record<string, string | number | null>>> {
  const rows = (await tx.query(
    `select distinct on (p.site_id, p.participant) p.site_id, p.participant, to_jsonb(c) as row
       from unnest($1::uuid[], $2::text[]) as p(site_id, participant)
       join consents c on c.site_id = p.site_id and c.participant = ${codeToday('p.site_id', 'p.participant')}
      order by p.site_id, p.participant, c.consent_no desc`,
    [people.map((one) => one.siteId), people.map((one) => one.participant)],
  )) as { site_id: string; participant: string; row: Record<string, string | number | null> }[];
  return new Map(rows.map(({ site_id: siteId, participant, row }) => [`${siteId} ${participant}`, row]));
}

type Row = Record<string, string | number | null>;

const ofPeople = `join unnest($2::uuid[], $3::text[]) as p(site_id, participant) using (site_id, participant) where t.release_number = $1 and t.course_no = 1`;

export const readOutcomeRows = async (tx: Tx, release: number, people: readonly CohortPerson[]): Promise<Row[]> =>
  (await tx.query(
    `select t.site_id, t.participant, t.measure, t.in_device, t.baseline_status, t.baseline_value, t.end_status, t.end_value from release_outcomes t ${ofPeople} order by t.measure, t.in_device`,
    [release, people.map((one) => one.siteId), people.map((one) => one.participant)],
  )) as Row[];

export const readSessionRows = async (tx: Tx, release: number, people: readonly CohortPerson[]): Promise<Row[]> =>
  (await tx.query(
    `select t.site_id, t.participant, t.session_ordinal, t.four_week_block, t.status, t.device_class, t.bouts, t.walking_min, t.distance_m, t.steps
       from release_sessions t ${ofPeople} order by t.session_ordinal`,
    [release, people.map((one) => one.siteId), people.map((one) => one.participant)],
  )) as Row[];
