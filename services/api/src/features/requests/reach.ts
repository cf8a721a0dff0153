/** How many people a request reaches, and how many of them consent to just this use. */
import { openConsentQuestions } from '@cairnstep/contract';
import type { InputOf, ResponseOf } from '@cairnstep/contract';
import type { getReach as GetReach } from '@cairnstep/contract';
import { recordAudit } from '../../audit/record-audit.ts';
import { hasRole, registry, type Actor } from '../../authority/actor.ts';
import { requireFound } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { readRelease } from '../explore/explore.repository.ts';
import { publicCount } from '../explore/public-count.ts';
import { readCohort, readNewestConsents } from '../exports/exports.repository.ts';
import { verdictOn } from './consenting.ts';
import { readRequest } from './requests.repository.ts';

export async function getReach(
  { database, clock }: Context,
  actor: Actor,
  { requestId: id }: InputOf<typeof GetReach>,
): Promise<ResponseOf<typeof GetReach>> {
  const request = requireFound(await asActor(database, actor, (tx) => readRequest(tx, id)));
  const exact = hasRole(actor, 'steward');
  return asActor(database, registry, async (tx) => {
    const today = clock().toISOString().slice(0, 10);
    const release = await readRelease(tx, request.releaseNumber ?? undefined);
    const cohort = release ? await readCohort(tx, release.number, request.form.cohort.cells) : [];
    const consents = await readNewestConsents(tx, cohort);
    const verdicts = cohort.map((person) => verdictOn(consents.get(`${person.siteId} ${person.participant}`), request.form, today));
    const permitted = verdicts.filter((one) => one.verdict === 'permitted').length;
    const openQuestions = openConsentQuestions(request.form);
    const told = (count: number) => (exact ? count : publicCount(count));
    const answer = { inCohort: told(cohort.length), consenting: openQuestions.length > 0 ? null : told(permitted), openQuestions };
    if (!exact) return { ...answer, reasons: [] };
    await recordAudit(tx, actor, { act: 'request.reach', object: id });
    const reasons = new Map<string, { reason: string; verdict: 'not_permitted' | 'manual_review'; participants: number }>();
    for (const { verdict, reasons: given } of verdicts) {
      if (verdict === 'permitted') continue;
      for (const reason of given) {
        const key = `${verdict} ${reason}`;
        reasons.set(key, { reason, verdict, participants: (reasons.get(key)?.participants ?? 0) + 1 });
      }
    }
    return { ...answer, reasons: [...reasons.values()].sort((a, b) => b.participants - a.participants || (a.reason < b.reason ? -1 : 1)) };
  });
}
