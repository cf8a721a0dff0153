/**
 * How a participant walks without the device, before and after each course.
 *
 * Sizes follow published figures, added to no one's real data. At the start: grade C about 0.24 m/s with leg motor scores
 * around 17, grade D 0.3 to 0.7 m/s (Edwards et al., Spinal Cord 2022;60:522-32, table 3; ten chronic incomplete people began at
 * 0.56 m/s, PMC7688947); 69 of 100 people of grade C and 87 of grade D walk by the end of rehabilitation (cohort of an
 * Argentine centre, repository item 123456789/1304). Gains: about 0.1 m/s in chronic injuries (Piira et al., J Rehabil Med
 * 2019;51(2); Nam et al., J Neuroeng Rehabil 2017;14:24), more in the first year, with a wide spread and some losses.
 */
import { keyMuscles, sides } from '@cairnstep/scoring';
import type { AisGrade } from '@cairnstep/scoring';
import type { DrawnExam } from '../exams/exam-series.ts';
import { firstLegMuscle } from '../exams/exam-sheet.ts';
import type { ExamSheet } from '../exams/exam-sheet.ts';
import type { Random } from '../random.ts';
import { clamp } from '../rows.ts';
import type { Course } from '../training/course.ts';
import { isRecent } from './person.ts';
import type { Person } from './person.ts';

/** Self-selected speed in m/s; null for a person who does not walk. */
export type Speed = number | null;

const slowest = 0.07;
const fastest = 1.45;

const motorIncomplete = (grade: AisGrade): boolean => grade === 'C' || grade === 'D' || grade === 'E';

/** @param legs leg motor score, 0 to 50 */
function speedAtStart(random: Random, grade: AisGrade, legs: number): Speed {
  switch (grade) {
    case 'C':
      return random.chance(0.72) ? clamp(0.09 + 0.009 * legs + random.around(0, 0.1), slowest, 0.75) : null;
    case 'D':
      return random.chance(0.95) ? clamp(0.014 * legs + random.around(-0.05, 0.18), 0.1, 1.2) : null;
    case 'E':
      return clamp(random.around(1.1, 0.12), 0.9, fastest);
    default:
      return null;
  }
}

const levelFactor = (person: Person): number => {
  if (person.nli.startsWith('C')) return 0.9;
  return person.nli.startsWith('T') ? 1 : 1.15;
};

/**
 * Speed after a course.
 * @param gradeAfter grade of the last exam: nobody of grade A or B walks
 * @param attended share of the planned sessions that took place
 */
function speedAfterCourse(random: Random, person: Person, before: Speed, gradeAfter: AisGrade, attended: number): Speed {
  const recent = isRecent(person);
  if (before === null) {
    const begins = motorIncomplete(gradeAfter) && random.chance(recent ? 0.45 : 0.15);
    return begins ? random.between(slowest, 0.14) : null;
  }
  const [mean, spread] = person.grade === 'C' ? (recent ? [0.15, 0.11] : [0.07, 0.08]) : recent ? [0.2, 0.14] : [0.1, 0.1];
  const gain = random.around(mean, spread) * levelFactor(person) * (0.55 + 0.45 * attended);
  return clamp(before + gain, slowest, fastest);
}

/** Speed some months after a course. */
export function speedLater(random: Random, after: Speed): Speed {
  return after === null ? null : clamp(after + random.around(-0.01, 0.06), slowest, fastest);
}

/** Walking speed before and after a course. */
export interface CourseSpeeds {
  readonly before: Speed;
  readonly after: Speed;
}

function legScore(sheet: ExamSheet): number {
  const legs = sides.flatMap((side) => sheet[side].muscles.slice(firstLegMuscle, keyMuscles.length));
  return legs.reduce((sum, grade) => sum + grade, 0);
}

/** The last exam of a course may follow its last session by some days. */
const examWithinDays = 14;

/** Speeds of each course. Whether somebody walks depends on the exams that took place, so that no record contradicts another. */
export function drawCourseSpeeds(random: Random, person: Person, courses: readonly Course[], exams: readonly DrawnExam[]): CourseSpeeds[] {
  const [first] = exams;
  let earlier: Speed = null;
  return courses.map(({ number, firstDay, plan, sessions }) => {
    const before = number > 1 ? speedLater(random, earlier) : speedAtStart(random, person.grade, first ? legScore(first.sheet) : 0);
    const end = (sessions.at(-1)?.day ?? firstDay) + examWithinDays;
    const gradeAfter = exams.findLast(({ day }) => day <= end)?.finding.grade ?? person.grade;
    const trained = sessions.filter(({ status }) => status === 'completed' || status === 'shortened').length;
    const after = speedAfterCourse(random, person, before, gradeAfter, trained / plan.sessions);
    earlier = after;
    return { before, after };
  });
}

/** Speed on the way through a course, 0 to 1; who begins to walk does so only at its end. */
export function speedWithin({ before, after }: CourseSpeeds, progress: number): Speed {
  if (progress >= 1) return after;
  return before === null ? null : before + ((after ?? before) - before) * progress;
}

/** Levels of the walking index that go with a speed, from more to less help. */
function levelsFor(speed: number): readonly number[] {
  if (speed < 0.15) return [3, 4, 6, 8, 9];
  if (speed < 0.4) return [8, 9, 10, 12, 13];
  if (speed < 0.75) return [12, 13, 15, 16, 18, 19];
  return [16, 18, 19, 19, 20];
}

/** @param independence 0 to 1: how little help the person takes for the speed reached; the same at every visit. */
export function walkingLevel(speed: Speed, independence: number): number {
  if (speed === null) return 0;
  const possible = levelsFor(speed);
  return possible[Math.min(possible.length - 1, Math.floor(independence * possible.length))] ?? 0;
}
