import type { Classification } from './classification.ts';
import { determinedCompleteness, determinedGrade, determinedLevel, determinedZone } from './determined.ts';
import type { Exam } from './exam.ts';
import { possibleResults } from './possible-results.ts';
import { readSide } from './read-side.ts';
import { totalsOf } from './totals.ts';
import { clinicalWarnings } from './warnings.ts';

/**
 * Classifies a neurological exam by the ISNCSCI, 2019 revision (Rupp et al., Top Spinal Cord Inj Rehabil
 * 2021;27(2):1-22). Where the standard leaves a choice: the motor level follows the sensory *level* in segments without a
 * key muscle (Schuld et al., same journal 2025;31(3):37-47); a normal exam without voluntary anal contraction is level S3;
 * a motor incomplete injury with no key muscle below its level is D; the non-key entry extends the motor zone only in C and
 * only when it lies more than three levels below that side's motor level.
 *
 * NT and tagged cells stand for every score they can have: each result is the exact set of values over all combinations,
 * found by walking each side once, never by trying the combinations.
 *
 * @throws UnreadableCellError when a cell holds nothing the sheet allows; check with `validateExam` first.
 */
export function classify(exam: Exam): Classification {
  const right = readSide(exam.right, 'right', false);
  const left = readSide(exam.left, 'left', false);
  const found = possibleResults(exam, right, left);
  const untagged =
    right.hasTags || left.hasTags ? possibleResults(exam, readSide(exam.right, 'right', true), readSide(exam.left, 'left', true)) : found;

  return {
    sensoryLevel: {
      right: determinedLevel(found.sensoryRight, found.sensoryRight !== untagged.sensoryRight),
      left: determinedLevel(found.sensoryLeft, found.sensoryLeft !== untagged.sensoryLeft),
    },
    motorLevel: {
      right: determinedLevel(found.motorRight, found.motorRight !== untagged.motorRight),
      left: determinedLevel(found.motorLeft, found.motorLeft !== untagged.motorLeft),
    },
    nli: determinedLevel(found.nli, found.nli !== untagged.nli),
    completeness: determinedCompleteness(found.completeness, found.completeness !== untagged.completeness),
    ais: determinedGrade(found.ais, found.ais !== untagged.ais),
    zppSensory: {
      right: determinedZone(found.zppSensoryRight, found.zppSensoryRight !== untagged.zppSensoryRight),
      left: determinedZone(found.zppSensoryLeft, found.zppSensoryLeft !== untagged.zppSensoryLeft),
    },
    zppMotor: {
      right: determinedZone(found.zppMotorRight, found.zppMotorRight !== untagged.zppMotorRight),
      left: determinedZone(found.zppMotorLeft, found.zppMotorLeft !== untagged.zppMotorLeft),
    },
    totals: totalsOf(right, left),
    warnings: clinicalWarnings(exam, right, left, found),
  };
}
