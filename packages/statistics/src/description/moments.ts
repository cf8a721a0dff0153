/** Mean and spread of cleaned numbers: sample forms (n - 1) throughout. */

import { mean } from 'simple-statistics';

export interface Moments {
  readonly n: number;
  readonly least: number;
  readonly greatest: number;
  readonly mean: number;
  /** Sum of squared deviations from the mean. */
  readonly sumOfSquares: number;
  /** Sum of cubed deviations from the mean. */
  readonly sumOfCubes: number;
}

/**
 * At least one value, on a computable scale. The mean by compensated summation (simple-statistics); the squares in a second pass,
 * corrected for the rounding of the mean: Chan, Golub & LeVeque (1983) American Statistician 37:242-247.
 * Values that are all equal give exactly 0.
 */
export function moments(values: Float64Array): Moments {
  // The declaration asks for an array; the code reads length and elements only.
  const centre = mean(values as unknown as number[]);
  let least = values[0] as number;
  let greatest = least;
  let deviations = 0;
  let squares = 0;
  let cubes = 0;
  for (let i = 0; i < values.length; i++) {
    const value = values[i] as number;
    if (value < least) least = value;
    else if (value > greatest) greatest = value;
    const deviation = value - centre;
    const square = deviation * deviation;
    deviations += deviation;
    squares += square;
    cubes += square * deviation;
  }
  const n = values.length;
  if (least === greatest) return { n, least, greatest, mean: least, sumOfSquares: 0, sumOfCubes: 0 };
  return { n, least, greatest, mean: centre, sumOfSquares: squares - (deviations * deviations) / n, sumOfCubes: cubes };
}

/** Sample SD; at least two values. */
export function sampleSd(of: Moments): number {
  return Math.sqrt(of.sumOfSquares / (of.n - 1));
}

/**
 * G1, the adjusted Fisher-Pearson skewness that SAS, SPSS and spreadsheets print (type 2 of Joanes & Gill 1998, The Statistician
 * 47:183-189); at least three values that are not all equal.
 */
export function skewness(of: Moments): number {
  const { n, sumOfSquares, sumOfCubes } = of;
  const g1 = sumOfCubes / n / (sumOfSquares / n) ** 1.5;
  return (g1 * Math.sqrt(n * (n - 1))) / (n - 2);
}
