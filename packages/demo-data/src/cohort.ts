/** The invented people of all sites. */
import { addMonths, firstDayOf, lastDayOf, workingDayFrom, workingDayUpTo } from './calendar.ts';
import { drawCases } from './case-mix.ts';
import type { Case } from './case-mix.ts';
import { drawParticipant } from './people/participant.ts';
import type { Participant } from './people/participant.ts';
import { drawPerson } from './people/person.ts';
import { Random } from './random.ts';
import { siteProfiles } from './sites.ts';
import type { SiteProfile } from './sites.ts';
import type { DemoOptions } from './types.ts';

export const monthsHeld = 24;
const withdrawals = 12;

/** Sites that have files of the month that is not yet submitted, and the people who begin there in it. */
export const sitesWithNextMonth = { clean: 'S01', mistakes: 'S02' } as const;
const newcomers: readonly Case[] = [
  { nli: 'C6', grade: 'D' },
  { nli: 'T5', grade: 'C' },
  { nli: 'T11', grade: 'A' },
];
/** They begin early in the month, so that it holds some of their sessions. */
const newcomersWithin = 12;

interface Start {
  readonly site: SiteProfile;
  readonly ordinal: number;
  readonly indexDay: number;
  readonly own: Case;
  readonly withdraws: boolean;
}

export function firstMonthOf(site: SiteProfile, lastMonth: string): string {
  return addMonths(lastMonth, site.joinedAfter - (monthsHeld - 1));
}

/** A day when the clinics are open in the given part, 0 to 1, of the days from `first` to `last`. */
function dayWithin(first: number, last: number, part: number): number {
  const day = workingDayFrom(first + Math.floor((last - first) * part));
  return day <= last ? day : workingDayUpTo(last);
}

function drawStarts(random: Random, { seed, lastMonth }: DemoOptions): Start[] {
  const cases = drawCases(random);
  const starts = siteProfiles.flatMap((site) => {
    const days = Random.of(seed, site.code, 'starts');
    const first = firstDayOf(firstMonthOf(site, lastMonth));
    const own = cases.splice(0, site.participants);
    return own.map((each, ordinal): Start => ({
      site,
      ordinal,
      indexDay: dayWithin(first, lastDayOf(lastMonth), (ordinal + days.fraction()) / own.length),
      own: each,
      withdraws: false,
    }));
  });
  // Whoever withdraws has sent at least one month before.
  const canWithdraw = starts.filter(({ indexDay }) => indexDay < firstDayOf(lastMonth));
  const chosen = new Set(random.shuffled(canWithdraw).slice(0, withdrawals));
  return starts.map((start) => (chosen.has(start) ? { ...start, withdraws: true } : start));
}

function drawNewcomers({ seed, lastMonth }: DemoOptions): Start[] {
  const first = firstDayOf(addMonths(lastMonth, 1));
  const codes: readonly string[] = Object.values(sitesWithNextMonth);
  return siteProfiles
    .filter(({ code }) => codes.includes(code))
    .flatMap((site) => {
      const days = Random.of(seed, site.code, 'newcomers');
      return newcomers.map((own, index): Start => ({
        site,
        ordinal: site.participants + index,
        indexDay: dayWithin(first, first + newcomersWithin, (index + days.fraction()) / newcomers.length),
        own,
        withdraws: false,
      }));
    });
}

/** Everybody, with all their rows: site by site, in the order in which they begin. */
export function drawCohort(options: DemoOptions): Participant[] {
  const { seed, lastMonth } = options;
  const starts = [...drawStarts(Random.of(seed, 'consortium'), options), ...drawNewcomers(options)];
  return starts.map(({ site, ordinal, indexDay, own, withdraws }) => {
    const person = drawPerson(Random.of(seed, site.code, ordinal, 'person'), site, indexDay, own);
    return drawParticipant(person, { seed, ordinal, lastMonth, withdraws });
  });
}
