/**
 * Proportional hazards regression by partial likelihood with Efron's treatment of tied events: Newton steps with halving. Hazard ratios
 * with Wald intervals, score and likelihood ratio tests of all covariates.
 *
 * Where some combination of covariates is highest (or lowest) at every event the likelihood has no maximum: the linear predictor keeps
 * moving by about one at every step instead of settling, and the answer says so.
 *
 * Source: Cox (1972) J R Stat Soc B 34:187-220; Efron (1977) J Am Stat Assoc 72:557-565; Therneau & Grambsch (2000) Modeling Survival
 * Data, ch. 3.
 */

import type { CentredColumn } from '../linear-algebra/centred-column.ts';
import { centredColumn, rangeObstacle } from '../linear-algebra/centred-column.ts';
import { symmetricSolver } from '../linear-algebra/solve-symmetric.ts';
import type { Coefficient } from '../models/coefficient.ts';
import { neededPerCoefficient, waldCoefficient } from '../models/coefficient.ts';
import type { Predictor } from '../models/predictor.ts';
import type { NotEstimable, Provenance, TestFigures } from '../result.ts';
import { notEstimable, reasons, requireLevel } from '../result.ts';
import { chiSquareFigures, percentText } from '../test-figures.ts';
import type { FollowUp } from './follow-up.ts';
import { cleanFollowUp, orderOfTime } from './follow-up.ts';

/**
 * Coefficient on the log hazard scale, and the same as a hazard ratio with its limits: Infinity where the ratio for one unit is beyond a
 * double.
 */
export interface CoxCoefficient extends Coefficient {
  readonly hazardRatio: number;
  readonly hazardRatioLower: number;
  readonly hazardRatioUpper: number;
}

export interface CoxModel extends Provenance {
  readonly kind: 'cox-model';
  readonly events: number;
  readonly coefficients: readonly CoxCoefficient[];
  /** Partial log likelihood without and with the covariates. */
  readonly nullLogLikelihood: number;
  readonly logLikelihood: number;
  readonly scoreTest: TestFigures;
  readonly likelihoodRatioTest: TestFigures;
}

export interface CoxInput extends FollowUp {
  readonly predictors: readonly Predictor[];
  readonly level?: number;
}

interface PartialLikelihood {
  readonly log: number;
  readonly score: readonly number[];
  readonly information: readonly (readonly number[])[];
}

const mostSteps = 40;
const smallestChange = 1e-9;

/** Information below this share of what there was without covariates is rounding: the likelihood has gone flat. */
const flatShare = 1e-9;

/** Log, first derivatives and minus the second, from the last time backwards so that the sums over those at risk only grow. */
function partialLikelihood(
  order: Int32Array,
  time: Float64Array,
  event: Float64Array,
  columns: readonly Float64Array[],
  coefficients: readonly number[],
): PartialLikelihood {
  const p = columns.length;
  const score = new Float64Array(p);
  const information = Array.from({ length: p }, () => new Float64Array(p));
  const [risk1, tied1] = [new Float64Array(p), new Float64Array(p)];
  const [risk2, tied2] = [new Float64Array(p * p), new Float64Array(p * p)];
  const mean = new Float64Array(p);
  let [log, risk0] = [0, 0];
  const at = (values: ArrayLike<number>, i: number): number => values[i] as number;
  for (let end = order.length; end > 0;) {
    const now = at(time, at(order, end - 1));
    let [tied0, events, start] = [0, 0, end];
    tied1.fill(0);
    tied2.fill(0);
    for (; start > 0 && time[at(order, start - 1)] === now; start--) {
      const row = at(order, start - 1);
      let linear = 0;
      for (let j = 0; j < p; j++) linear += at(coefficients, j) * at(columns[j] as Float64Array, row);
      const weight = Math.exp(linear);
      const died = event[row] === 1;
      risk0 += weight;
      if (died) {
        events++;
        log += linear;
        tied0 += weight;
      }
      for (let j = 0; j < p; j++) {
        const x = at(columns[j] as Float64Array, row);
        risk1[j] = at(risk1, j) + weight * x;
        if (died) {
          score[j] = at(score, j) + x;
          tied1[j] = at(tied1, j) + weight * x;
        }
        for (let k = 0; k <= j; k++) {
          const product = weight * x * at(columns[k] as Float64Array, row);
          risk2[j * p + k] = at(risk2, j * p + k) + product;
          if (died) tied2[j * p + k] = at(tied2, j * p + k) + product;
        }
      }
    }
    // Efron: the tied events leave one after the other, each in turn with the average weight of those that are tied.
    for (let gone = 0; gone < events; gone++) {
      const share = gone / events;
      const total = risk0 - share * tied0;
      log -= Math.log(total);
      for (let j = 0; j < p; j++) {
        mean[j] = (at(risk1, j) - share * at(tied1, j)) / total;
        score[j] = at(score, j) - at(mean, j);
      }
      for (let j = 0; j < p; j++) {
        for (let k = 0; k <= j; k++) {
          const spread = (at(risk2, j * p + k) - share * at(tied2, j * p + k)) / total - at(mean, j) * at(mean, k);
          (information[j] as Float64Array)[k] = at(information[j] as Float64Array, k) + spread;
        }
      }
    }
    end = start;
  }
  return {
    log,
    score: [...score],
    information: information
      .map((row, j) => row.map((value, k) => (k <= j ? value : at(information[k] as Float64Array, j))))
      .map((row) => [...row]),
  };
}

