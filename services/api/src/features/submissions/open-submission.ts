import type { InputOf, Submission } from '@cairnstep/contract';
import type { openSubmission as OpenSubmission } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import type { Actor } from '../../authority/actor.ts';
import { requireFound, requireMayAtSite, requireSubmitter } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { lockMonth } from '../months/months.repository.ts';
import { requireOpenMonth } from '../months/require-open-month.ts';
import { readSite } from '../people/sites.repository.ts';
import { present } from './read-submissions.ts';
import { findUnsettled, insertSubmission } from './submissions.repository.ts';

/** One submission of a month is worked on at a time: whoever comes second joins the first. */
export const openSubmission = (
  { database, clock }: Context,
  actor: Actor,
  { siteId, month }: InputOf<typeof OpenSubmission>,
  requestId: string,
): Promise<Submission> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'submit', siteId);
    const site = requireFound(await readSite(tx, siteId));
    requireOpenMonth(month, site, clock());
    await lockMonth(tx, siteId, month);
    const existing = await findUnsettled(tx, siteId, month);
    if (existing !== null) return present(tx, existing);
    const id = await insertSubmission(tx, siteId, month, requireSubmitter(actor).id);
    await recordAudit(tx, actor, { act: 'submission.open', object: id, site: siteId, requestId });
    return present(tx, id);
  });
