/** The neurological exams of one participant: the first, and what later ones find. */
import { cellPlaces } from '@cairnstep/scoring';
import type { AisGrade, Exam, KeyMuscle, Level, SensorySegment } from '@cairnstep/scoring';
import type { Person } from '../people/person.ts';
import { isRecent } from '../people/person.ts';
import type { Random } from '../random.ts';
import { datedRow } from '../rows.ts';
import type { Cells, DatedRow } from '../rows.ts';
import { draftSheet } from './draft-sheet.ts';
import { classifySheet, toExam } from './exam-sheet.ts';
import type { ExamSheet, Finding } from './exam-sheet.ts';
import { recoveredSheet } from './recovered-sheet.ts';
import type { Recovery, ShownSheet } from './recovered-sheet.ts';
import { unclearCells } from './unclear-cells.ts';
import type { UnclearCells } from './unclear-cells.ts';

/** An exam as invented: what it is meant to show, and its row. */
export interface DrawnExam {
  /** Calendar day. */
  readonly day: number;
  readonly sheet: ExamSheet;
  readonly finding: Finding;
  /** Which result is left open on purpose by cells that were not testable. */
  readonly open?: 'nli' | 'ais';
  /** Absent when a muscle was not testable. */
  readonly uems?: number;
  readonly lems?: number;
  readonly row: DatedRow;
}

const recent: Readonly<Partial<Record<AisGrade, readonly [AisGrade, number]>>> = { A: ['B', 0.08], B: ['C', 0.28], C: ['D', 0.26] };
/** In chronic injuries 8 of 100 people changed grade during locomotor training (Buehner et al. 2012, 225 people). */
const chronic: Readonly<Partial<Record<AisGrade, readonly [AisGrade, number]>>> = { A: ['B', 0.02], B: ['C', 0.05], C: ['D', 0.07] };

/** Motor points gained: 2.7 in chronic incomplete injuries (Piira et al., J Rehabil Med 2019;51(2)), more in the first year, hardly any when motor complete. */
function drawRecovery(random: Random, person: Person, grade: AisGrade, duringTraining: boolean): Recovery {
  const isEarly = isRecent(person);
  const [next, chance] = (isEarly ? recent : chronic)[grade] ?? [grade, 0];
  const scale = duringTraining ? 1 : 0.4;
  const points = grade === 'A' || grade === 'B' ? random.around(0.4, 0.6) : isEarly ? random.around(6, 3.5) : random.around(2.7, 2.2);
  return {
    points: Math.max(0, Math.round(points * scale)),
    grade: random.chance(chance * scale) ? next : grade,
    levelGained: grade !== 'E' && random.chance((isEarly ? 0.14 : 0.04) * scale),
  };
}

/** Grades that a clinic takes for each other now and then. */
const mistakenFor: Readonly<Partial<Record<AisGrade, AisGrade>>> = { B: 'A', C: 'D', D: 'C' };

function scoreCells(exam: Exam): Cells {
  return Object.fromEntries(
    cellPlaces.map(({ key, side, modality, segment }) => [
      key,
      modality === 'motor' ? exam[side].motor[segment as KeyMuscle] : exam[side][modality][segment as SensorySegment],
    ]),
  );
}

const single = <T extends string>(values: readonly T[]): T | 'ND' => (values.length === 1 ? (values[0] as T) : 'ND');

const tagEffect = (nli: boolean, ais: boolean): string => (nli ? (ais ? 'both' : 'nli') : ais ? 'ais' : 'none');

function writeExam(random: Random, person: Person, day: number, isFirst: boolean, shown: ShownSheet): DrawnExam {
  const { sheet, finding } = shown;
  const unclear: UnclearCells = unclearCells(random, shown);
  const found = classifySheet(sheet, unclear.marks);
  const grade = single(found.ais.values);
  const level: Level | 'ND' = single(found.nli.values);
  const mistaken = random.chance(0.015) ? (mistakenFor[finding.grade] ?? grade) : grade;
  const exam = toExam(sheet, unclear.marks);
  const studyDay = day - person.indexDay;
  const cells: Cells = {
    participant: person.code,
    exam_day: studyDay,
    vac: exam.vac === 'NT' ? 'NT' : exam.vac.toLowerCase(),
    dap: exam.dap === 'NT' ? 'NT' : exam.dap.toLowerCase(),
    // A normal exam gets its grade only when an earlier one showed a deficit.
    earlier_deficit: !isFirst || finding.grade === 'E' || random.chance(0.9) ? 'yes' : 'no',
    nt_reason: unclear.ntReason !== undefined && random.chance(0.92) ? unclear.ntReason : null,
    tag_cause: unclear.tagCause,
    examiner_role: random.weighted({ physician: 5, physiotherapist: 4, occupational_therapist: 1 }),
    recorded_ais: random.chance(0.05) ? null : mistaken,
    recorded_nli: random.chance(0.06) ? null : level,
    non_sci_affects: unclear.tagCause === undefined && random.chance(0.3) ? null : tagEffect(found.nli.tagged, found.ais.tagged),
  };
  const { uems, lems } = found.totals;
  return {
    day,
    sheet,
    finding,
    ...(unclear.open === undefined ? {} : { open: unclear.open }),
    ...(uems === 'ND' ? {} : { uems }),
    ...(lems === 'ND' ? {} : { lems }),
    row: datedRow('exams', studyDay, scoreCells(exam), cells),
  };
}

export interface ExamPlan {
  /** Calendar day. */
  readonly day: number;
  /** Whether training took place since the exam before. */
  readonly afterTraining: boolean;
}

/** @param plans in calendar order; the first is the exam before the first course. */
export function drawExams(random: Random, person: Person, plans: readonly ExamPlan[]): DrawnExam[] {
  const exams: DrawnExam[] = [];
  let shown: ShownSheet = {
    sheet: draftSheet(random, { nli: person.nli, grade: person.grade }),
    finding: { nli: person.nli, grade: person.grade },
  };
  plans.forEach(({ day, afterTraining }, index) => {
    if (index > 0) shown = recoveredSheet(random, shown, drawRecovery(random, person, shown.finding.grade, afterTraining));
    exams.push(writeExam(random, person, day, index === 0, shown));
  });
  return exams;
}
