/** Reads the constructed examinations of constructed-cases.json. */
import type { Totals } from '../src/classification.ts';
import type { Exam, Observation, SideExam } from '../src/exam.ts';
import type { KeyMuscle, Side } from '../src/segments.ts';
import { keyMuscles, sensorySegments } from '../src/segments.ts';
import file from './constructed-cases.json' with { type: 'json' };

interface WrittenSide {
  readonly lightTouch: string;
  readonly pinPrick: string;
  readonly motor: string;
  readonly nonKey?: string;
}

export interface ConstructedCase {
  readonly id: string;
  readonly about: string;
  readonly exam: Exam;
  readonly expected: {
    readonly sensoryLevel: Readonly<Record<Side, string>>;
    readonly motorLevel: Readonly<Record<Side, string>>;
    readonly nli: string;
    readonly completeness: string;
    readonly ais: string;
    readonly zppSensory: Readonly<Record<Side, string>>;
    readonly zppMotor: Readonly<Record<Side, string>>;
    readonly totals: Totals;
  };
}

/** Spells out `11x2 17x0` into eleven cells of 2 and seventeen of 0. */
function cells<Segment extends string>(row: string, segments: readonly Segment[]): Record<Segment, string> {
  const written = row.split(' ').flatMap((run) => {
    const [times, cell] = run.split('x');
    return cell === undefined ? [run] : Array.from({ length: Number(times) }, () => cell);
  });
  if (written.length !== segments.length) throw new Error(`A row of ${written.length} cells where ${segments.length} belong.`);
  return Object.fromEntries(segments.map((segment, index) => [segment, written[index]])) as Record<Segment, string>;
}

function sideExam(side: WrittenSide): SideExam {
  return {
    lightTouch: cells(side.lightTouch, sensorySegments),
    pinPrick: cells(side.pinPrick, sensorySegments),
    motor: cells(side.motor, keyMuscles),
    ...(side.nonKey === undefined ? {} : { nonKey: side.nonKey as KeyMuscle }),
  };
}

export const constructedCases: readonly ConstructedCase[] = file.cases.map(({ id, about, exam, expected }) => ({
  id,
  about,
  exam: {
    right: sideExam(exam.right),
    left: sideExam(exam.left),
    vac: exam.vac as Observation,
    dap: exam.dap as Observation,
    earlierDeficit: true,
  },
  expected: expected as ConstructedCase['expected'],
}));
