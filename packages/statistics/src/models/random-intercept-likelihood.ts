/**
 * Restricted likelihood of the model y = X b + cluster effect + residual as a function of one number, lambda = variance between clusters
 * / residual variance. The rows are taken apart once into deviations from their cluster's mean and the means themselves; each part is
 * reduced to a small triangle (means by cluster size), and after that a value of lambda costs a QR of a few stacked triangles, however
 * many people there are:
 *
 *   X'V^-1 X = X'X within + sum over sizes n of (n means'means)_n / (1 + n lambda).
 *
 * Source: Pinheiro & Bates (2000), Mixed-Effects Models in S and S-PLUS, section 2.2 (profiled restricted likelihood,
 * orthogonal-triangular form).
 */

import { centredColumn } from '../linear-algebra/centred-column.ts';
import type { UpperTriangle } from '../linear-algebra/orthogonal-triangle.ts';
import { absorbTriangle, invertTriangle, orthogonalTriangle, solveAgainstColumn } from '../linear-algebra/orthogonal-triangle.ts';

/** Clusters of one size: how many there are, and the triangle of their means times the root of the size. */
interface SizeClass {
  readonly size: number;
  readonly clusters: number;
  readonly triangle: UpperTriangle;
}

/** Outcome and predictors in units of their own length about their mean; the first coefficient belongs to the constant 1/sqrt(rows). */
export interface ClusteredDesign {
  readonly rows: number;
  readonly clusterSizes: Int32Array;
  /** Coefficients including the intercept. */
  readonly order: number;
  /** For each predictor whether it varies within some cluster. */
  readonly variesWithin: readonly boolean[];
  readonly outcome: { readonly mean: number; readonly norm: number };
  readonly predictors: readonly { readonly mean: number; readonly norm: number }[];
  readonly within: UpperTriangle;
  readonly between: readonly SizeClass[];
}

export interface RestrictedLikelihood {
  readonly lambda: number;
  /** Minus twice the log restricted likelihood without its constants, in the scaled units. */
  readonly deviance: number;
  /** Derivative of `deviance` by lambda. */
  readonly slope: number;
  /** Scaled coefficients, intercept first. */
  readonly coefficients: Float64Array;
  /** Inverse of the triangle of X'V^-1 X. */
  readonly inverse: UpperTriangle;
  /** Residual sum of squares in the metric of V. */
  readonly residual: number;
  readonly logDeterminant: number;
  readonly logClusterTerms: number;
}

export function clusteredDesign(
  outcome: Float64Array,
  predictors: readonly Float64Array[],
  codes: Int32Array,
  clusters: number,
): ClusteredDesign {
  const rows = outcome.length;
  const order = predictors.length + 1;
  const clusterSizes = new Int32Array(clusters);
  for (const code of codes) clusterSizes[code] = (clusterSizes[code] as number) + 1;

  const raw = [...predictors, outcome];
  const columns = raw.map((column) => centredColumn(column, true));
  const means = columns.map(({ unit }) => {
    const sums = new Float64Array(clusters);
    for (let i = 0; i < rows; i++) sums[codes[i] as number] = (sums[codes[i] as number] as number) + (unit[i] as number);
    return sums.map((sum, c) => sum / (clusterSizes[c] as number));
  });
  const variesWithin = raw.map((column, j) =>
    takeOutClusterMeans(column, columns[j]?.unit as Float64Array, means[j] as Float64Array, codes),
  );

  const constant = new Float64Array(rows);
  const within = orthogonalTriangle([constant, ...columns.map((column) => column.unit)]);
  const membersBySize = new Map<number, number[]>([...new Set(clusterSizes)].sort((a, b) => a - b).map((size) => [size, []]));
  for (const [c, size] of clusterSizes.entries()) membersBySize.get(size)?.push(c);
  const between = [...membersBySize].map(([size, members]): SizeClass => {
    const scale = Math.sqrt(size);
    const columnsOfMeans = means.map((mean) => {
      const ofSize = new Float64Array(members.length);
      for (let i = 0; i < members.length; i++) ofSize[i] = (mean[members[i] as number] as number) * scale;
      return ofSize;
    });
    const ones = new Float64Array(members.length).fill(scale / Math.sqrt(rows));
    return { size, clusters: members.length, triangle: orthogonalTriangle([ones, ...columnsOfMeans]) };
  });

  const describe = (j: number) => ({ mean: columns[j]?.mean as number, norm: columns[j]?.norm as number });
  return {
    rows,
    clusterSizes,
    order,
    variesWithin: variesWithin.slice(0, predictors.length),
    outcome: describe(predictors.length),
    predictors: predictors.map((_, j) => describe(j)),
    within,
    between,
  };
}

/**
 * Turns `unit` into deviations from the cluster means, exactly zero where the recorded values of a cluster are all equal; answers whether
 * any differ.
 */
function takeOutClusterMeans(recorded: Float64Array, unit: Float64Array, means: Float64Array, codes: Int32Array): boolean {
  const firstOfCluster = new Float64Array(means.length).fill(NaN);
  const varies = new Uint8Array(means.length);
  for (let i = 0; i < recorded.length; i++) {
    const c = codes[i] as number;
    const first = firstOfCluster[c] as number;
    if (Number.isNaN(first)) firstOfCluster[c] = recorded[i] as number;
    else if (first !== recorded[i]) varies[c] = 1;
  }
  for (let i = 0; i < unit.length; i++) {
    const c = codes[i] as number;
    unit[i] = varies[c] === 1 ? (unit[i] as number) - (means[c] as number) : 0;
  }
  return varies.includes(1);
}

