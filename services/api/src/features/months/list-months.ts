/** One site's months, and the calendar of every site the actor may see. */
import type { InputOf, ResponseOf } from '@cairnstep/contract';
import type { listCalendar as ListCalendar, listMonths as ListMonths } from '@cairnstep/contract';
import type { Actor } from '../../authority/actor.ts';
import { mayAtSite, requireFound, requireMayAtSite } from '../../authority/require-may.ts';
import type { Context } from '../../context.ts';
import { asActor } from '../../database/as-actor.ts';
import { listSitesWithFirstMonth, readSite } from '../people/sites.repository.ts';
import { monthOf, monthsBetween, monthsBefore } from './months.ts';
import { readMonthLines } from './months.repository.ts';
import { presentMonth } from './present-month.ts';

const calendarMonths = 12;

export const listMonths = (
  { database, clock }: Context,
  actor: Actor,
  { siteId }: InputOf<typeof ListMonths>,
): Promise<ResponseOf<typeof ListMonths>> =>
  asActor(database, actor, async (tx) => {
    requireMayAtSite(actor, 'see-submissions', siteId);
    const { id, code, name, firstMonth } = requireFound(await readSite(tx, siteId));
    const now = clock();
    const lines = new Map((await readMonthLines(tx, siteId, firstMonth)).map((line) => [line.month, line]));
    const months = monthsBetween(firstMonth, monthOf(now)).map((month) => presentMonth(month, lines.get(month), now));
    return { site: { id, code, name }, months: months.reverse() };
  });

export const listCalendar = ({ database, clock }: Context, actor: Actor): Promise<ResponseOf<typeof ListCalendar>> =>
  asActor(database, actor, async (tx) => {
    const now = clock();
    const last = monthOf(now);
    const first = monthsBefore(last, calendarMonths - 1);
    const months = monthsBetween(first, last);
    const lines = new Map((await readMonthLines(tx, null, first)).map((line) => [`${line.siteId} ${line.month}`, line]));
    const sites = (await listSitesWithFirstMonth(tx)).filter(({ id }) => mayAtSite(actor, 'see-submissions', id));
    return {
      months,
      sites: sites.map(({ id, code, name, firstMonth }) => ({
        site: { id, code, name },
        months: months.filter((month) => month >= firstMonth).map((month) => presentMonth(month, lines.get(`${id} ${month}`), now)),
      })),
    };
  });
