import type { Site } from '@cairnstep/contract';
import { requireFound } from '../../authority/require-may.ts';
import type { Tx } from '../../database/as-actor.ts';

/** The sites row-level security lets this actor see. */
export const listVisibleSites = async (tx: Tx): Promise<Site[]> =>
  (await tx.query('select id, code, name from sites order by code')) as Site[];

export async function readSite(tx: Tx, siteId: string): Promise<(Site & { firstMonth: string; revision: number }) | null> {
  const [site] = (await tx.query('select id, code, name, first_month as "firstMonth", revision from sites where id = $1', [
    siteId,
  ])) as (Site & {
    firstMonth: string;
    revision: number;
  })[];
  return site ?? null;
}

export interface SiteWithFirstMonth extends Site {
  readonly firstMonth: string;
}

export const listSitesWithFirstMonth = async (tx: Tx): Promise<SiteWithFirstMonth[]> =>
  (await tx.query('select id, code, name, first_month as "firstMonth" from sites order by code')) as SiteWithFirstMonth[];

/** Waits for whatever changes the same site, and keeps others from it until the transaction ends. The site's revision as it then is. */
export async function lockSite(tx: Tx, siteId: string): Promise<number> {
  const [site] = (await tx.query('select revision from sites where id = $1 for update', [siteId])) as { revision: number }[];
  return requireFound(site).revision;
}

/** Addresses of the site's coordinators: with a grant in force on this day (`2026-12-01`), and an account that is not disabled. */
export async function coordinatorAddresses(tx: Tx, siteId: string, today: string): Promise<string[]> {
  const rows = (await tx.query('select coordinator_addresses($1, $2::date) as email', [siteId, today])) as { email: string }[];
  return rows.map((row) => row.email);
}
