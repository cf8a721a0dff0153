/** A neurological exam as scores, before some cells are written otherwise (not testable, starred). */
import { cellKey, classify, keyMuscles, levels, sensorySegments } from '@cairnstep/scoring';
import type { AisGrade, CellKey, Classification, Exam, KeyMuscle, Level, SensorySegment, Side, SideExam } from '@cairnstep/scoring';

export interface SideSheet {
  /** C2 to S4-5. */
  readonly touch: number[];
  readonly prick: number[];
  /** C5 to S1. */
  readonly muscles: number[];
  readonly nonKey?: KeyMuscle;
}

export interface ExamSheet extends Readonly<Record<Side, SideSheet>> {
  readonly vac: boolean;
  readonly dap: boolean;
}

/** Cells written otherwise than as their score. */
export type Marks = Readonly<Partial<Record<CellKey, string>>>;

/** What an exam is meant to show. */
export interface Finding {
  readonly nli: Level;
  readonly grade: AisGrade;
}

/** Place of each key muscle in the order of levels. */
export const muscleLevels: readonly number[] = keyMuscles.map((muscle) => levels.indexOf(muscle));
export const firstLegMuscle = keyMuscles.indexOf('L2');
/** Index of S4-5 among the dermatomes; the dermatome with index i belongs to the level with index i + 1. */
export const perianal = sensorySegments.indexOf('S4_5');

export function copySheet(sheet: ExamSheet): ExamSheet {
  const copySide = ({ touch, prick, muscles, nonKey }: SideSheet): SideSheet => ({
    touch: [...touch],
    prick: [...prick],
    muscles: [...muscles],
    ...(nonKey === undefined ? {} : { nonKey }),
  });
  return { right: copySide(sheet.right), left: copySide(sheet.left), vac: sheet.vac, dap: sheet.dap };
}

const answer = { vac: 'vac', dap: 'dap' } as const;

function observed(found: boolean, mark: string | undefined): Exam['vac'] {
  if (mark === 'NT') return 'NT';
  return found ? 'Yes' : 'No';
}

/** The exam as the classification takes it. */
export function toExam(sheet: ExamSheet, marks: Marks = {}): Exam {
  const side = (name: Side): SideExam => {
    const { touch, prick, muscles, nonKey } = sheet[name];
    const sensory = (modality: 'lightTouch' | 'pinPrick', scores: readonly number[]): Record<SensorySegment, string> =>
      Object.fromEntries(
        sensorySegments.map((segment, index) => [segment, marks[cellKey(name, modality, segment)] ?? String(scores[index])]),
      ) as Record<SensorySegment, string>;
    const motor = Object.fromEntries(
      keyMuscles.map((muscle, index) => [muscle, marks[cellKey(name, 'motor', muscle)] ?? String(muscles[index])]),
    ) as Record<KeyMuscle, string>;
    return {
      lightTouch: sensory('lightTouch', touch),
      pinPrick: sensory('pinPrick', prick),
      motor,
      ...(nonKey === undefined ? {} : { nonKey }),
    };
  };
  return {
    right: side('right'),
    left: side('left'),
    vac: observed(sheet.vac, marks[answer.vac]),
    dap: observed(sheet.dap, marks[answer.dap]),
    earlierDeficit: true,
  };
}

export function classifySheet(sheet: ExamSheet, marks: Marks = {}): Classification {
  return classify(toExam(sheet, marks));
}

/** Whether level and grade come out as meant, without anything left open. */
export function shows({ nli, ais }: Classification, { nli: level, grade }: Finding): boolean {
  return nli.values.length === 1 && nli.values[0] === level && ais.values.length === 1 && ais.values[0] === grade;
}
