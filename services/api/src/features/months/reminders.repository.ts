/** What the reminders need to know: months that need none, and whom to write to. */
import type { Tx } from '../../database/as-actor.ts';

/** The site's months from `since` on that are accepted or closed. */
export async function settledMonthsSince(tx: Tx, siteId: string, since: string): Promise<ReadonlySet<string>> {
  const rows = (await tx.query(
    `select month from submissions where site_id = $1 and status = 'accepted' and month >= $2
     union select month from month_closures where site_id = $1 and month >= $2`,
    [siteId, since],
  )) as { month: string }[];
  return new Set(rows.map((row) => row.month));
}

/** Addresses of the site's coordinators: with a grant in force on this day, and an account that is not disabled. */
export async function coordinatorsOf(tx: Tx, siteId: string, today: string): Promise<string[]> {
  const rows = (await tx.query(
    `select distinct a.email from accounts a join grants g on g.account_id = a.id
      where g.site_id = $1 and g.role = 'coordinator' and g.starts_on <= $2::date and (g.ends_on is null or g.ends_on >= $2::date)
        and a.status = 'active' and a.email is not null
      order by a.email`,
    [siteId, today],
  )) as { email: string }[];
  return rows.map((row) => row.email);
}
