import type { ResponseOf } from '@cairnstep/contract';
import type { addSiteSystem } from '@cairnstep/contract';
import type { SiteSystem } from '../../authority/actor.ts';
import type { Tx } from '../../database/as-actor.ts';
import type { SystemIdentity } from './access-token.ts';

type SystemOut = ResponseOf<typeof addSiteSystem>;

/** Read at each request, so that a system is shut out at the next one after it was disabled. Null: unknown or disabled. */
export async function readActiveSystem(tx: Tx, { issuer, subject }: SystemIdentity): Promise<SiteSystem | null> {
  const [row] = (await tx.query("select id, label, site_id from site_systems where issuer = $1 and subject = $2 and status = 'active'", [
    issuer,
    subject,
  ])) as { id: string; label: string; site_id: string }[];
  return row ? { kind: 'site-system', systemId: row.id, label: row.label, siteId: row.site_id } : null;
}

/** To the minute: a system that polls does not write at every request. */
export const noteUse = (tx: Tx, systemId: string, now: Date): Promise<unknown> =>
  tx.query(
    "update site_systems set last_used_at = $2 where id = $1 and (last_used_at is null or last_used_at < $2::timestamptz - interval '1 minute')",
    [systemId, now],
  );

interface SystemRecord extends Omit<SystemOut, 'site' | 'addedAt' | 'lastUsedAt'> {
  readonly siteId: string;
  readonly siteCode: string;
  readonly siteName: string;
  readonly addedAt: Date;
  readonly lastUsedAt: Date | null;
}

async function selectSystems(tx: Tx, id: string | null): Promise<SystemOut[]> {
  const rows = (await tx.query(
    `select y.id, y.issuer, y.subject, y.label, y.status, y.added_at as "addedAt", coalesce(account_name(y.added_by), 'the registry') as "addedBy",
            y.last_used_at as "lastUsedAt", s.id as "siteId", s.code as "siteCode", s.name as "siteName"
       from site_systems y join sites s on s.id = y.site_id where $1::uuid is null or y.id = $1 order by s.code, y.label, y.id`,
    [id],
  )) as SystemRecord[];
  return rows.map(({ siteId, siteCode, siteName, addedAt, lastUsedAt, ...row }) => ({
    ...row,
    site: { id: siteId, code: siteCode, name: siteName },
    addedAt: addedAt.toISOString(),
    lastUsedAt: lastUsedAt?.toISOString() ?? null,
  }));
}

export const listSystems = (tx: Tx): Promise<SystemOut[]> => selectSystems(tx, null);
export const readSystem = async (tx: Tx, id: string): Promise<SystemOut | null> => (await selectSystems(tx, id))[0] ?? null;

export interface NewSystem extends SystemIdentity {
  readonly id: string;
  readonly siteId: string;
  readonly label: string;
  readonly addedBy: string | null;
}

/** False when this (issuer, subject) is registered already. */
export async function insertSystem(tx: Tx, system: NewSystem): Promise<boolean> {
  const rows = (await tx.query(
    `insert into site_systems (id, site_id, issuer, subject, label, added_by) values ($1, $2, $3, $4, $5, $6)
     on conflict (issuer, subject) do nothing returning id`,
    [system.id, system.siteId, system.issuer, system.subject, system.label, system.addedBy],
  )) as unknown[];
  return rows.length > 0;
}

export const setSystemStatus = (tx: Tx, id: string, status: 'active' | 'disabled'): Promise<unknown> =>
  tx.query('update site_systems set status = $2 where id = $1', [id, status]);
