/** Findings of an exam that are improbable together. They ask for a look at the sheet; the classification stands. */
import type { Exam } from './exam.ts';
import type { ExamIssue } from './exam-issue.ts';
import { keyMuscleBits, mostRostral, place, rostralTo } from './level-bits.ts';
import type { PossibleResults } from './possible-results.ts';
import type { SideFindings } from './read-side.ts';
import { perianalBit } from './read-side.ts';
import type { Side } from './segments.ts';

const noWarnings: readonly ExamIssue[] = Object.freeze([]);
const s3Bit = perianalBit >>> 1;
const allDermatomes = rostralTo(place.INT);

function isNormal(found: SideFindings): boolean {
  return (found.canBeAltered & allDermatomes) === 0 && ((found.canBeStill | found.canBeFaint | found.canBeUseful) & keyMuscleBits) === 0;
}

function sideWarnings(found: SideFindings, motorLevels: number, side: Side, warnings: ExamIssue[]): void {
  if (found.nonKey !== -1 && found.nonKey - mostRostral(motorLevels) <= 3) {
    warnings.push({
      severity: 'warning',
      code: 'non-key-without-effect',
      side,
      field: 'nonKey',
      message: `The ${side} non-key muscle is not more than three levels below the ${side} motor level, so it has no effect.`,
    });
  }
  if ((found.canBeAltered & perianalBit) === 0 && (found.canBeFelt & s3Bit) === 0) {
    warnings.push({
      severity: 'warning',
      code: 'perianal-normal-s3-absent',
      side,
      segment: 'S4_5',
      message: `On the ${side}, sensation is normal at S4-5 but absent at S3. Check both cells.`,
    });
  }
}

export function clinicalWarnings(exam: Exam, right: SideFindings, left: SideFindings, results: PossibleResults): readonly ExamIssue[] {
  const warnings: ExamIssue[] = [];
  sideWarnings(right, results.motorRight, 'right', warnings);
  sideWarnings(left, results.motorLeft, 'left', warnings);
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
