/**
 * What change in one person is beyond measurement error: SEM = SD sqrt(1 - ICC), MDC = z sqrt 2 SEM, z = 1.96 for 95%.
 * Source: Weir (2005) Journal of Strength and Conditioning Research 19:231-240.
 */

import { normalMultiplier } from '../distributions/normal.ts';
import { requireLevel } from '../result.ts';

/** In the unit of the measurement. */
export interface MeasurementError {
  readonly standardErrorOfMeasurement: number;
  readonly minimalDetectableChange: number;
  readonly level: number;
}

/** `sd` between people, `icc` the test-retest reliability (ICC(2,1)), 0 to 1. */
export function minimalDetectableChange(sd: number, icc: number, level = 0.95): MeasurementError {
  requireLevel(level);
  if (!(sd > 0) || !Number.isFinite(sd)) throw new RangeError('A standard deviation is a positive number.');
  if (!(icc >= 0 && icc <= 1)) throw new RangeError('A reliability lies between 0 and 1.');
  const standardErrorOfMeasurement = sd * Math.sqrt(1 - icc);
  const change = normalMultiplier(level) * Math.SQRT2 * standardErrorOfMeasurement;
  if (!Number.isFinite(change)) throw new RangeError('A standard deviation as large as this cannot be computed with.');
  return { standardErrorOfMeasurement, minimalDetectableChange: change, level };
}
