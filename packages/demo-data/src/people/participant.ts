/** Everything the registry learns of one invented participant, month by month. */
import { helpAtLevel } from '@cairnstep/scoring';
import { addMonths, firstDayOf, lastDayOf, monthOf, monthsBetween, workingDayFrom } from '../calendar.ts';
import { drawExams } from '../exams/exam-series.ts';
import type { DrawnExam } from '../exams/exam-series.ts';
import type { ExamSheet } from '../exams/exam-sheet.ts';
import { Random } from '../random.ts';
import { datedRow } from '../rows.ts';
import type { DatedRow } from '../rows.ts';
import { drawCourse, drawPlan } from '../training/course.ts';
import type { Course } from '../training/course.ts';
import { chooseDevice, isPowered } from '../training/devices.ts';
import { eventRows, unrelatedEvent } from '../training/events.ts';
import { trainingRows } from '../training/session-rows.ts';
import { drawCirculation } from '../training/vital-signs.ts';
import type { DeviceClass } from '../sites.ts';
import { assessmentRows } from '../visits/assessment-rows.ts';
import { drawDisposition } from '../visits/scores.ts';
import { planVisits } from '../visits/visit-plan.ts';
import { consentRows } from './consents.ts';
import { isMotorComplete, participantCells } from './person.ts';
import type { Person, Plan } from './person.ts';
import { drawCourseSpeeds, speedWithin, walkingLevel } from './walking.ts';
import type { CourseSpeeds } from './walking.ts';

export interface ParticipantOptions {
  readonly seed: number;
  /** Number of the participant at the site, which with the site names the random streams. */
  readonly ordinal: number;
  /** Last submitted month; one more month is invented behind it. */
  readonly lastMonth: string;
  readonly withdraws: boolean;
}

export interface MonthRow extends DatedRow {
  readonly month: string;
}

export interface Participant {
  readonly person: Person;
  readonly exams: readonly DrawnExam[];
  readonly rows: readonly MonthRow[];
}

interface Training extends CourseSpeeds {
  readonly course: Course;
  readonly device: DeviceClass;
  readonly otherDevice: DeviceClass;
}

function drawCourses(random: Random, person: Person, plan: Plan, horizon: number): Course[] {
  const first = drawCourse(random, 1, person.indexDay, plan, horizon);
  const last = first.sessions.at(-1);
  if (!last || first.ended !== 'finished' || !random.chance(0.07)) return [first];
  const secondDay = workingDayFrom(last.day + random.whole(60, 150));
  // A second course is known by its first session.
  return secondDay > horizon ? [first] : [first, drawCourse(random, 2, secondDay, plan, horizon)];
}

/** What is dated before the first training day is submitted with its month. */
function monthOfRow(person: Person, { studyDay }: DatedRow): string {
  return monthOf(person.indexDay + Math.max(0, studyDay));
}

/** The month with which the data of a person who withdraws end; the withdrawal is recorded in the next one. */
function drawLastMonthOfData(random: Random, person: Person, lastMonth: string): string {
  const begun = monthOf(person.indexDay);
  return addMonths(begun, Math.min(random.whole(0, 4), monthsBetween(begun, lastMonth) - 1));
}

function sheetAt(exams: readonly DrawnExam[], day: number): ExamSheet {
  const exam = exams.findLast((each) => each.day <= day);
  if (!exam) throw new Error('Training took place before the first exam.');
  return exam.sheet;
}

export function drawParticipant(person: Person, { seed, ordinal, lastMonth, withdraws }: ParticipantOptions): Participant {
  const stream = (purpose: string): Random => Random.of(seed, person.site.code, ordinal, purpose);
  const horizon = lastDayOf(addMonths(lastMonth, 1));
  const plan = drawPlan(stream('plan'), person.site);
  const courses = drawCourses(stream('courses'), person, plan, horizon);
  const planned = planVisits(stream('visits'), courses, horizon);
  const examPlans = planned.flatMap(({ examDay, timepoint }) =>
    examDay === undefined ? [] : [{ day: examDay, afterTraining: timepoint === 'end_of_course' }],
  );
  const exams = drawExams(stream('exams'), person, examPlans);
  const speeds = drawCourseSpeeds(stream('walking'), person, courses, exams);

  const traits = stream('traits');
  const trainings = courses.map((course, index): Training => ({
    course,
    device: chooseDevice(traits, person.site, person.grade),
    otherDevice: chooseDevice(traits, person.site, person.grade),
    ...(speeds[index] ?? { before: null, after: null }),
  }));
  const testedInDevice = isMotorComplete(person) || traits.chance(0.35);
  const disposition = drawDisposition(traits);
  const circulation = drawCirculation(traits, person);
  const habit = { independence: traits.fraction(), aptitude: traits.between(-1, 1) };
  const usualExertion = traits.between(3, 5.5);
  const plannedMinutes = traits.pick(person.site.plannedMinutes);

  const visiting = stream('assessments');
  const assessments = planned.flatMap((visit) => {
    const training = trainings.find(({ course }) => course.number === visit.course);
    if (!training) throw new Error('A visit belongs to no course.');
    const exam = exams.find(({ day }) => day === visit.examDay);
    const inDevice = testedInDevice && isPowered(training.device);
    return assessmentRows(visiting, { person, visit, speeds: training, exam, inDevice, habit, disposition });
  });

  const random = stream('training');
  const trained = trainings.map((training) => {
    const { course, before } = training;
    const { rows, events } = trainingRows(
      random,
      {
        person,
        circulation,
        device: training.device,
        otherDevice: training.otherDevice,
        plannedMinutes,
        aptitude: habit.aptitude,
        sheetAt: (day) => sheetAt(exams, day),
        abilityAt: (progress) => speedWithin(training, progress) ?? 0,
        dailyAid: helpAtLevel(walkingLevel(before, habit.independence))?.aid ?? 'walker',
        usualPain: disposition.pain,
        usualExertion,
      },
      course,
    );
    const lastDay = course.sessions.at(-1)?.day ?? course.firstDay;
    const illness = random.chance(0.22) ? [unrelatedEvent(random, random.whole(course.firstDay, lastDay))] : [];
    return { rows, events: [...events, ...illness] };
  });

  const consenting = stream('consents');
  const lastMonthOfData = withdraws ? drawLastMonthOfData(consenting, person, lastMonth) : undefined;
  const withdrawnOn =
    lastMonthOfData === undefined
      ? undefined
      : workingDayFrom(firstDayOf(addMonths(lastMonthOfData, 1)) + consenting.whole(3, 20)) - person.indexDay;
  const renewedOn = !withdraws && consenting.chance(0.045) ? consenting.whole(60, 300) : undefined;
  const firstExamDay = examPlans[0]?.day ?? person.indexDay;
  const consents = consentRows(consenting, person, {
    firstDay: firstExamDay - person.indexDay - consenting.whole(2, 21),
    renewedOn,
    withdrawnOn,
  });

  const data: DatedRow[] = [
    datedRow('participants', 0, participantCells(person, plan)),
    ...exams.map(({ row }) => row),
    ...assessments,
    ...trained.flatMap(({ rows }) => rows),
    ...eventRows(
      person,
      trained.flatMap(({ events }) => events),
    ),
  ];
  const inMonth = (row: DatedRow): MonthRow => ({ ...row, month: monthOfRow(person, row) });
  const kept = data.map(inMonth).filter(({ month }) => lastMonthOfData === undefined || month <= lastMonthOfData);
  return { person, exams, rows: [...kept, ...consents.map(inMonth)] };
}
