/** What has come for the months of the sites: submissions and closures. */
import type { Tx } from '../../database/as-actor.ts';

export interface MonthLine {
  readonly siteId: string;
  readonly month: string;
  /** The submission under way. */
  readonly unsettled: string | null;
  readonly isChecking: boolean;
  readonly accepted: string | null;
  readonly acceptedAt: Date | null;
  readonly rows: number | null;
  readonly closedAt: Date | null;
  readonly closedBy: string | null;
}

/** Months from `since` on in which something was opened, accepted or closed: of one site, or (null) of every site the actor reaches. */
export const readMonthLines = async (tx: Tx, siteId: string | null, since: string): Promise<MonthLine[]> =>
  (await tx.query(
    `with sent as (
       select site_id, month, max(id::text) filter (where status in ('open', 'checking', 'checked')) as unsettled,
              bool_or(status = 'checking') as checking, max(id::text) filter (where status = 'accepted') as accepted,
              max(settled_at) filter (where status = 'accepted') as accepted_at
         from submissions where ($1::uuid is null or site_id = $1) and month >= $2 group by site_id, month),
     closed as (select site_id, month, closed_at, closed_by from month_closures where ($1::uuid is null or site_id = $1) and month >= $2)
     select site_id as "siteId", month, unsettled, coalesce(checking, false) as "isChecking", accepted, accepted_at as "acceptedAt",
            (select sum(f.rows)::int from submission_files f where f.submission_id = accepted::uuid) as rows,
            closed_at as "closedAt", case when closed_by is not null then coalesce(account_name(closed_by), 'a former colleague') end as "closedBy"
       from sent full join closed using (site_id, month)`,
    [siteId, since],
  )) as MonthLine[];

/** False when the month had been closed before. */
export async function insertClosure(tx: Tx, siteId: string, month: string, by: string, at: Date): Promise<boolean> {
  const rows = (await tx.query(
    'insert into month_closures (site_id, month, closed_by, closed_at) values ($1, $2, $3, $4) on conflict (site_id, month) do nothing returning month',
    [siteId, month, by, at],
  )) as unknown[];
  return rows.length > 0;
}

/** Keeps everyone else from opening or closing this month of the site until the transaction ends. */
export const lockMonth = (tx: Tx, siteId: string, month: string): Promise<unknown> =>
  tx.query('select pg_advisory_xact_lock(hashtext($1))', [`${siteId} ${month}`]);
