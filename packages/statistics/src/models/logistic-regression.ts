/**
 * Logistic regression by maximum likelihood: Newton steps, each a weighted least squares problem solved by Householder QR, with halving
 * of a step that would lower the likelihood. Odds ratios with Wald intervals.
 *
 * Separation: when some combination of predictors divides those with the event from those without, the likelihood has no maximum and
 * every step moves some fitted log odds by about one more, for ever; where a maximum exists the steps shrink quadratically. So the
 * criterion is that the largest change of any log odds vanishes, not that the deviance stands still (which it also does under
 * separation).
 *
 * Needs at least 10 people with and 10 without the event for each predictor; otherwise counts and Fisher's test are to be shown.
 *
 * Source: Agresti (2002) Categorical Data Analysis, 2nd ed., sections 4.6 and 5.5; Albert & Anderson (1984) Biometrika 71:1-10
 * (separation).
 */

import { completeRows } from '../complete-rows.ts';
import type { CentredColumn } from '../linear-algebra/centred-column.ts';
import { centredColumn } from '../linear-algebra/centred-column.ts';
import type { UpperTriangle } from '../linear-algebra/orthogonal-triangle.ts';
import { inverseCrossProduct, invertTriangle, orthogonalTriangle, solveAgainstColumn } from '../linear-algebra/orthogonal-triangle.ts';
import type { NotEstimable, Provenance, TestFigures } from '../result.ts';
import { notEstimable, reasons, requireLevel } from '../result.ts';
import type { Observation } from '../samples.ts';
import { chiSquareFigures, percentText } from '../test-figures.ts';
import { areaUnderCurve } from './area-under-curve.ts';
import type { Coefficient } from './coefficient.ts';
import { interceptName, neededPerCoefficient, waldCoefficient } from './coefficient.ts';
import type { Predictor } from './predictor.ts';
import { unusablePredictor } from './unusable-predictor.ts';

/**
 * Coefficient on the log odds scale, and the same as an odds ratio with its limits: Infinity where the ratio for one unit is beyond a
 * double.
 */
export interface LogisticCoefficient extends Coefficient {
  readonly oddsRatio: number;
  readonly oddsRatioLower: number;
  readonly oddsRatioUpper: number;
}

export interface LogisticModel extends Provenance {
  readonly kind: 'logistic-model';
  readonly events: number;
  readonly coefficients: readonly LogisticCoefficient[];
  readonly deviance: number;
  /** Of the model with the intercept alone. */
  readonly nullDeviance: number;
  readonly residualDf: number;
  readonly aic: number;
  /** All predictors together, by the likelihood ratio. */
  readonly overallTest: TestFigures;
  /** Chance that of two people the one with the event has the higher fitted probability. */
  readonly areaUnderCurve: number;
  /** Mean squared distance of fitted probability and outcome (Brier score). */
  readonly brierScore: number;
}

const mostSteps = 50;
const smallestChange = 1e-9;

/** log(1 + exp(x)) without overflow. */
function softplus(x: number): number {
  return x > 0 ? x + Math.log1p(Math.exp(-x)) : Math.log1p(Math.exp(x));
}

function devianceOf(logOdds: Float64Array, outcome: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < outcome.length; i++) sum += softplus(outcome[i] === 1 ? -(logOdds[i] as number) : (logOdds[i] as number));
  return 2 * sum;
}

interface Converged {
  /** In the scaled columns, intercept first. */
  readonly coefficients: Float64Array;
  readonly logOdds: Float64Array;
  readonly triangle: UpperTriangle;
}

/** One Newton step: the triangle of the weighted columns, with the weighted residuals as last column. */
function weightedTriangle(columns: readonly Float64Array[], logOdds: Float64Array, outcome: Float64Array): UpperTriangle {
  const n = outcome.length;
  const roots = new Float64Array(n);
  const residuals = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    const half = Math.exp(-Math.abs(logOdds[i] as number) / 2);
    // sqrt(p (1 - p)) and (y - p)/sqrt(p (1 - p)), written so that neither loses digits near 0 and 1.
    roots[i] = half / (1 + half * half);
    const towards = outcome[i] === 1 ? -(logOdds[i] as number) : (logOdds[i] as number);
    residuals[i] = (outcome[i] === 1 ? 1 : -1) * Math.exp(towards / 2);
  }
  const weighted = columns.map((column) => column.map((value, i) => value * (roots[i] as number)));
  return orthogonalTriangle([...weighted, residuals]);
}

