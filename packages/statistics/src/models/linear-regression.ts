/**
 * Multiple linear regression by least squares (Householder QR on centred columns), t intervals and tests, and means predicted from it.
 *
 * p-values are given only from 10 participants per predictor on. Where the predictors reproduce the outcome to rounding there is no error
 * to test against: the coefficients are given without tests and without a likelihood.
 *
 * Source: Seber & Lee (2003) Linear Regression Analysis, 2nd ed., chapters 3 to 5. Held to the NIST certified regression sets.
 */

import { completeRows } from '../complete-rows.ts';
import { tMultiplier } from '../distributions/student-t.ts';
import type { Interval, NotEstimable, Provenance, TestFigures } from '../result.ts';
import { notEstimable, reasons, requireLevel, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { fFigures, percentText } from '../test-figures.ts';
import type { Coefficient } from './coefficient.ts';
import { interceptName, neededPerCoefficient, tCoefficient } from './coefficient.ts';
import type { FittedLeastSquares, UnfitLeastSquares } from './least-squares.ts';
import { fitLeastSquares, fittedMean } from './least-squares.ts';
import type { Predictor } from './predictor.ts';

export interface LinearModel extends Provenance {
  readonly kind: 'linear-model';
  /** Intercept first, unless the model goes through the origin. */
  readonly coefficients: readonly Coefficient[];
  readonly residualSd: number;
  readonly residualDf: number;
  readonly residualSumOfSquares: number;
  /** Share of the sum of squares (about the mean; about zero through the origin) that the predictors explain. */
  readonly rSquared: number;
  readonly adjustedRSquared: number;
  /** All predictors together; absent where p is not shown. */
  readonly overallTest?: TestFigures;
  /** Of normal errors; absent when the fit is exact. */
  readonly likelihood?: { readonly logLikelihood: number; readonly aic: number; readonly bic: number };
  /** What predictions are computed from. */
  readonly fit: FittedLeastSquares;
}

export interface LinearRegressionInput {
  readonly outcome: ArrayLike<Observation>;
  readonly predictors: readonly Predictor[];
  readonly throughOrigin?: boolean;
  readonly level?: number;
}

export function tooFewParticipants(n: number, coefficients: number): string {
  return `too few participants for this model (n = ${n}, ${coefficients} coefficients)`;
}

export function reasonForUnfit(unfit: UnfitLeastSquares, names: readonly string[]): string {
  switch (unfit.kind) {
    case 'constant-outcome':
      return reasons.allEqual;
    case 'constant-predictor':
      return `${names[unfit.column]} does not vary`;
    case 'dependent-predictor':
      return `${names[unfit.column]} is determined by the predictors before it`;
    case 'out-of-range':
      return unfit.reason;
  }
}

/** Standard error of each coefficient of a fit, intercept first. */
export function standardErrors(fit: FittedLeastSquares): number[] {
  const variance = fit.residualSumOfSquares / fit.residualDf;
  const slopes = fit.slopeFactor.map((row, j) => Math.sqrt(row[j] as number));
  const atZero = Math.sqrt(
    fittedMean(
      fit,
      fit.slopes.map(() => 0),
    ).varianceFactor,
  );
  return (fit.throughOrigin ? slopes : [atZero, ...slopes]).map((factor) => factor * Math.sqrt(variance));
}

/** The table of coefficients of a fit; tests only when `tested`. */
export function coefficientsOf(fit: FittedLeastSquares, names: readonly string[], level: number, tested: boolean): Coefficient[] {
  const estimates = fit.throughOrigin ? fit.slopes : [fit.intercept, ...fit.slopes];
  const allNames = fit.throughOrigin ? names : [interceptName, ...names];
  return standardErrors(fit).map((standardError, j) =>
    tCoefficient({ name: allNames[j] as string, estimate: estimates[j] as number, standardError }, fit.residualDf, level, tested),
  );
}

function likelihoodOf(fit: FittedLeastSquares): NonNullable<LinearModel['likelihood']> {
  const logLikelihood = (-fit.n / 2) * (Math.log(2 * Math.PI) + Math.log(fit.residualSumOfSquares / fit.n) + 1);
  // The residual variance is a parameter too.
  const parameters = fit.n - fit.residualDf + 1;
  return { logLikelihood, aic: 2 * parameters - 2 * logLikelihood, bic: Math.log(fit.n) * parameters - 2 * logLikelihood };
}

export function linearRegression({
  outcome,
  predictors,
  throughOrigin = false,
  level = 0.95,
}: LinearRegressionInput): LinearModel | NotEstimable {
  requireLevel(level);
  if (predictors.length === 0) throw new RangeError('A regression needs at least one predictor.');
  const { columns, n, leftOut } = completeRows([outcome, ...predictors.map((predictor) => predictor.values)]);
  const basis = { n, leftOut };
  if (n === 0) return notEstimable(reasons.noData, basis);
  const names = predictors.map((predictor) => predictor.name);
  const coefficientCount = names.length + (throughOrigin ? 0 : 1);
  if (n - coefficientCount < 1) return notEstimable(tooFewParticipants(n, coefficientCount), basis);
  const fit = fitLeastSquares(columns[0] as Float64Array, columns.slice(1), throughOrigin);
  if (fit.kind !== 'fitted') return notEstimable(reasonForUnfit(fit, names), basis);

  const exact = fit.residualSumOfSquares === 0;
  const enough = n >= neededPerCoefficient * names.length;
  const explained = fit.sequentialSumsOfSquares.reduce((sum, square) => sum + square, 0);
  const unexplainedShare = fit.residualSumOfSquares / fit.totalSumOfSquares;
  const meanSquare = fit.residualSumOfSquares / fit.residualDf;
  return {
    kind: 'linear-model',
    ...basis,
    coefficients: coefficientsOf(fit, names, level, enough),
    residualSd: Math.sqrt(meanSquare),
    residualDf: fit.residualDf,
    residualSumOfSquares: fit.residualSumOfSquares,
    rSquared: 1 - unexplainedShare,
    adjustedRSquared: 1 - (unexplainedShare * (n - (throughOrigin ? 0 : 1))) / fit.residualDf,
    ...(exact ? {} : { likelihood: likelihoodOf(fit) }),
    ...(exact || !enough ? {} : { overallTest: fFigures(explained / names.length / meanSquare, names.length, fit.residualDf) }),
    fit,
    method: `Linear regression by least squares${throughOrigin ? ' through the origin' : ''}, t intervals and tests (two-sided, ${percentText(level)}).`,
    failedAssumptions: [
      ...verySmallSample(n),
      ...(enough ? [] : [`${tooFewParticipants(n, coefficientCount)}: no p-values`]),
      ...(exact ? ['the predictors reproduce the outcome exactly: no standard errors, no tests'] : []),
    ],
  };
}

export interface Prediction {
  readonly mean: number;
  readonly standardError: number;
  /** For the mean of all participants with these predictor values. */
  readonly confidence: Interval;
  /** For one further participant with these predictor values. */
  readonly prediction: Interval;
}

/** Mean predicted by a model at predictor values in the order of its predictors. */
export function predictedMean(model: LinearModel, at: readonly number[], level = 0.95): Prediction {
  requireLevel(level);
  if (at.length !== model.fit.slopes.length || !at.every(Number.isFinite))
    throw new RangeError('A prediction needs one finite value for each predictor.');
  const { mean, varianceFactor } = fittedMean(model.fit, at);
  const multiplier = tMultiplier(level, model.residualDf);
  const around = (standardError: number): Interval => ({
    lower: mean - multiplier * standardError,
    upper: mean + multiplier * standardError,
    level,
  });
  const standardError = model.residualSd * Math.sqrt(varianceFactor);
  return {
    mean,
    standardError,
    confidence: around(standardError),
    prediction: around(model.residualSd * Math.sqrt(1 + varianceFactor)),
  };
}
