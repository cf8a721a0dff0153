/** Rows of all results of one visit. */
import type { DrawnExam } from '../exams/exam-series.ts';
import type { Person } from '../people/person.ts';
import { speedLater, speedWithin } from '../people/walking.ts';
import type { CourseSpeeds } from '../people/walking.ts';
import type { Random } from '../random.ts';
import { datedRow } from '../rows.ts';
import type { DatedRow } from '../rows.ts';
import { scoreCells } from './scores.ts';
import type { Disposition } from './scores.ts';
import type { PlannedVisit } from './visit-plan.ts';
import type { Visit } from './visit.ts';
import { walkingTestCells } from './walking-tests.ts';
import type { WalkingHabit } from './walking-tests.ts';

export interface VisitContext {
  readonly person: Person;
  readonly visit: PlannedVisit;
  readonly speeds: CourseSpeeds;
  /** The neurological exam that belongs to the visit. */
  readonly exam: DrawnExam | undefined;
  /** Whether walking is tested in the training device as well, as long as the course lasts. */
  readonly inDevice: boolean;
  readonly habit: WalkingHabit;
  readonly disposition: Disposition;
}

/** Severity of spasms is recorded whenever their frequency is. */
const neverLost = new Set<unknown>(['psfs_freq', 'psfs_severity']);

export function assessmentRows(
  random: Random,
  { person, visit: planned, speeds, exam, inDevice, habit, disposition }: VisitContext,
): DatedRow[] {
  const isLater = planned.timepoint.startsWith('follow_up');
  const visit: Visit = {
    ...planned,
    speed: isLater ? speedLater(random, speeds.after) : speedWithin(speeds, planned.progress),
    powered: inDevice && !isLater,
    uems: exam?.uems,
    lems: exam?.lems,
  };
  const studyDay = visit.day - person.indexDay;
  const common = { participant: person.code, assessment_day: studyDay, course_no: visit.course, timepoint: visit.timepoint };
  return [...walkingTestCells(random, person, visit, habit), ...scoreCells(random, person, visit, disposition)]
    .filter(({ measure }) => neverLost.has(measure) || !random.chance(person.site.gaps))
    .map((cells) => datedRow('assessments', studyDay, common, cells));
}
