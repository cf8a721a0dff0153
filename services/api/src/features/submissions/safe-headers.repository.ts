import type { Tx } from '../../database/as-actor.ts';

export interface SafeHeader {
  readonly header: string;
  readonly markedAt: Date;
  readonly markedBy: string;
}

export const readSafeHeaders = async (tx: Tx, siteId: string): Promise<SafeHeader[]> =>
  (await tx.query(
    `select header, marked_at as "markedAt", coalesce(account_name(marked_by), 'a former colleague') as "markedBy"
       from safe_headers where site_id = $1 order by header`,
    [siteId],
  )) as SafeHeader[];

/** True when it was not there before. */
export async function insertSafeHeader(tx: Tx, siteId: string, header: string, by: string): Promise<boolean> {
  const rows = (await tx.query(
    'insert into safe_headers (site_id, header, marked_by) values ($1, $2, $3) on conflict (site_id, header) do nothing returning header',
    [siteId, header, by],
  )) as unknown[];
  return rows.length > 0;
}

/** True when it was there. */
export async function deleteSafeHeader(tx: Tx, siteId: string, header: string): Promise<boolean> {
  const [rows] = (await tx.query('delete from safe_headers where site_id = $1 and header = $2 returning header', [siteId, header])) as [
    unknown[],
    number,
  ];
  return rows.length > 0;
}
