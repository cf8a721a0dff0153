/**
 * Linear model in which each cluster (participant) has its own intercept and its own slope on one predictor (time), with any correlation
 * of the two, by restricted maximum likelihood (REML). Degrees of freedom of t by the inner-outer rule.
 *
 * Needs at least 5 clusters and more rows than the two random effects of all clusters together.
 *
 * Source: Laird & Ware (1982) Biometrics 38:963-974; Pinheiro & Bates (2000) Mixed-Effects Models in S and S-PLUS, chapters 1 and 2.
 */

import type { Label } from '../complete-rows.ts';
import { completeRows } from '../complete-rows.ts';
import type { CentredColumn } from '../linear-algebra/centred-column.ts';
import { centredColumn, rangeObstacle } from '../linear-algebra/centred-column.ts';
import type { NotEstimable, Provenance } from '../result.ts';
import { notEstimable, reasons, requireLevel } from '../result.ts';
import type { Observation } from '../samples.ts';
import { percentText } from '../test-figures.ts';
import { tooFewParticipants } from './linear-regression.ts';
import { minimiseSmooth } from './minimise-smooth.ts';
import type { MixedCoefficient } from './mixed-coefficients.ts';
import { innerOuterDf, logScale, mixedCoefficients } from './mixed-coefficients.ts';
import type { Predictor } from './predictor.ts';
import type { RelativeFactor } from './random-slope-likelihood.ts';
import { slopeDesign, slopeLikelihood } from './random-slope-likelihood.ts';
import { unusablePredictor } from './unusable-predictor.ts';

export interface RandomSlopeModel extends Provenance {
  readonly kind: 'random-slope-model';
  readonly clusters: number;
  /** Intercept, the predictor with the random slope, then the others. */
  readonly coefficients: readonly MixedCoefficient[];
  /** Of the clusters' intercepts, where the predictor with the random slope is 0. */
  readonly varianceIntercept: number;
  readonly varianceSlope: number;
  readonly covariance: number;
  readonly varianceResidual: number;
  /** Restricted log likelihood with all constants. */
  readonly logLikelihood: number;
}

export interface RandomSlopeInput {
  readonly outcome: ArrayLike<Observation>;
  /** The predictor whose slope differs from cluster to cluster, usually time; it is also the first fixed predictor. */
  readonly slope: Predictor;
  readonly predictors: readonly Predictor[];
  readonly cluster: ArrayLike<Label>;
  readonly level?: number;
}

const fewestClusters = 5;

/** A relative standard deviation below this, or a correlation this close to 1, lies on the edge of what is possible. */
const edge = 1e-4;

/** Rows of each cluster. */
function membersOf(codes: Int32Array, clusters: number): Int32Array[] {
  const rows: number[][] = Array.from({ length: clusters }, () => []);
  for (const [i, code] of codes.entries()) (rows[code] as number[]).push(i);
  return rows.map((list) => Int32Array.from(list));
}

function variesWithin(column: Float64Array, members: readonly Int32Array[]): boolean {
  return members.some((rows) => rows.some((row) => column[row] !== column[rows[0] as number]));
}

