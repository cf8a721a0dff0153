import type { Range } from './types.ts';

/** Far below any step of the dictionary, far above the rounding of a division. */
const tolerance = 1e-9;

/** Whether a number lies within the limits, and on a step where the range has one. */
export function fitsRange(value: number, { min, max, step }: Range): boolean {
  if (!(value >= min && value <= max)) return false;
  if (step === undefined) return true;
  const steps = (value - min) / step;
  return Math.abs(steps - Math.round(steps)) < tolerance;
}
