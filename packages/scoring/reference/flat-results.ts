/** The eleven results of a classification side by side, for comparing engines. */
import type { Classification, Determined } from '../src/classification.ts';

export const resultNames = [
  'sensoryRight',
  'sensoryLeft',
  'motorRight',
  'motorLeft',
  'nli',
  'completeness',
  'ais',
  'zppSensoryRight',
  'zppSensoryLeft',
  'zppMotorRight',
  'zppMotorLeft',
] as const;
export type ResultName = (typeof resultNames)[number];

export function flatResults(found: Classification): Record<ResultName, Determined<string>> {
  return {
    sensoryRight: found.sensoryLevel.right,
    sensoryLeft: found.sensoryLevel.left,
    motorRight: found.motorLevel.right,
    motorLeft: found.motorLevel.left,
    nli: found.nli,
    completeness: found.completeness,
    ais: found.ais,
    zppSensoryRight: found.zppSensory.right,
    zppSensoryLeft: found.zppSensory.left,
    zppMotorRight: found.zppMotor.right,
    zppMotorLeft: found.zppMotor.left,
  };
}
