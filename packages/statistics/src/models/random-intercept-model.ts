/**
 * Linear model with a random intercept for each cluster (a participant seen several times, or a site with several participants), by
 * restricted maximum likelihood (REML). The one variance ratio is found as the root of the derivative of the profiled restricted
 * likelihood; a ratio of 0 is a result ("no variation between clusters detected") and not a failure.
 *
 * Degrees of freedom of t: the inner-outer rule, Satterthwaite's beside it.
 *
 * Needs at least 5 clusters, some with more than one row.
 *
 * Source: Pinheiro & Bates (2000) Mixed-Effects Models in S and S-PLUS, sections 2.2 to 2.4; Satterthwaite (1946) Biometrics Bull
 * 2:110-114 with the curvature of the restricted likelihood by the variances; shrinkage Robinson (1991) Stat Sci 6:15-32.
 */

import type { Label } from '../complete-rows.ts';
import { completeRows } from '../complete-rows.ts';
import { rangeObstacle } from '../linear-algebra/centred-column.ts';
import type { NotEstimable, Provenance } from '../result.ts';
import { notEstimable, reasons, requireLevel } from '../result.ts';
import { findRoot } from '../root.ts';
import type { Observation } from '../samples.ts';
import { percentText } from '../test-figures.ts';
import type { Coefficient } from './coefficient.ts';
import { rankTolerance } from './least-squares.ts';
import { reasonForUnfit, tooFewParticipants } from './linear-regression.ts';
import type { MixedCoefficient } from './mixed-coefficients.ts';
import { innerOuterDf, logScale, mixedCoefficients, toOriginalUnits, whitenedRow } from './mixed-coefficients.ts';
import type { Predictor } from './predictor.ts';
import type { ClusteredDesign, Curvature, RestrictedLikelihood } from './random-intercept-likelihood.ts';
import { clusteredDesign, curvatureAt, dependentPredictor, restrictedLikelihood } from './random-intercept-likelihood.ts';

export interface RandomInterceptCoefficient extends MixedCoefficient {
  /** Absent where the variance between clusters is 0, on the edge of what is possible. */
  readonly satterthwaiteDf?: number;
}

export interface ClusterEffect {
  readonly cluster: string;
  readonly n: number;
  /** Mean of outcome minus fitted value over the rows of the cluster. */
  readonly meanResidual: number;
  /** Share of the mean residual that is believed: n lambda / (1 + n lambda). */
  readonly shrinkage: number;
  /** shrinkage x mean residual. */
  readonly effect: number;
}

export interface RandomInterceptModel extends Provenance {
  readonly kind: 'random-intercept-model';
  readonly clusters: number;
  /** Intercept first. */
  readonly coefficients: readonly RandomInterceptCoefficient[];
  readonly varianceBetween: number;
  readonly varianceResidual: number;
  /** Variance between clusters as a share of all variance. */
  readonly intraclassCorrelation: number;
  /** Restricted log likelihood with all constants. */
  readonly logLikelihood: number;
  /** In the order of the sorted cluster labels. */
  readonly clusterEffects: readonly ClusterEffect[];
}

export interface RandomInterceptInput {
  readonly outcome: ArrayLike<Observation>;
  /** May be empty: a common mean and its clusters. */
  readonly predictors: readonly Predictor[];
  readonly cluster: ArrayLike<Label>;
  readonly level?: number;
}

const fewestClusters = 5;

/** ln lambda is searched over this range, in steps; beyond it the clusters explain everything or nothing. */
const [lowestLog, highestLog, logStep] = [-16, 24, 0.5];

/** Minimum of the restricted deviance over lambda >= 0: the best of a coarse grid, then the root of the derivative beside it. */
function findMinimum(design: ClusteredDesign): RestrictedLikelihood {
  const at = (lambda: number): RestrictedLikelihood => restrictedLikelihood(design, lambda);
  let best = at(0);
  let bestLog = -Infinity;
  for (let log = lowestLog; log <= highestLog; log += logStep) {
    const candidate = at(Math.exp(log));
    if (candidate.deviance < best.deviance) [best, bestLog] = [candidate, log];
  }
  if (bestLog === -Infinity) {
    if (best.slope >= 0) return best;
    return at(findRoot((lambda) => at(lambda).slope, 0, Math.exp(lowestLog)));
  }
  const slopeAt = (log: number): number => at(Math.exp(log)).slope;
  const direction = best.slope < 0 ? 1 : -1;
  let far = bestLog + direction * logStep;
  // Beside the best point of the grid the derivative changes its sign; should the next point lie beyond a further extreme, look nearer.
  while (slopeAt(far) * direction <= 0 && Math.abs(far - bestLog) > 1e-12) far = (far + bestLog) / 2;
  return at(Math.exp(findRoot(slopeAt, Math.min(bestLog, far), Math.max(bestLog, far), 1e-15)));
}

/**
 * Satterthwaite: 2 variance^2 / (variance of that variance), the latter from the curvature by lambda and the residual variance. Both are
 * those of the coefficient divided by the length of its row, which leaves the ratio as it is.
 */
function satterthwaite(whitened: readonly number[], variance: number, curvature: Curvature): number {
  const length = Math.hypot(...whitened);
  const unit = whitened.map((value) => value / length);
  const byLambda =
    variance *
    unit.reduce(
      (sum, value, a) => sum + value * unit.reduce((inner, other, b) => inner + other * (curvature.inverseSlope[a]?.[b] as number), 0),
      0,
    );
  const { lambdaLambda, lambdaResidual, residualResidual } = curvature;
  const determinant = lambdaLambda * residualResidual - lambdaResidual ** 2;
  // The deviance is minus twice the log likelihood, so its second derivatives are twice the information.
  const spread = (2 * (byLambda ** 2 * residualResidual - 2 * byLambda * lambdaResidual + lambdaLambda)) / determinant;
  return (2 * variance ** 2) / spread;
}