function triangleAt(design: ClusteredDesign, lambda: number): UpperTriangle {
  const triangle = { size: design.within.size, entries: design.within.entries.slice() };
  for (const { size, triangle: means } of design.between) absorbTriangle(triangle, means, 1 / Math.sqrt(1 + size * lambda));
  return triangle;
}

/** The first predictor that those before it determine, by the rank test of ordinary least squares; -1 when there is none. */
export function dependentPredictor(design: ClusteredDesign, tolerance: number): number {
  const { size, entries } = triangleAt(design, 0);
  return design.predictors.findIndex((_, j) => Math.abs(entries[(j + 1) * size + (j + 1)] as number) < tolerance);
}

/** Sum of squares of the means' residuals, n (mean y - mean x b)^2, over the clusters of one size. */
function residualOfMeans({ triangle: { size, entries } }: SizeClass, coefficients: Float64Array): Float64Array {
  const last = size - 1;
  return Float64Array.from({ length: size }, (_, i) => {
    let rest = entries[last * size + i] as number;
    for (let j = i; j < last; j++) rest -= (entries[j * size + i] as number) * (coefficients[j] as number);
    return rest;
  });
}

/** Means of one size in the coordinates where X'V^-1 X is the identity, row by row. */
function whitenedMeans({ triangle }: SizeClass, inverse: UpperTriangle): Float64Array[] {
  const { size, entries } = triangle;
  return Array.from({ length: size }, (_, i) =>
    Float64Array.from({ length: inverse.size }, (_, k) => {
      let sum = 0;
      for (let j = i; j <= k; j++) sum += (entries[j * size + i] as number) * (inverse.entries[k * inverse.size + j] as number);
      return sum;
    }),
  );
}

function sumOfSquares(values: Iterable<number>): number {
  let sum = 0;
  for (const value of values) sum += value * value;
  return sum;
}

export function restrictedLikelihood(design: ClusteredDesign, lambda: number): RestrictedLikelihood {
  const triangle = triangleAt(design, lambda);
  const { size, entries } = triangle;
  const { order, rows } = design;
  const coefficients = solveAgainstColumn(triangle, order, order);
  const inverse = invertTriangle(triangle, order);
  const residual = (entries[order * size + order] as number) ** 2;
  let logDeterminant = 0;
  for (let j = 0; j < order; j++) logDeterminant += 2 * Math.log(Math.abs(entries[j * size + j] as number));
  let logClusterTerms = 0;
  let residualSlope = 0;
  let otherSlope = 0;
  for (const sizeClass of design.between) {
    const growth = 1 + sizeClass.size * lambda;
    const weight = sizeClass.size / growth;
    logClusterTerms += sizeClass.clusters * Math.log(growth);
    residualSlope -= (weight / growth) * sumOfSquares(residualOfMeans(sizeClass, coefficients));
    const trace = whitenedMeans(sizeClass, inverse).reduce((sum, row) => sum + sumOfSquares(row), 0);
    otherSlope += sizeClass.clusters * weight - (weight / growth) * trace;
  }
  const df = rows - order;
  return {
    lambda,
    deviance: df * Math.log(residual / df) + logClusterTerms + logDeterminant,
    slope: (df * residualSlope) / residual + otherSlope,
    coefficients,
    inverse,
    residual,
    logDeterminant,
    logClusterTerms,
  };
}

/** Second derivatives of the restricted deviance at its minimum and what Satterthwaite's degrees of freedom need besides. */
export interface Curvature {
  /** By lambda twice, and by lambda and the residual variance (residual/df in scaled units), and by the latter twice. */
  readonly lambdaLambda: number;
  readonly lambdaResidual: number;
  readonly residualResidual: number;
  /** d/d lambda of (X'V^-1 X)^-1 in the coordinates of the inverse triangle: symmetric, by rows. */
  readonly inverseSlope: readonly Float64Array[];
}

export function curvatureAt(design: ClusteredDesign, fit: RestrictedLikelihood): Curvature {
  const { order, rows } = design;
  const df = rows - order;
  const variance = fit.residual / df;
  const inverseSlope = Array.from({ length: order }, () => new Float64Array(order));
  const crossed = new Float64Array(order);
  let residualSlope = 0;
  let residualBend = 0;
  let clusterBend = 0;
  let traceBend = 0;
  for (const sizeClass of design.between) {
    const growth = 1 + sizeClass.size * fit.lambda;
    const first = sizeClass.size / growth ** 2;
    const second = (2 * sizeClass.size ** 2) / growth ** 3;
    const residuals = residualOfMeans(sizeClass, fit.coefficients);
    const white = whitenedMeans(sizeClass, fit.inverse);
    const squares = sumOfSquares(residuals);
    residualSlope -= first * squares;
    residualBend += second * squares;
    clusterBend -= sizeClass.clusters * (sizeClass.size / growth) ** 2;
    for (const [i, row] of white.entries()) {
      traceBend += second * sumOfSquares(row);
      for (let a = 0; a < order; a++) {
        crossed[a] = (crossed[a] as number) + 2 * first * (row[a] as number) * (residuals[i] as number);
        const target = inverseSlope[a] as Float64Array;
        for (let b = 0; b < order; b++) target[b] = (target[b] as number) + first * (row[a] as number) * (row[b] as number);
      }
    }
  }
  // The coefficients follow lambda: what they gain is the Schur complement of the second derivatives by them (2 X'V^-1 X, here twice the
  // identity).
  const profiledBend = residualBend - sumOfSquares(crossed) / 2;
  const squaredTrace = inverseSlope.reduce((sum, row) => sum + sumOfSquares(row), 0);
  return {
    lambdaLambda: profiledBend / variance + clusterBend + traceBend - squaredTrace,
    lambdaResidual: -residualSlope / variance ** 2,
    residualResidual: df / variance ** 2,
    inverseSlope,
  };
}
