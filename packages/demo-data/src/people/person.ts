/** Who an invented participant is, apart from exams and training. */
import { levels } from '@cairnstep/scoring';
import { yearOf } from '../calendar.ts';
import type { Case } from '../case-mix.ts';
import type { Random } from '../random.ts';
import { clamp, rounded } from '../rows.ts';
import type { Cells } from '../rows.ts';
import type { SiteProfile } from '../sites.ts';
import { participantCode } from './participant-code.ts';

export interface Person extends Case {
  readonly code: string;
  readonly site: SiteProfile;
  /** Calendar day of the first training session. It decides the months and never leaves the generator. */
  readonly indexDay: number;
  readonly age: number;
  readonly sex: string;
  readonly cause: string;
  readonly daysSinceInjury: number;
  /** Whether the clinic knows the day of the injury. */
  readonly injuryDayKnown: boolean;
  readonly ventilator: boolean;
  readonly massKg: number;
}

const daysPerYear = 365.25;
const youngest = 16;
const oldest = 84;

function isAtOrAbove(person: Case, level: 'C4' | 'C8' | 'T6'): boolean {
  return levels.indexOf(person.nli) <= levels.indexOf(level);
}

export const isHighCervical = (person: Case): boolean => isAtOrAbove(person, 'C4');
export const isCervical = (person: Case): boolean => isAtOrAbove(person, 'C8');
/** At T6 and above the circulation of much of the body is out of the brain's reach. */
export const isAtOrAboveT6 = (person: Case): boolean => isAtOrAbove(person, 'T6');
export const isMotorComplete = (person: Case): boolean => person.grade === 'A' || person.grade === 'B';
/** In the first year after the injury, when most recovery takes place. */
export const isRecent = (person: Person): boolean => person.daysSinceInjury < 365;

function drawDaysSinceInjury(random: Random, age: number): number {
  const days = {
    recent: () => random.whole(45, 364),
    chronic: () => random.whole(365, 1_825),
    late: () => random.whole(1_826, 9_000),
  }[random.weighted({ recent: 45, chronic: 32, late: 23 })]();
  const longest = Math.floor((age - 8) * daysPerYear);
  return days <= longest ? days : random.whole(365, longest);
}

export function drawPerson(random: Random, site: SiteProfile, indexDay: number, { nli, grade }: Case): Person {
  const age = Math.round(clamp(random.around(46, 17), youngest, oldest));
  const sex = random.weighted({ male: 71, female: 28, other: 0.6, unknown: 0.4 });
  return {
    code: participantCode(random),
    site,
    indexDay,
    nli,
    grade,
    age,
    sex,
    cause: random.weighted({
      transport: 31,
      fall: age > 60 ? 45 : 25,
      sports_leisure: age > 60 ? 3 : 13,
      assault: 4,
      other_traumatic: 5,
      non_traumatic: age > 50 ? 28 : 10,
      unknown: 1.5,
    }),
    daysSinceInjury: drawDaysSinceInjury(random, age),
    injuryDayKnown: !random.chance(0.04),
    ventilator: isHighCervical({ nli, grade }) && (grade === 'A' || grade === 'B') && random.chance(0.3),
    massKg: rounded(clamp(random.around(sex === 'female' ? 67 : 80, 13), 46, 112), 1),
  };
}

export interface Plan {
  readonly sessions: number;
  readonly perWeek: number;
}

export function participantCells(person: Person, plan: Plan): Cells {
  return {
    participant: person.code,
    age_at_index: person.age,
    sex: person.sex,
    injury_year: yearOf(person.indexDay - person.daysSinceInjury),
    days_injury_to_index: person.injuryDayKnown ? person.daysSinceInjury : null,
    cause: person.cause,
    ventilator: person.ventilator ? 'yes' : 'no',
    planned_sessions: plan.sessions,
    planned_sessions_per_week: plan.perWeek,
  };
}
