/** Headers that screening would refuse and that a steward has looked at. Their cells are screened all the same. */
import type { InputOf, ResponseOf } from '@cairnstep/contract';
import type { listSafeHeaders as List, markSafeHeader as Mark, unmarkSafeHeader as Unmark } from '@cairnstep/contract';
import { showableHeader } from '@cairnstep/deidentification';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireFound, requireMayAtSite, requirePerson } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor, type Tx } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { readSite } from '../people/sites.repository.ts';
import { deleteSafeHeader, insertSafeHeader, readSafeHeaders } from './safe-headers.repository.ts';

type Headers = ResponseOf<typeof List>;

const present = async (tx: Tx, siteId: string): Promise<Headers> => ({
  headers: (await readSafeHeaders(tx, siteId)).map((one) => ({ ...one, markedAt: one.markedAt.toISOString() })),
});

export const listSafeHeaders = ({ database }: Context, actor: Actor, { siteId }: InputOf<typeof List>): Promise<Headers> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'see-site-rows', siteId);
    requireFound(await readSite(tx, siteId));
    return present(tx, siteId);
  });

export const markSafeHeader = (
  { database }: Context,
  actor: Actor,
  { siteId, header }: InputOf<typeof Mark>,
  requestId: string,
): Promise<Headers> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'mark-safe-header', siteId);
    requireFound(await readSite(tx, siteId));
    if (showableHeader(header) === null)
      throw new Refusal(
        'identifies-somebody',
        'A header that could itself be a name, a date or a number of a person cannot be marked. Nothing was kept.',
      );
    if (await insertSafeHeader(tx, siteId, header, requirePerson(actor).accountId))
      await recordAudit(tx, actor, { act: 'header.mark-safe', object: siteId, site: siteId, requestId, detail: { header } });
    return present(tx, siteId);
  });

export const unmarkSafeHeader = (
  { database }: Context,
  actor: Actor,
  { siteId, header }: InputOf<typeof Unmark>,
  requestId: string,
): Promise<Headers> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'mark-safe-header', siteId);
    requireFound(await readSite(tx, siteId));
    if (await deleteSafeHeader(tx, siteId, header))
      await recordAudit(tx, actor, { act: 'header.unmark-safe', object: siteId, site: siteId, requestId, detail: { header } });
    return present(tx, siteId);
  });
