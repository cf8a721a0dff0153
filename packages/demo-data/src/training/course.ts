/** The sessions of one course of training, as planned and as attended. */
import { isWorkingDay, weekdayOf } from '../calendar.ts';
import type { Random } from '../random.ts';
import type { Plan } from '../people/person.ts';
import type { SiteProfile } from '../sites.ts';

export type SessionStatus = 'completed' | 'shortened' | 'cancelled_before' | 'attended_not_trained';

export interface ScheduledSession {
  /** Calendar day. */
  readonly day: number;
  readonly number: number;
  readonly hour: number;
  readonly status: SessionStatus;
  /** Why it was not completed. */
  readonly reason?: string;
  /** 0 in the first session of the course to 1 in the last planned one. */
  readonly progress: number;
  /** The session in which a fracture ended the course. */
  readonly fracture?: true;
}

export interface Course {
  readonly number: number;
  readonly firstDay: number;
  readonly plan: Plan;
  readonly sessions: readonly ScheduledSession[];
  /** Why no further session follows: all planned ones are over, the participant left, or the horizon was reached. */
  readonly ended: 'finished' | 'left' | 'running';
}

/** Weekdays of training, 0 for Monday; every weekday occurs in each list. */
const rhythms: Readonly<Record<number, readonly (readonly number[])[]>> = {
  2: [
    [0, 3],
    [1, 4],
    [0, 2],
    [2, 4],
  ],
  3: [
    [0, 2, 4],
    [0, 1, 3],
    [1, 2, 4],
    [1, 3, 4],
  ],
  4: [
    [0, 1, 3, 4],
    [0, 1, 2, 4],
    [0, 2, 3, 4],
    [1, 2, 3, 4],
  ],
  5: [[0, 1, 2, 3, 4]],
};

/** Longest time in days that cancelled sessions may follow each other; longer, and a course would count as broken off. */
const longestPause = 11;

export function drawPlan(random: Random, site: SiteProfile): Plan {
  const perWeek = random.pick(site.perWeek);
  // Trials trained for 4 to 12 weeks with 2 to 5 sessions each; most planned 20 to 40 sessions.
  const weeks = random.pick(perWeek >= 4 ? [4, 6, 8, 8, 10] : [8, 10, 12, 12]);
  return { perWeek, sessions: perWeek * weeks };
}

type Outcome = Pick<ScheduledSession, 'status' | 'reason'>;

const completed: Outcome = { status: 'completed' };
const cancelledIll: Outcome = { status: 'cancelled_before', reason: 'medical' };
const brokenOff: Outcome = { status: 'shortened', reason: 'medical' };

function drawStatus(random: Random): Outcome {
  const status = random.weighted<SessionStatus>({ completed: 87, shortened: 4, cancelled_before: 7.5, attended_not_trained: 1.5 });
  switch (status) {
    case 'completed':
      return { status };
    case 'shortened':
      return { status, reason: random.weighted({ fatigue: 5, medical: 2, equipment: 2, staff: 1, other: 1 }) };
    case 'cancelled_before':
      return { status, reason: random.weighted({ medical: 5, transport: 3, staff: 2, equipment: 1, other: 2 }) };
    case 'attended_not_trained':
      return { status, reason: random.weighted({ medical: 4, fatigue: 2, skin: 2, equipment: 2 }) };
  }
}

/** @param horizon calendar day behind which nothing is known. */
export function drawCourse(random: Random, number: number, firstDay: number, plan: Plan, horizon: number): Course {
  const weekday = weekdayOf(firstDay);
  const rhythm = random.pick((rhythms[plan.perWeek] ?? []).filter((days) => days.includes(weekday)));
  const hour = random.whole(8, 15);
  const left = random.chance(0.09);
  const last = left ? Math.round(plan.sessions * random.between(0.15, 0.8)) : plan.sessions;
  const fracture = left && random.chance(0.06);
  const illFrom = random.chance(0.1) ? random.whole(5, plan.sessions) : Infinity;
  const illDays = random.whole(4, 9);

  const sessions: ScheduledSession[] = [];
  let attended = firstDay;
  let illSince = Infinity;
  for (let day = firstDay; day <= horizon && sessions.length < last; day += 1) {
    if (!isWorkingDay(day) || !rhythm.includes(weekdayOf(day))) continue;
    const next = sessions.length + 1;
    if (next === illFrom) illSince = day;
    const isIll = day >= illSince && day < illSince + illDays;
    const drawn = isIll ? cancelledIll : drawStatus(random);
    const breaksOff = fracture && next === last;
    const isDue = next === 1 || day - attended > longestPause;
    const { status, reason } = breaksOff ? brokenOff : isDue ? completed : drawn;
    if (status === 'completed' || status === 'shortened') attended = day;
    sessions.push({
      day,
      number: next,
      hour: Math.max(8, Math.min(16, hour + (random.chance(0.2) ? random.whole(-2, 2) : 0))),
      status,
      ...(reason === undefined ? {} : { reason }),
      progress: (next - 1) / Math.max(1, plan.sessions - 1),
      ...(breaksOff ? { fracture: true } : {}),
    });
  }
  const ended = sessions.length < last ? 'running' : left ? 'left' : 'finished';
  return { number, firstDay, plan, sessions, ended };
}