/** `undefined` when the likelihood has no maximum. */
function maximise(columns: readonly Float64Array[], outcome: Float64Array, start: number): Converged | undefined {
  const order = columns.length;
  let coefficients = new Float64Array(order);
  coefficients[0] = start;
  const logOddsOf = (b: Float64Array): Float64Array => {
    const logOdds = new Float64Array(outcome.length);
    for (const [j, column] of columns.entries()) {
      const value = b[j] as number;
      for (let i = 0; i < logOdds.length; i++) logOdds[i] = (logOdds[i] as number) + value * (column[i] as number);
    }
    return logOdds;
  };
  let logOdds = logOddsOf(coefficients);
  let deviance = devianceOf(logOdds, outcome);
  for (let step = 0; step < mostSteps; step++) {
    const triangle = weightedTriangle(columns, logOdds, outcome);
    const direction = solveAgainstColumn(triangle, order, order);
    if (!direction.every(Number.isFinite)) return undefined;
    let share = 1;
    let next = logOdds;
    let nextCoefficients = coefficients;
    let nextDeviance = Infinity;
    // A rise within rounding is none.
    while (nextDeviance > deviance * (1 + 1e-12) + 1e-12 && share > 1e-6) {
      const scale = share;
      nextCoefficients = coefficients.map((value, j) => value + scale * (direction[j] as number));
      next = logOddsOf(nextCoefficients);
      nextDeviance = devianceOf(next, outcome);
      share /= 2;
    }
    let change = 0;
    for (let i = 0; i < next.length; i++) change = Math.max(change, Math.abs((next[i] as number) - (logOdds[i] as number)));
    coefficients = nextCoefficients;
    logOdds = next;
    deviance = nextDeviance;
    if (change < smallestChange) return { coefficients, logOdds, triangle: weightedTriangle(columns, logOdds, outcome) };
  }
  return undefined;
}

export interface LogisticRegressionInput {
  /** 1 with the event, 0 without. */
  readonly outcome: ArrayLike<Observation>;
  readonly predictors: readonly Predictor[];
  readonly level?: number;
}

export function logisticRegression({ outcome, predictors, level = 0.95 }: LogisticRegressionInput): LogisticModel | NotEstimable {
  requireLevel(level);
  if (predictors.length === 0) throw new RangeError('A regression needs at least one predictor.');
  const { columns, n, leftOut } = completeRows([outcome, ...predictors.map((predictor) => predictor.values)]);
  const basis = { n, leftOut };
  const events = columns[0] as Float64Array;
  if (!events.every((value) => value === 0 || value === 1)) throw new RangeError('The outcome of a logistic regression is 0 or 1.');
  if (n === 0) return notEstimable(reasons.noData, basis);
  const eventCount = events.reduce((sum, value) => sum + value, 0);
  const scarcer = Math.min(eventCount, n - eventCount);
  if (scarcer < neededPerCoefficient * predictors.length) {
    return notEstimable(
      `too few participants for this model (${eventCount} with and ${n - eventCount} without the event, ${predictors.length} predictors): show counts and Fisher's test`,
      basis,
    );
  }
  const names = predictors.map((predictor) => predictor.name);
  const scaled = columns.slice(1).map((column) => centredColumn(column, true));
  const refused = unusablePredictor(scaled, names);
  if (refused !== undefined) return notEstimable(refused, basis);

  const constant = new Float64Array(n).fill(1);
  const found = maximise([constant, ...scaled.map((column) => column.unit)], events, Math.log(eventCount / (n - eventCount)));
  if (found === undefined) {
    return notEstimable(
      "separation: the predictors divide those with the event from those without, so no odds ratio can be estimated; show counts and Fisher's test",
      basis,
    );
  }
  const { logOdds } = found;
  const deviance = devianceOf(logOdds, events);
  const nullDeviance = -2 * (eventCount * Math.log(eventCount / n) + (n - eventCount) * Math.log(1 - eventCount / n));
  return {
    kind: 'logistic-model',
    ...basis,
    events: eventCount,
    coefficients: coefficientsOf(found, scaled, names, level),
    deviance,
    nullDeviance,
    residualDf: n - names.length - 1,
    aic: deviance + 2 * (names.length + 1),
    overallTest: chiSquareFigures(Math.max(0, nullDeviance - deviance), names.length),
    areaUnderCurve: areaUnderCurve(logOdds, events),
    brierScore: logOdds.reduce((sum, value, i) => sum + (1 / (1 + Math.exp(-value)) - (events[i] as number)) ** 2, 0) / n,
    method: `Logistic regression by maximum likelihood, Wald intervals and tests, likelihood ratio test of all predictors (two-sided, ${percentText(level)}).`,
    failedAssumptions: [],
  };
}

/** From the scaled columns back to the units of the predictors. */
function coefficientsOf(
  found: Converged,
  columns: readonly CentredColumn[],
  names: readonly string[],
  level: number,
): LogisticCoefficient[] {
  const covariance = inverseCrossProduct(invertTriangle(found.triangle, names.length + 1));
  // The intercept is the scaled one less what the predictors' means carry.
  const atZero = [1, ...columns.map((column) => -column.mean / column.norm)];
  const intercept = atZero.reduce((sum, factor, j) => sum + factor * (found.coefficients[j] as number), 0);
  const interceptVariance = atZero.reduce(
    (sum, factor, i) => sum + factor * atZero.reduce((inner, other, j) => inner + other * (covariance[i]?.[j] as number), 0),
    0,
  );
  const uncertain = [
    { name: interceptName, estimate: intercept, standardError: Math.sqrt(interceptVariance) },
    ...columns.map((column, j) => ({
      name: names[j] as string,
      estimate: (found.coefficients[j + 1] as number) / column.norm,
      standardError: Math.sqrt(covariance[j + 1]?.[j + 1] as number) / column.norm,
    })),
  ];
  return uncertain.map((line) => {
    const coefficient = waldCoefficient(line, level);
    return {
      ...coefficient,
      oddsRatio: Math.exp(coefficient.estimate),
      oddsRatioLower: Math.exp(coefficient.interval.lower),
      oddsRatioUpper: Math.exp(coefficient.interval.upper),
    };
  });
}
