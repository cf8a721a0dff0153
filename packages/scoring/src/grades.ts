/** The AIS grade as the set of every grade the exam allows. */
import type { SideFindings } from './read-side.ts';
import type { SideOutcome } from './side-outcomes.ts';
import type { Counts } from './strength.ts';
import { intact, mostRostral } from './level-bits.ts';
import { canBeStillFarBelow, keyMusclesBelow, strengthBelow } from './strength.ts';

/** Bits in the order of `aisGrades`. */
export const gradeA = 1;
export const gradeB = 2;
export const gradeC = 4;
export const gradeD = 8;
export const gradeE = 16;
export const noGrade = 32;

export interface SideReading {
  readonly found: SideFindings;
  readonly outcomes: readonly SideOutcome[];
}

/** Grades C and D that the counts of the two sides allow together, out of `total` muscles: half or more is D. */
function gradesOf(right: Counts, left: Counts, total: number): number {
  let grades = 0;
  if (2 * (right.fewest + left.fewest) < total) grades |= gradeC;
  if (2 * (right.most + left.most) >= total) grades |= gradeD;
  return grades;
}

/** Grades C and D at one candidate level. The level of at least one side must be the candidate itself. */
function gradesAt(right: SideReading, left: SideReading, nli: number, needsMovement: boolean): number {
  const total = keyMusclesBelow(nli);
  const r = strengthBelow(right.found, right.outcomes, nli);
  const l = strengthBelow(left.found, left.outcomes, nli);
  if (!needsMovement) return gradesOf(r.at, l.from, total) | gradesOf(r.from, l.at, total);
  return (
    gradesOf(r.atMoving, l.from, total) |
    gradesOf(r.at, l.fromMoving, total) |
    gradesOf(r.fromMoving, l.at, total) |
    gradesOf(r.from, l.atMoving, total)
  );
}

function motorIncompleteGrades(right: SideReading, left: SideReading, nli: number, needsMovement: boolean): number {
  let grades = 0;
  for (let rest = nli; rest !== 0 && grades !== (gradeC | gradeD); rest &= rest - 1) {
    grades |= gradesAt(right, left, mostRostral(rest), needsMovement);
  }
  return grades;
}

/** Grades with voluntary anal contraction: E or none when all is normal, C or D otherwise. */
export function gradesWithContraction(right: SideReading, left: SideReading, nli: number, earlierDeficit: boolean): number {
  const normal = nli & intact ? (earlierDeficit ? gradeE : noGrade) : 0;
  return normal | motorIncompleteGrades(right, left, nli & ~intact, false);
}

/**
 * Grades without voluntary anal contraction but with sensation at S4-5: B, or C or D with movement more than three levels
 * below the motor level of a side.
 */
export function gradesWithSacralSensation(right: SideReading, left: SideReading, nli: number): number {
  const still =
    right.outcomes.some((outcome) => canBeStillFarBelow(right.found, outcome)) &&
    left.outcomes.some((outcome) => canBeStillFarBelow(left.found, outcome));
  return (still ? gradeB : 0) | motorIncompleteGrades(right, left, nli, true);
}
