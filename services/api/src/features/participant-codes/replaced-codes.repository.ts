/** Codes replaced in every table of the registry that holds a site's people, by statements over whole tables. */
import { tableKeys, tableOf, type TableKey } from '@cairnstep/dictionary';
import type { Tx } from '../../database/as-actor.ts';
import type { ReplacedCode } from './clear-pairs.ts';

/** The pairs as a table of this transaction, so that the statements below can join it. */
export async function stagePairs(tx: Tx, codes: readonly ReplacedCode[]): Promise<void> {
  await tx.query('create temporary table code_pairs (from_code text primary key, to_code text not null) on commit drop');
  await tx.query('insert into code_pairs select * from unnest($1::text[], $2::text[])', [
    codes.map((pair) => pair.from),
    codes.map((pair) => pair.to),
  ]);
}

const anyRowOf = (code: string): string =>
  tableKeys.map((table) => `exists (select from ${table} r where r.site_id = $1 and r.participant = ${code})`).join(' or ');

export interface Found {
  /** Old codes that the registry holds rows of. */
  readonly known: string[];
  /** New codes that two or more old ones become, or that had rows before. */
  readonly joining: string[];
}

export async function findCodes(tx: Tx, siteId: string): Promise<Found> {
  const known = (await tx.query(`select p.from_code as code from code_pairs p where ${anyRowOf('p.from_code')}`, [siteId])) as {
    code: string;
  }[];
  const joining = (await tx.query(
    `select p.to_code as code from code_pairs p where p.from_code = any($2::text[]) group by p.to_code having count(*) > 1 or ${anyRowOf('p.to_code')}`,
    [siteId, known.map((row) => row.code)],
  )) as { code: string }[];
  return { known: known.map((row) => row.code), joining: joining.map((row) => row.code) };
}

/** Rows (alias r) of people who are joined, with the key they will have, and all that they say beside whose they are and when they came. */
const joiningRows = (table: TableKey): string => {
  const keys = tableOf(table).rowKey.filter((key) => key !== 'participant');
  return `select r.ctid as place, coalesce(p.to_code, r.participant) as participant, p.from_code is null as stays, r.participant as had,
            ${keys.map((key) => `r.${key}, `).join('')}to_jsonb(r) - array['participant', 'month', 'submission_id'] as says
       from ${table} r left join code_pairs p on p.from_code = r.participant
      where r.site_id = $1 and (p.to_code = any($2::text[]) or r.participant = any($2::text[]))`;
};
const keyList = (table: TableKey): string => tableOf(table).rowKey.join(', ');

/** How many keys would be held by rows that do not say the same. */
export async function countCollisions(tx: Tx, table: TableKey, siteId: string, joining: readonly string[]): Promise<number> {
  const [{ count }] = (await tx.query(
    `select count(*)::int as count from (
       select from (${joiningRows(table)}) j group by ${keyList(table)} having count(*) > 1 and count(distinct says) > 1) collisions`,
    [siteId, joining],
  )) as [{ count: number }];
  return count;
}

/** Of rows that say the same, one stays: the one that has the new code already, else that of the code that sorts first. */
export async function dropEqualRows(tx: Tx, table: TableKey, siteId: string, joining: readonly string[]): Promise<void> {
  await tx.query(
    `delete from ${table} r using (
       select place, row_number() over (partition by ${keyList(table)} order by stays desc, had) as turn from (${joiningRows(table)}) j) d
      where d.turn > 1 and r.ctid = d.place and r.site_id = $1`,
    [siteId, joining],
  );
}

/** How many rows carry a new code now. */
export async function replaceIn(tx: Tx, table: TableKey, siteId: string): Promise<number> {
  const [, count] = (await tx.query(
    `update ${table} r set participant = p.to_code from code_pairs p where r.site_id = $1 and r.participant = p.from_code`,
    [siteId],
  )) as [unknown, number];
  return count;
}

/** How many earlier values are now found under a new code. */
export async function replaceInHistory(tx: Tx, siteId: string, codes: readonly ReplacedCode[]): Promise<number> {
  const [{ changed }] = (await tx.query('select replace_codes_in_history($1, $2, $3)::int as changed', [
    siteId,
    codes.map((pair) => pair.from),
    codes.map((pair) => pair.to),
  ])) as [{ changed: number }];
  return changed;
}

/** Keeps for every code ever replaced the one in use today, in one step whatever came in between; a code that is in use again is no replaced one. */
export async function keepReplaced(tx: Tx, siteId: string, by: string, at: Date): Promise<void> {
  await tx.query('update replaced_codes x set to_code = p.to_code from code_pairs p where x.site_id = $1 and x.to_code = p.from_code', [
    siteId,
  ]);
  await tx.query('delete from replaced_codes x where x.site_id = $1 and x.from_code in (select to_code from code_pairs)', [siteId]);
  await tx.query(
    `insert into replaced_codes (site_id, from_code, to_code, replaced_by, replaced_at) select $1, from_code, to_code, $2, $3 from code_pairs
     on conflict (site_id, from_code) do update set to_code = excluded.to_code, replaced_by = excluded.replaced_by, replaced_at = excluded.replaced_at`,
    [siteId, by, at],
  );
}

export async function readReplacedCodes(tx: Tx, siteId: string): Promise<ReadonlySet<string>> {
  const rows = (await tx.query('select from_code from replaced_codes where site_id = $1', [siteId])) as { from_code: string }[];
  return new Set(rows.map((row) => row.from_code));
}

/** Submissions of the site whose files are being checked. */
export async function submissionsInCheck(tx: Tx, siteId: string): Promise<string[]> {
  const rows = (await tx.query("select id from submissions where site_id = $1 and status = 'checking' for update", [siteId])) as {
    id: string;
  }[];
  return rows.map((row) => row.id);
}

/** SQL of the code that a person has today: of two expressions, the site and the code the person had. Neither may use the alias `today`. */
export const codeToday = (siteId: string, code: string): string =>
  `coalesce((select today.to_code from replaced_codes today where today.site_id = ${siteId} and today.from_code = ${code}), ${code})`;
