/** What the registry hands out before a month comes in: the workbook to fill in, and the codes of the people it knows. */
import type { InputOf, ResponseOf } from '@cairnstep/contract';
import type { getTemplate as GetTemplate, listParticipantCodes as ListCodes } from '@cairnstep/contract';
import { writeTemplate } from '@cairnstep/submission-files';
import type { Actor } from '../../authority/actor.ts';
import { requireFound, requireMayAtSite } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import type { FileAnswer } from '../../http/route.ts';
import { readSite } from '../people/sites.repository.ts';
import { allOf } from './all-of.ts';

const readCodes = async (tx: Tx, siteId: string): Promise<string[]> =>
  (
    (await tx.query('select participant from participants where site_id = $1 order by participant', [siteId])) as { participant: string }[]
  ).map(({ participant }) => participant);

export const listParticipantCodes = (
  { database }: Context,
  actor: Actor,
  { siteId }: InputOf<typeof ListCodes>,
): Promise<ResponseOf<typeof ListCodes>> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'see-site-rows', siteId);
    requireFound(await readSite(tx, siteId));
    return { codes: await readCodes(tx, siteId) };
  });

export async function getTemplate(
  { database }: Context,
  actor: Actor,
  { siteId, month }: InputOf<typeof GetTemplate>,
): Promise<FileAnswer> {
  const { code, name, participants } = await asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'see-site-rows', siteId);
    const site = requireFound(await readSite(tx, siteId));
    return { ...site, participants: await readCodes(tx, siteId) };
  });
  return { fileName: `${code}-${month}.xlsx`, bytes: await allOf(writeTemplate({ site: name, month, participants })) };
}