export function randomInterceptModel({
  outcome,
  predictors,
  cluster,
  level = 0.95,
}: RandomInterceptInput): RandomInterceptModel | NotEstimable {
  requireLevel(level);
  const { columns, labels, n, leftOut } = completeRows([outcome, ...predictors.map((predictor) => predictor.values)], [cluster]);
  const basis = { n, leftOut };
  const { names: clusterNames, codes } = labels[0] as (typeof labels)[number];
  const names = predictors.map((predictor) => predictor.name);
  if (n === 0) return notEstimable(reasons.noData, basis);
  if (clusterNames.length < fewestClusters)
    return notEstimable(`${clusterNames.length} clusters: a random intercept needs at least ${fewestClusters}`, basis);
  if (clusterNames.length === n) return notEstimable('no cluster has more than one row', basis);

  const values = columns[0] as Float64Array;
  const design = clusteredDesign(values, columns.slice(1), codes, clusterNames.length);
  const refused = obstacle(design, names);
  if (refused !== undefined) return notEstimable(refused, basis);
  const found = findMinimum(design);
  const { lambda } = found;
  const residualDf = n - design.order;
  const scaledVariance = found.residual / residualDf;
  const varianceResidual = scaledVariance * design.outcome.norm ** 2;

  const curvature = lambda > 0 ? curvatureAt(design, found) : undefined;
  const rowsOfUnits = toOriginalUnits(n, design.predictors);
  const solution = { ...design, coefficients: found.coefficients, inverse: found.inverse, varianceResidual };
  const coefficients = mixedCoefficients(solution, names, clusterNames.length, level).map((coefficient, i): RandomInterceptCoefficient => {
    if (curvature === undefined) return coefficient;
    const whitened = whitenedRow(rowsOfUnits[i] as number[], found.inverse);
    return { ...coefficient, satterthwaiteDf: satterthwaite(whitened, scaledVariance, curvature) };
  });

  return {
    kind: 'random-intercept-model',
    ...basis,
    clusters: clusterNames.length,
    coefficients,
    varianceBetween: lambda * varianceResidual,
    varianceResidual,
    intraclassCorrelation: lambda / (1 + lambda),
    logLikelihood:
      -(
        residualDf * (Math.log(2 * Math.PI * varianceResidual) + 1) +
        found.logClusterTerms +
        found.logDeterminant +
        logScale(n, design.predictors)
      ) / 2,
    clusterEffects: clusterEffectsOf(design, columns, coefficients, codes, clusterNames, lambda),
    method: `Linear mixed model with a random intercept by restricted maximum likelihood, t intervals and tests with inner-outer degrees of freedom (two-sided, ${percentText(level)}).`,
    failedAssumptions: lambda === 0 ? ['no variation between clusters detected'] : [],
  };
}

/** Why the model cannot be fitted to these rows, if so. */
function obstacle(design: ClusteredDesign, names: readonly string[]): string | undefined {
  const { outcome, predictors, order, rows, clusterSizes, variesWithin, within } = design;
  const outOfRange = rangeObstacle([outcome, ...predictors]);
  if (outOfRange !== undefined) return outOfRange;
  if (outcome.norm === 0) return reasons.allEqual;
  const flat = predictors.findIndex(({ norm }) => norm === 0);
  if (flat >= 0) return reasonForUnfit({ kind: 'constant-predictor', column: flat }, names);
  const df = innerOuterDf(rows, clusterSizes.length, variesWithin);
  if (df.inner < 1 || df.outer < 1) return tooFewParticipants(rows, order);
  const dependent = dependentPredictor(design, rankTolerance);
  if (dependent >= 0) return reasonForUnfit({ kind: 'dependent-predictor', column: dependent }, names);
  // What is left of the outcome within clusters, in units of its own length: no residual variance means a ratio without bounds.
  const left = Math.abs(within.entries[order * within.size + order] as number);
  return left < 64 * Number.EPSILON ? 'the outcome does not vary within clusters beyond what the predictors say' : undefined;
}

function clusterEffectsOf(
  design: ClusteredDesign,
  columns: readonly Float64Array[],
  coefficients: readonly Coefficient[],
  codes: Int32Array,
  clusterNames: readonly string[],
  lambda: number,
): ClusterEffect[] {
  const sums = new Float64Array(clusterNames.length);
  const [outcome, ...predictors] = columns as [Float64Array, ...Float64Array[]];
  const slopes = coefficients.map((coefficient) => coefficient.estimate);
  for (let i = 0; i < outcome.length; i++) {
    let residual = (outcome[i] as number) - (slopes[0] as number);
    for (let j = 0; j < predictors.length; j++) residual -= (slopes[j + 1] as number) * ((predictors[j] as Float64Array)[i] as number);
    const code = codes[i] as number;
    sums[code] = (sums[code] as number) + residual;
  }
  return clusterNames.map((cluster, c) => {
    const n = design.clusterSizes[c] as number;
    const meanResidual = (sums[c] as number) / n;
    const shrinkage = (n * lambda) / (1 + n * lambda);
    return { cluster, n, meanResidual, shrinkage, effect: shrinkage * meanResidual };
  });
}
