/** What the random intercept and the random slope model share: degrees of freedom, and coefficients in the units of the data. */

import type { UpperTriangle } from '../linear-algebra/orthogonal-triangle.ts';
import type { TestFigures } from '../result.ts';
import { tFigures } from '../test-figures.ts';
import type { Coefficient } from './coefficient.ts';
import { interceptName, tCoefficient } from './coefficient.ts';

export interface MixedCoefficient extends Coefficient {
  readonly test: TestFigures;
  /** Inner-outer degrees of freedom, used for interval and test. */
  readonly df: number;
}

export interface Scale {
  readonly mean: number;
  readonly norm: number;
}

/**
 * Degrees of freedom by the inner-outer rule. Intercept and predictors that vary within clusters: rows - clusters - (predictors varying
 * within); predictors constant within clusters: clusters - (those, the intercept counted).
 * Source: Pinheiro & Bates (2000) Mixed-Effects Models in S and S-PLUS, section 2.4.2.
 */
export function innerOuterDf(
  rows: number,
  clusters: number,
  variesWithin: readonly boolean[],
): { readonly inner: number; readonly outer: number } {
  const inner = variesWithin.filter(Boolean).length;
  return { inner: rows - clusters - inner, outer: clusters - (variesWithin.length + 1 - inner) };
}

/**
 * Rows that turn scaled coefficients (and the inverse triangle) into coefficients in the units of the data. The scaled design has the
 * constant 1/sqrt(rows) and predictors centred and divided by their length.
 */
export function toOriginalUnits(rows: number, predictors: readonly Scale[]): number[][] {
  const order = predictors.length + 1;
  return Array.from({ length: order }, (_, i) =>
    Array.from({ length: order }, (_, j) => {
      if (j === 0) return i === 0 ? 1 / Math.sqrt(rows) : 0;
      const { mean, norm } = predictors[j - 1] as Scale;
      if (i === 0) return -mean / norm;
      return i === j ? 1 / norm : 0;
    }),
  );
}

/** ln determinant that scaling took from X'V^-1 X. */
export function logScale(rows: number, predictors: readonly Scale[]): number {
  return predictors.reduce((sum, { norm }) => sum + 2 * Math.log(norm), Math.log(rows));
}

/**
 * One row of `toOriginalUnits` in the coordinates where X'V^-1 X is the identity: its squared length times the residual variance is a
 * variance.
 */
export function whitenedRow(row: readonly number[], inverse: UpperTriangle): number[] {
  return row.map((_, k) => row.reduce((sum, factor, j) => sum + factor * (inverse.entries[k * inverse.size + j] as number), 0));
}

export interface ScaledSolution {
  /** Intercept first. */
  readonly coefficients: Float64Array;
  readonly inverse: UpperTriangle;
  readonly rows: number;
  readonly outcome: Scale;
  readonly predictors: readonly Scale[];
  readonly variesWithin: readonly boolean[];
  /** In the units of the data. */
  readonly varianceResidual: number;
}

/** The table of coefficients, intercept first. */
export function mixedCoefficients(solution: ScaledSolution, names: readonly string[], clusters: number, level: number): MixedCoefficient[] {
  const { rows, outcome, predictors, variesWithin, varianceResidual } = solution;
  const { inner, outer } = innerOuterDf(rows, clusters, variesWithin);
  return toOriginalUnits(rows, predictors).map((row, i) => {
    const scaled = row.reduce((sum, factor, j) => sum + factor * (solution.coefficients[j] as number), 0);
    const estimate = scaled * outcome.norm + (i === 0 ? outcome.mean : 0);
    const standardError = Math.sqrt(varianceResidual * whitenedRow(row, solution.inverse).reduce((sum, value) => sum + value * value, 0));
    const df = i === 0 || variesWithin[i - 1] === true ? inner : outer;
    const name = i === 0 ? interceptName : (names[i - 1] as string);
    return { ...tCoefficient({ name, estimate, standardError }, df, level, true), test: tFigures(estimate / standardError, df), df };
  });
}
