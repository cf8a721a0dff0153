/**
 * A column with its mean taken out and its length set to one, so that columns of very different size can be told apart by rounding error
 * alone.
 */

import { reasons } from '../result.ts';

export interface CentredColumn {
  readonly mean: number;
  /** Root of the sum of squared deviations; 0 when the column does not vary. */
  readonly norm: number;
  /** Deviations divided by `norm`; all zero when it is 0. */
  readonly unit: Float64Array;
}

/** The mean, corrected once by the mean of the deviations from it (two-pass form). */
export function correctedMean(values: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += values[i] as number;
  const first = sum / values.length;
  let rest = 0;
  for (let i = 0; i < values.length; i++) rest += (values[i] as number) - first;
  return first + rest / values.length;
}

/** `centre: false` keeps the column where it is (models through the origin) and only scales it. */
export function centredColumn(values: Float64Array, centre: boolean): CentredColumn {
  const mean = centre ? correctedMean(values) : 0;
  const unit = new Float64Array(values.length);
  let largest = 0;
  for (let i = 0; i < values.length; i++) {
    const deviation = (values[i] as number) - mean;
    unit[i] = deviation;
    largest = Math.max(largest, Math.abs(deviation));
  }
  // What is left of a constant column is rounding of its mean, not variation.
  if (largest <= 8 * Number.EPSILON * Math.abs(mean)) return { mean, norm: 0, unit: unit.fill(0) };
  let sum = 0;
  for (let i = 0; i < values.length; i++) sum += ((unit[i] as number) / largest) ** 2;
  const norm = largest * Math.sqrt(sum);
  for (let i = 0; i < values.length; i++) unit[i] = (unit[i] as number) / norm;
  return { mean, norm, unit };
}

/** Squares below this have lost digits. */
const smallestSquare = 1e-290;

/** Why these columns cannot be squared in double precision, if so. A column that does not vary is no obstacle here. */
export function rangeObstacle(columns: readonly Pick<CentredColumn, 'norm'>[]): string | undefined {
  if (!columns.every(({ norm }) => Number.isFinite(norm ** 2))) return reasons.tooLarge;
  return columns.some(({ norm }) => norm > 0 && norm ** 2 < smallestSquare) ? reasons.tooSmall : undefined;
}
