/**
 * Least squares by Householder QR on columns that were centred on their means and scaled to unit length. Numbers only: the printed
 * models (linear regression, ANCOVA) are built on it.
 *
 * Source: Golub & Van Loan (2013), Matrix Computations, 4th ed., section 5.3.2. Normal equations are not formed.
 */

import type { CentredColumn } from '../linear-algebra/centred-column.ts';
import { centredColumn, rangeObstacle } from '../linear-algebra/centred-column.ts';
import { inverseCrossProduct, invertTriangle, orthogonalTriangle, solveAgainstColumn } from '../linear-algebra/orthogonal-triangle.ts';

export interface FittedLeastSquares {
  readonly kind: 'fitted';
  /** 0 when the model goes through the origin. */
  readonly intercept: number;
  readonly slopes: readonly number[];
  /** Means of the predictors; all 0 through the origin. */
  readonly predictorMeans: readonly number[];
  /** (X'X)^-1 of the centred predictors: times the residual variance it is the covariance of the slopes. */
  readonly slopeFactor: readonly (readonly number[])[];
  /** What each predictor in turn, after those before it, takes out of the sum of squares. */
  readonly sequentialSumsOfSquares: readonly number[];
  /** 0 exactly when what is left cannot be told from rounding. */
  readonly residualSumOfSquares: number;
  /** About the mean; about zero through the origin. */
  readonly totalSumOfSquares: number;
  readonly residualDf: number;
  readonly n: number;
  readonly throughOrigin: boolean;
}

/** Why there is no fit. `column`: the first predictor that does not vary, or that the predictors before it determine. */
export type UnfitLeastSquares =
  | { readonly kind: 'constant-predictor' | 'dependent-predictor'; readonly column: number }
  | { readonly kind: 'constant-outcome' }
  | { readonly kind: 'out-of-range'; readonly reason: string };

/**
 * A predictor whose part not explained by those before it is below this share of its length counts as determined by them (R uses the
 * same).
 */
export const rankTolerance = 1e-7;

/** Residuals of this many units of rounding of the largest outcome are taken as none. */
const roundingUnits = 64;

export function fitLeastSquares(
  outcome: Float64Array,
  predictors: readonly Float64Array[],
  throughOrigin = false,
): FittedLeastSquares | UnfitLeastSquares {
  const n = outcome.length;
  const order = predictors.length;
  const y = centredColumn(outcome, !throughOrigin);
  const columns = predictors.map((predictor) => centredColumn(predictor, !throughOrigin));
  const outOfRange = rangeObstacle([y, ...columns]);
  if (outOfRange !== undefined) return { kind: 'out-of-range', reason: outOfRange };
  if (y.norm === 0) return { kind: 'constant-outcome' };
  const flat = columns.findIndex((column) => column.norm === 0);
  if (flat >= 0) return { kind: 'constant-predictor', column: flat };

  const triangle = orthogonalTriangle([...columns.map((column) => column.unit), y.unit]);
  const { size, entries } = triangle;
  const dependent = columns.findIndex((_, j) => Math.abs(entries[j * size + j] as number) < rankTolerance);
  if (dependent >= 0) return { kind: 'dependent-predictor', column: dependent };

  const norm = (j: number): number => (columns[j] as CentredColumn).norm;
  const slopes = Array.from(solveAgainstColumn(triangle, order, order), (value, j) => (value * y.norm) / norm(j));
  const factor = inverseCrossProduct(invertTriangle(triangle, order));
  const residualLength = Math.abs(entries[order * size + order] as number) * y.norm;
  let largest = 0;
  for (let i = 0; i < n; i++) largest = Math.max(largest, Math.abs(outcome[i] as number));
  const exact = residualLength <= roundingUnits * Number.EPSILON * largest * Math.sqrt(n);
  return {
    kind: 'fitted',
    intercept: throughOrigin ? 0 : slopes.reduce((rest, slope, j) => rest - slope * (columns[j] as CentredColumn).mean, y.mean),
    slopes,
    predictorMeans: columns.map((column) => column.mean),
    slopeFactor: factor.map((row, i) => row.map((value, j) => value / (norm(i) * norm(j)))),
    sequentialSumsOfSquares: columns.map((_, j) => ((entries[order * size + j] as number) * y.norm) ** 2),
    residualSumOfSquares: exact ? 0 : residualLength ** 2,
    totalSumOfSquares: y.norm ** 2,
    residualDf: n - order - (throughOrigin ? 0 : 1),
    n,
    throughOrigin,
  };
}

/** Fitted mean at a set of predictor values and the factor that, times the residual variance, is its variance. */
export function fittedMean(fit: FittedLeastSquares, at: readonly number[]): { readonly mean: number; readonly varianceFactor: number } {
  const distance = at.map((value, j) => value - (fit.predictorMeans[j] as number));
  const spread = fit.slopeFactor.reduce(
    (sum, row, i) => sum + (distance[i] as number) * row.reduce((inner, value, j) => inner + value * (distance[j] as number), 0),
    0,
  );
  return {
    mean: at.reduce((sum, value, j) => sum + (fit.slopes[j] as number) * value, fit.intercept),
    varianceFactor: (fit.throughOrigin ? 0 : 1 / fit.n) + spread,
  };
}
