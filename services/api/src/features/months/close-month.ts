/** A coordinator says that a month has nothing to report. Nothing in the registry changes; the month is asked for no longer. */
import type { InputOf, SiteMonth } from '@cairnstep/contract';
import type { closeMonth as CloseMonth } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireFound, requireMayAtSite, requireSubmitter } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { Refusal } from '../../http/refusal.ts';
import { readSite } from '../people/sites.repository.ts';
import { insertClosure, lockMonth, readMonthLines } from './months.repository.ts';
import { presentMonth } from './present-month.ts';
import { requireOpenMonth } from './require-open-month.ts';

export const closeMonth = (
  { database, clock }: Context,
  actor: Actor,
  { siteId, month }: InputOf<typeof CloseMonth>,
  requestId: string,
): Promise<SiteMonth> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'submit', siteId);
    const now = clock();
    const site = requireFound(await readSite(tx, siteId));
    requireOpenMonth(month, site, now);
    await lockMonth(tx, siteId, month);
    const read = async () => (await readMonthLines(tx, siteId, month)).find((line) => line.month === month);
    const before = await read();
    if (before?.unsettled) {
      throw new Refusal(
        'month-not-empty',
        'A submission of this month is under way. Commit it, or give it up, and then say that there is nothing. Nothing was changed.',
      );
    }
    if (before?.accepted) {
      throw new Refusal(
        'month-not-empty',
        'A submission of this month has been accepted, so there was something. To change it, correct the month. Nothing was changed.',
      );
    }
    if (await insertClosure(tx, siteId, month, requireSubmitter(actor).id, now)) {
      await recordAudit(tx, actor, { act: 'month.close', object: `${site.code} ${month}`, site: siteId, requestId, detail: { month } });
    }
    return presentMonth(month, await read(), now);
  });
