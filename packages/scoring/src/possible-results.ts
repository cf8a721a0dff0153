/** Every result an exam allows, as bit sets. */
import type { Exam, Observation } from './exam.ts';
import { gradeA, gradesWithContraction, gradesWithSacralSensation } from './grades.ts';
import type { SideReading } from './grades.ts';
import { mostCaudal, notApplicable, rostralTo } from './level-bits.ts';
import type { SideFindings } from './read-side.ts';
import { perianalBit } from './read-side.ts';
import type { SideOutcome } from './side-outcomes.ts';
import { sensoryLevels, sideOutcomes } from './side-outcomes.ts';
import { motorZones, sensoryZones } from './zones.ts';

export const complete = 1;
export const incomplete = 2;

/** Sets as bits: levels by place, grades as in grades.ts, completeness as above, zones with `notApplicable`. */
export interface PossibleResults {
  sensoryRight: number;
  sensoryLeft: number;
  motorRight: number;
  motorLeft: number;
  nli: number;
  completeness: number;
  ais: number;
  zppSensoryRight: number;
  zppSensoryLeft: number;
  zppMotorRight: number;
  zppMotorLeft: number;
}

function motorLevels(outcomes: readonly SideOutcome[]): number {
  let found = 0;
  for (const outcome of outcomes) found |= 1 << outcome.motor;
  return found;
}

/** The more rostral of one level from each side, over all pairs. */
function neurologicalLevels(right: readonly SideOutcome[], left: readonly SideOutcome[]): number {
  let rightLevels = 0;
  let leftLevels = 0;
  for (const outcome of right) rightLevels |= 1 << outcome.rostral;
  for (const outcome of left) leftLevels |= 1 << outcome.rostral;
  const limit = Math.min(mostCaudal(rightLevels), mostCaudal(leftLevels));
  return (rightLevels | leftLevels) & rostralTo(limit + 1);
}

function canBe(observation: Observation, value: 'Yes' | 'No'): boolean {
  return observation === value || observation === 'NT';
}

export function possibleResults(exam: Exam, right: SideFindings, left: SideFindings): PossibleResults {
  const canFeelPressure = canBe(exam.dap, 'Yes');
  const canLackPressure = canBe(exam.dap, 'No');
  const sacral = {
    canBePresent: canFeelPressure || ((right.canBeFelt | left.canBeFelt) & perianalBit) !== 0,
    canBeAbsent: canLackPressure && ((right.mustBeFelt | left.mustBeFelt) & perianalBit) === 0,
  };
  const results: PossibleResults = {
    sensoryRight: sensoryLevels(right),
    sensoryLeft: sensoryLevels(left),
    motorRight: 0,
    motorLeft: 0,
    nli: 0,
    completeness: 0,
    ais: 0,
    zppSensoryRight: sensoryZones(right, canFeelPressure, canLackPressure),
    zppSensoryLeft: sensoryZones(left, canFeelPressure, canLackPressure),
    zppMotorRight: 0,
    zppMotorLeft: 0,
  };
  if (canBe(exam.vac, 'Yes')) addWithContraction(results, exam.earlierDeficit === true, right, left);
  if (canBe(exam.vac, 'No')) addWithoutContraction(results, sacral, right, left);
  return results;
}

function addWithContraction(results: PossibleResults, earlierDeficit: boolean, right: SideFindings, left: SideFindings): void {
  const r: SideReading = { found: right, outcomes: sideOutcomes(right, results.sensoryRight, true) };
  const l: SideReading = { found: left, outcomes: sideOutcomes(left, results.sensoryLeft, true) };
  const nli = neurologicalLevels(r.outcomes, l.outcomes);
  results.motorRight |= motorLevels(r.outcomes);
  results.motorLeft |= motorLevels(l.outcomes);
  results.nli |= nli;
  results.completeness |= incomplete;
  results.ais |= gradesWithContraction(r, l, nli, earlierDeficit);
  results.zppMotorRight |= notApplicable;
  results.zppMotorLeft |= notApplicable;
}

function addWithoutContraction(
  results: PossibleResults,
  sacral: { readonly canBePresent: boolean; readonly canBeAbsent: boolean },
  right: SideFindings,
  left: SideFindings,
): void {
  const r: SideReading = { found: right, outcomes: sideOutcomes(right, results.sensoryRight, false) };
  const l: SideReading = { found: left, outcomes: sideOutcomes(left, results.sensoryLeft, false) };
  const nli = neurologicalLevels(r.outcomes, l.outcomes);
  results.motorRight |= motorLevels(r.outcomes);
  results.motorLeft |= motorLevels(l.outcomes);
  results.nli |= nli;
  if (sacral.canBeAbsent) {
    results.completeness |= complete;
    results.ais |= gradeA;
  }
  if (sacral.canBePresent) {
    results.completeness |= incomplete;
    results.ais |= gradesWithSacralSensation(r, l, nli);
  }
  results.zppMotorRight |= motorZones(r, l, nli, sacral);
  results.zppMotorLeft |= motorZones(l, r, nli, sacral);
}
