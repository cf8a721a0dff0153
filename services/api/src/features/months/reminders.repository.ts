/** What the reminders need to know: months that need none. */
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
