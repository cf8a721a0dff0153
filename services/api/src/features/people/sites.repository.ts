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
