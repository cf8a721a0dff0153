import type { Grant } from '@cairnstep/contract';
import type { z } from 'zod';
import type { Tx } from '../../database/as-actor.ts';

type GrantOut = z.output<typeof Grant>;

export interface GrantRecord {
  readonly id: string;
  readonly role: GrantOut['role'];
  readonly starts_on: string;
  readonly ends_on: string | null;
  readonly site_id: string | null;
  readonly code: string | null;
  readonly site_name: string | null;
}

export const grantColumns = `g.id, g.role, g.starts_on::text, g.ends_on::text, s.id as site_id, s.code, s.name as site_name`;

export const presentGrant = (row: GrantRecord): GrantOut => ({
  id: row.id,
  role: row.role,
  site: row.site_id !== null && row.code !== null && row.site_name !== null ? { id: row.site_id, code: row.code, name: row.site_name } : null,
  startsOn: row.starts_on,
  endsOn: row.ends_on,
});

/** Grants in force today (UTC). */
export async function readGrants(tx: Tx, accountId: string): Promise<GrantOut[]> {
  const rows = (await tx.query(
    `select ${grantColumns} from grants g left join sites s on s.id = g.site_id
      where g.account_id = $1 and g.starts_on <= (now() at time zone 'UTC')::date
        and (g.ends_on is null or g.ends_on >= (now() at time zone 'UTC')::date)
      order by g.starts_on, g.id`,
    [accountId],
  )) as GrantRecord[];
  return rows.map(presentGrant);
}