export function coxRegression({ time, event, predictors, level = 0.95 }: CoxInput): CoxModel | NotEstimable {
  requireLevel(level);
  if (predictors.length === 0) throw new RangeError('A regression needs at least one predictor.');
  const clean = cleanFollowUp(
    { time, event },
    [],
    predictors.map((predictor) => predictor.values),
  );
  const basis = { n: clean.n, leftOut: clean.leftOut };
  if (clean.n === 0) return notEstimable(reasons.noData, basis);
  const events = clean.event.reduce((sum, value) => sum + value, 0);
  if (events === 0) return notEstimable('no event was seen', basis);
  const scaled = clean.covariates.map((column) => standardised(column));
  const flat = scaled.findIndex((column) => column.norm === 0);
  if (flat >= 0) return notEstimable(`${predictors[flat]?.name} does not vary`, basis);
  const outOfRange = rangeObstacle(scaled);
  if (outOfRange !== undefined) return notEstimable(outOfRange, basis);

  const order = orderOfTime(clean.time);
  const columns = scaled.map((column) => column.unit);
  const likelihoodAt = (b: readonly number[]): PartialLikelihood => partialLikelihood(order, clean.time, clean.event, columns, b);
  const start = likelihoodAt(predictors.map(() => 0));
  const startSolver = symmetricSolver(start.information);
  if (startSolver === undefined)
    return notEstimable('the covariates do not vary, or determine each other, among those at risk when events came', basis);
  const found = maximise(start, columns, likelihoodAt);
  if (found === undefined) {
    return notEstimable(
      'a covariate orders the events without exception, so no hazard ratio can be estimated; show the curves and the log-rank test',
      basis,
    );
  }
  const covariance = found.inverse;
  const enough = events >= neededPerCoefficient * predictors.length;
  return {
    kind: 'cox-model',
    ...basis,
    events,
    coefficients: predictors.map(({ name }, j): CoxCoefficient => {
      const { norm } = scaled[j] as CentredColumn;
      const coefficient = waldCoefficient(
        { name, estimate: (found.coefficients[j] as number) / norm, standardError: Math.sqrt(covariance[j]?.[j] as number) / norm },
        level,
      );
      return {
        ...coefficient,
        hazardRatio: Math.exp(coefficient.estimate),
        hazardRatioLower: Math.exp(coefficient.interval.lower),
        hazardRatioUpper: Math.exp(coefficient.interval.upper),
      };
    }),
    nullLogLikelihood: start.log,
    logLikelihood: found.log,
    scoreTest: chiSquareFigures(
      startSolver.solve(start.score).reduce((sum, value, j) => sum + value * (start.score[j] as number), 0),
      predictors.length,
    ),
    likelihoodRatioTest: chiSquareFigures(Math.max(0, 2 * (found.log - start.log)), predictors.length),
    method: `Cox proportional hazards regression, Efron's method for ties, Wald intervals, score and likelihood ratio tests (two-sided, ${percentText(level)}).`,
    failedAssumptions: enough ? [] : [`fewer than ${neededPerCoefficient} events for each covariate (${events} events)`],
  };
}

/** Centred and divided by the standard deviation, so that a step of one means the same for every covariate. */
function standardised(values: Float64Array): CentredColumn {
  const { mean, norm, unit } = centredColumn(values, true);
  const root = Math.sqrt(values.length);
  return { mean, norm: norm / root, unit: unit.map((value) => value * root) };
}

interface Maximum {
  readonly log: number;
  readonly coefficients: readonly number[];
  readonly inverse: readonly (readonly number[])[];
}

/** `undefined` when the likelihood has no maximum. */
function maximise(
  start: PartialLikelihood,
  columns: readonly Float64Array[],
  likelihoodAt: (b: readonly number[]) => PartialLikelihood,
): Maximum | undefined {
  let coefficients: readonly number[] = columns.map(() => 0);
  let current = start;
  const widest = columns.map((column) => column.reduce((most, value) => Math.max(most, Math.abs(value)), 0));
  for (let step = 0; step < mostSteps; step++) {
    const solver = symmetricSolver(current.information);
    const flat = current.information.some((row, j) => !((row[j] as number) > flatShare * (start.information[j]?.[j] as number)));
    if (solver === undefined || flat) return undefined;
    const direction = solver.solve(current.score);
    const change = direction.reduce((sum, value, j) => sum + Math.abs(value) * (widest[j] as number), 0);
    if (change < smallestChange) return { log: current.log, coefficients, inverse: solver.inverse() };
    let share = 1;
    let next: PartialLikelihood;
    let moved: readonly number[];
    do {
      const scale = share;
      moved = coefficients.map((value, j) => value + scale * (direction[j] as number));
      next = likelihoodAt(moved);
      share /= 2;
      // A loss within rounding is none.
    } while (!(next.log >= current.log - 1e-12 * Math.abs(current.log)) && share > 1e-6);
    if (!Number.isFinite(next.log)) return undefined;
    coefficients = moved;
    current = next;
  }
  return undefined;
}
