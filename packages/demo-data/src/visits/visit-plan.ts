/** When a participant is assessed. */
import { workingDayFrom, workingDayUpTo } from '../calendar.ts';
import type { Random } from '../random.ts';
import type { Course } from '../training/course.ts';
import type { Timepoint, Visit } from './visit.ts';

export interface PlannedVisit extends Pick<Visit, 'day' | 'timepoint' | 'course' | 'progress'> {
  /** Calendar day of the neurological exam that belongs to the visit, if there is one. */
  readonly examDay?: number;
}

const followUps: readonly (readonly [Timepoint, number, number, number])[] = [
  // timepoint, days after the course, chance of the visit, chance of an exam at it
  ['follow_up_3m', 91, 0.45, 0],
  ['follow_up_6m', 182, 0.4, 0.12],
  ['follow_up_12m', 365, 0.4, 0.5],
];

function baseline(random: Random, { number, firstDay }: Course): PlannedVisit {
  const day = workingDayUpTo(firstDay - random.whole(1, 6));
  const examined = number === 1 || random.chance(0.7);
  return {
    day,
    timepoint: 'baseline',
    course: number,
    progress: 0,
    ...(examined ? { examDay: workingDayUpTo(day - random.whole(0, 2)) } : {}),
  };
}

function interim(random: Random, { number, plan, sessions }: Course): PlannedVisit[] {
  const half = sessions[Math.round(plan.sessions / 2)];
  if (!half || plan.sessions < 20 || !random.chance(0.75)) return [];
  return [{ day: half.day, timepoint: 'interim', course: number, progress: half.progress }];
}

function end(random: Random, { number, ended, sessions }: Course): PlannedVisit[] {
  const last = sessions.at(-1);
  const comes = ended === 'finished' ? random.chance(0.94) : ended === 'left' && random.chance(0.25);
  if (!last || !comes) return [];
  const day = workingDayFrom(last.day + random.whole(1, 5));
  const progress = ended === 'finished' ? 1 : last.progress;
  return [{ day, timepoint: 'end_of_course', course: number, progress, ...(random.chance(0.86) ? { examDay: day } : {}) }];
}

function later(random: Random, { number, ended, sessions }: Course, before: number): PlannedVisit[] {
  const last = sessions.at(-1);
  if (!last || ended !== 'finished') return [];
  return followUps.flatMap(([timepoint, days, chance, examChance]) => {
    const day = workingDayFrom(last.day + days + random.whole(-10, 10));
    const takesPlace = random.chance(chance) && day < before;
    const examined = random.chance(examChance);
    return takesPlace ? [{ day, timepoint, course: number, progress: 1, ...(examined ? { examDay: day } : {}) }] : [];
  });
}

/** @param horizon calendar day behind which nothing is known */
export function planVisits(random: Random, courses: readonly Course[], horizon: number): PlannedVisit[] {
  return courses
    .flatMap((course, index) => {
      const next = courses[index + 1];
      // Once a new course is near, its baseline takes the place of a follow-up.
      const before = next ? next.firstDay - 14 : Infinity;
      return [baseline(random, course), ...interim(random, course), ...end(random, course), ...later(random, course, before)];
    })
    .filter(({ day }) => day <= horizon)
    .sort((a, b) => a.day - b.day);
}
