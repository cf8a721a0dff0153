/** Findings of an exam that are improbable together. They ask for a look at the sheet; the classification stands. */
import { rowName } from './cell-name.ts';
import { readCell, scoresOf, sensoryReadings } from './cell-reading.ts';
import type { Exam } from './exam.ts';
import type { ExamIssue } from './exam-issue.ts';
import { keyMuscleBits, mostRostral, place, rostralTo } from './level-bits.ts';
import type { PossibleResults } from './possible-results.ts';
import type { SideFindings } from './read-side.ts';
import type { Side } from './segments.ts';

const noWarnings: readonly ExamIssue[] = Object.freeze([]);
const absent = 0b001;
const normal = 0b100;
const allDermatomes = rostralTo(place.INT);

function isSurely(written: string, scores: number): boolean {
  const reading = readCell(sensoryReadings, written);
  return reading !== undefined && scoresOf(reading, false) === scores;
}

function isNormal(found: SideFindings): boolean {
  return (found.canBeAltered & allDermatomes) === 0 && ((found.canBeStill | found.canBeFaint | found.canBeUseful) & keyMuscleBits) === 0;
}

function sideWarnings(exam: Exam, found: SideFindings, motorLevels: number, side: Side, warnings: ExamIssue[]): void {
  if (found.nonKey !== -1 && found.nonKey - mostRostral(motorLevels) <= 3) {
    warnings.push({
      severity: 'warning',
      code: 'non-key-without-effect',
      side,
      field: 'nonKey',
      message: `The ${side} non-key muscle is not more than three levels below the ${side} motor level, so it has no effect.`,
    });
  }
  for (const modality of ['lightTouch', 'pinPrick'] as const) {
    if (!isSurely(exam[side][modality].S4_5, normal) || !isSurely(exam[side][modality].S3, absent)) continue;
    warnings.push({
      severity: 'warning',
      code: 'perianal-normal-s3-absent',
      side,
      modality,
      segment: 'S4_5',
      message: `The ${rowName(side, modality)} is normal at S4-5 but absent at S3. Check both cells.`,
    });
  }
}

export function clinicalWarnings(exam: Exam, right: SideFindings, left: SideFindings, results: PossibleResults): readonly ExamIssue[] {
  const warnings: ExamIssue[] = [];
  sideWarnings(exam, right, results.motorRight, 'right', warnings);
  sideWarnings(exam, left, results.motorLeft, 'left', warnings);
  if ((exam.vac === 'No' || exam.dap === 'No') && isNormal(right) && isNormal(left)) {
    if (exam.vac === 'No') {
      warnings.push({
        severity: 'warning',
        code: 'normal-without-contraction',
        field: 'vac',
        message: 'Every score is normal but voluntary anal contraction is absent, which gives level S3. Check the entry.',
      });
    }
    if (exam.dap === 'No') {
      warnings.push({
        severity: 'warning',
        code: 'normal-without-pressure',
        field: 'dap',
        message: 'Every score is normal but deep anal pressure is not felt. Check the entry.',
      });
    }
  }
  return warnings.length === 0 ? noWarnings : warnings;
}