export function randomSlopeModel({ outcome, slope, predictors, cluster, level = 0.95 }: RandomSlopeInput): RandomSlopeModel | NotEstimable {
  requireLevel(level);
  const all = [slope, ...predictors];
  const { columns, labels, n, leftOut } = completeRows([outcome, ...all.map((predictor) => predictor.values)], [cluster]);
  const basis = { n, leftOut };
  const { names: clusterNames, codes } = labels[0] as (typeof labels)[number];
  const names = all.map((predictor) => predictor.name);
  const clusters = clusterNames.length;
  if (n === 0) return notEstimable(reasons.noData, basis);
  if (clusters < fewestClusters) return notEstimable(`${clusters} clusters: a random slope needs at least ${fewestClusters}`, basis);
  if (n <= 2 * clusters) return notEstimable('too few rows for each cluster to tell its intercept and slope from chance', basis);

  const members = membersOf(codes, clusters);
  const [y, ...scaled] = columns.map((column) => centredColumn(column, true)) as [CentredColumn, ...CentredColumn[]];
  const varying = columns.slice(1).map((column) => variesWithin(column, members));
  const df = innerOuterDf(n, clusters, varying);
  const outOfRange = rangeObstacle([y, ...scaled]);
  if (outOfRange !== undefined) return notEstimable(outOfRange, basis);
  if (y.norm === 0) return notEstimable(reasons.allEqual, basis);
  const unusable = unusablePredictor(scaled, names);
  if (unusable !== undefined) return notEstimable(unusable, basis);
  if (varying[0] === false) return notEstimable(`${slope.name} does not vary within clusters`, basis);
  if (df.inner < 1 || df.outer < 1) return notEstimable(tooFewParticipants(n, names.length + 1), basis);

  // Time in standard deviations about its mean, so that both random effects have the size of the outcome's spread.
  const time = (scaled[0] as CentredColumn).unit.map((value) => value * Math.sqrt(n));
  const constant = new Float64Array(n).fill(1 / Math.sqrt(n));
  const design = slopeDesign([constant, ...scaled.map(({ unit }) => unit), y.unit], time, members);
  const order = names.length + 1;
  const left = Math.abs(design.untouched.entries[order * design.untouched.size + order] as number);
  if (left < 64 * Number.EPSILON) return notEstimable('each cluster lies on its own line exactly', basis);
  const factorOf = ([first = 0, below = 0, second = 0]: readonly number[]): RelativeFactor => ({ first, below, second });
  const minimum = minimiseSmooth((at) => slopeLikelihood(design, factorOf(at)).deviance, [1, 0, 0.5]);
  if (!minimum.converged) return notEstimable('the likelihood did not settle', basis);
  const factor = factorOf(minimum.at);
  const found = slopeLikelihood(design, factor);
  const residualDf = n - order;
  const varianceResidual = (found.residual / residualDf) * y.norm ** 2;
  const scales = scaled.map(({ mean, norm }) => ({ mean, norm }));
  const effects = effectsInUnits(factor, scales[0] as (typeof scales)[number], n);
  const onEdge = Math.abs(factor.second) < edge * Math.hypot(factor.below, 1) || Math.abs(factor.first) < edge;
  return {
    kind: 'random-slope-model',
    ...basis,
    clusters,
    coefficients: mixedCoefficients(
      {
        coefficients: found.coefficients,
        inverse: found.inverse,
        rows: n,
        outcome: y,
        predictors: scales,
        variesWithin: varying,
        varianceResidual,
      },
      names,
      clusters,
      level,
    ),
    varianceIntercept: effects.intercept * varianceResidual,
    varianceSlope: effects.slope * varianceResidual,
    covariance: effects.covariance * varianceResidual,
    varianceResidual,
    logLikelihood:
      -(residualDf * (Math.log(2 * Math.PI * varianceResidual) + 1) + found.logClusterTerms + found.logDeterminant + logScale(n, scales)) /
      2,
    method: `Linear mixed model with random intercept and slope by restricted maximum likelihood, t intervals and tests with inner-outer degrees of freedom (two-sided, ${percentText(level)}).`,
    failedAssumptions: onEdge ? ['the variation between clusters is on the edge of what is possible: a simpler model says as much'] : [],
  };
}

/** Relative covariance of the effects for time as recorded, from that for time in standard deviations about its mean. */
function effectsInUnits(
  { first, below, second }: RelativeFactor,
  time: { mean: number; norm: number },
  rows: number,
): { intercept: number; slope: number; covariance: number } {
  const perUnit = Math.sqrt(rows) / time.norm;
  const shift = time.mean * perUnit;
  const atMean = first * first;
  const crossed = first * below;
  const ofSlope = below * below + second * second;
  return {
    intercept: atMean - 2 * shift * crossed + shift * shift * ofSlope,
    slope: ofSlope * perUnit ** 2,
    covariance: (crossed - shift * ofSlope) * perUnit,
  };
}
