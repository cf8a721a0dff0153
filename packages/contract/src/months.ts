/** The months of the sites: what is due, what is in, and a month in which there was nothing to report. */
import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { CalendarDate, Id, Instant, Month, Site } from './vocabulary.ts';

/**
 * `not-yet-due`: not over. `due`, `overdue`: nothing has come. `in-progress`: a submission was opened and is not settled. `checking`: its files
 * are being read and checked. `accepted`: committed. `nothing-to-report`: the site said that there is nothing to submit.
 */
export const monthStates = ['not-yet-due', 'due', 'overdue', 'in-progress', 'checking', 'accepted', 'nothing-to-report'] as const;
export const MonthState = z.enum(monthStates);
export type MonthState = z.output<typeof MonthState>;

export const SiteMonth = z.strictObject({
  month: Month,
  state: MonthState,
  dueOn: CalendarDate,
  /** The submission under way, else the accepted one. */
  submissionId: Id.nullable(),
  acceptedAt: Instant.nullable(),
  /** Of the files of the accepted submission. After a correction the month holds more: tables it brought no file of stay. */
  rows: z.number().int().nullable(),
  /** Who said when that there was nothing to report; stays known when a submission took its place. */
  closed: z.strictObject({ at: Instant, by: z.string() }).nullable(),
});
export type SiteMonth = z.output<typeof SiteMonth>;

export const listMonths = endpoint({
  method: 'GET',
  path: '/api/sites/:siteId/months',
  summary: "A site's months, newest first, with what is due",
  params: z.strictObject({ siteId: Id }),
  response: z.strictObject({ site: Site, months: z.array(SiteMonth) }),
  problems: ['not-found'],
});

export const listCalendar = endpoint({
  method: 'GET',
  path: '/api/calendar',
  summary: 'The last twelve months of every site one may see',
  response: z.strictObject({
    /** Oldest first; the last is the running month. */
    months: z.array(Month),
    /** A site's months begin with the first it submits, so there may be fewer than above. */
    sites: z.array(z.strictObject({ site: Site, months: z.array(SiteMonth) })),
  }),
  problems: [],
});

export const closeMonth = endpoint({
  method: 'POST',
  path: '/api/sites/:siteId/months/:month/nothing-to-report',
  summary: 'Say that a month has nothing to report; a submission of that month can still take the place of this',
  params: z.strictObject({ siteId: Id, month: Month }),
  body: z.strictObject({}),
  response: SiteMonth,
  problems: ['not-found', 'month-not-open', 'month-not-empty'],
});
