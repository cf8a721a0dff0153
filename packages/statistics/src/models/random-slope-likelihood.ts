/**
 * Restricted likelihood of y = X b + (1, t) u + residual, u = two random effects for each cluster with any covariance, as a function of
 * the lower triangle L of their relative covariance (covariance / residual variance = L L').
 *
 * Within a cluster, rotating by the QR decomposition of (1, t) = Q R leaves two rows C that L touches and the rest that it does not; the
 * rest of all clusters is reduced to one triangle once. Clusters seen at the same times share R, so their C are stacked and reduced
 * together. A value of L then costs, for each pattern of times, a Cholesky decomposition K K' = I + R L L' R' and the rows K^-1 C.
 *
 * Source: Pinheiro & Bates (2000) Mixed-Effects Models in S and S-PLUS, section 2.2.3; Bates et al. (2015) J Stat Softw 67(1), section 3
 * (profiled criterion).
 */

import type { UpperTriangle } from '../linear-algebra/orthogonal-triangle.ts';
import {
  absorbColumns,
  emptyTriangle,
  invertTriangle,
  orthogonalTriangle,
  solveAgainstColumn,
} from '../linear-algebra/orthogonal-triangle.ts';

/** Lower triangle of the relative covariance: (first, 0; below, second). */
export interface RelativeFactor {
  readonly first: number;
  readonly below: number;
  readonly second: number;
}

/** Clusters with the same times. */
interface TimePattern {
  readonly clusters: number;
  readonly r11: number;
  readonly r12: number;
  readonly r22: number;
  /** First rotated row of each cluster, then the second: twice as many columns as X and y have together. */
  readonly rotated: readonly Float64Array[];
}

export interface SlopeDesign {
  readonly rows: number;
  /** Coefficients including the intercept. */
  readonly order: number;
  readonly untouched: UpperTriangle;
  readonly patterns: readonly TimePattern[];
}

export interface SlopeLikelihood {
  readonly deviance: number;
  readonly coefficients: Float64Array;
  readonly inverse: UpperTriangle;
  readonly residual: number;
  readonly logDeterminant: number;
  readonly logClusterTerms: number;
}

/** `columns`: constant, predictors, outcome, all scaled; `time`: scaled too; `members`: the rows of each cluster. */
export function slopeDesign(columns: readonly Float64Array[], time: Float64Array, members: readonly Int32Array[]): SlopeDesign {
  const width = columns.length;
  const untouched = emptyTriangle(width);
  const stacks = new Map<string, { r: readonly [number, number, number]; clusters: number; rotated: number[][] }>();
  for (const rows of members) {
    const cluster = emptyTriangle(width + 2);
    const pick = (column: Float64Array): Float64Array => Float64Array.from(rows, (row) => column[row] as number);
    absorbColumns(cluster, [new Float64Array(rows.length).fill(1), pick(time), ...columns.map(pick)]);
    const entry = (i: number, j: number): number => cluster.entries[j * cluster.size + i] as number;
    absorbColumns(
      untouched,
      columns.map((_, j) => Float64Array.from({ length: width }, (_, i) => entry(i + 2, j + 2))),
    );
    const r = [entry(0, 0), entry(0, 1), entry(1, 1)] as const;
    const key = r.join(' ');
    let stack = stacks.get(key);
    if (stack === undefined) {
      stack = { r, clusters: 0, rotated: Array.from({ length: 2 * width }, () => []) };
      stacks.set(key, stack);
    }
    stack.clusters++;
    for (let j = 0; j < width; j++) {
      (stack.rotated[j] as number[]).push(entry(0, j + 2));
      (stack.rotated[width + j] as number[]).push(entry(1, j + 2));
    }
  }
  const patterns = [...stacks.values()].map(({ r: [r11, r12, r22], clusters, rotated }): TimePattern => ({
    clusters,
    r11,
    r12,
    r22,
    rotated: reduced(rotated),
  }));
  return { rows: columns[0]?.length ?? 0, order: width - 1, untouched, patterns };
}

/** As few rows as say the same: the triangle of the stack where that is shorter. */
function reduced(columns: readonly (readonly number[])[]): Float64Array[] {
  const dense = columns.map((column) => Float64Array.from(column));
  if ((dense[0] as Float64Array).length <= dense.length) return dense;
  const { size, entries } = orthogonalTriangle(dense);
  return dense.map((_, j) => entries.slice(j * size, (j + 1) * size));
}

export function slopeLikelihood(design: SlopeDesign, { first, below, second }: RelativeFactor): SlopeLikelihood {
  const { order, rows } = design;
  const width = order + 1;
  const triangle = { size: width, entries: design.untouched.entries.slice() };
  let logClusterTerms = 0;
  for (const { clusters, r11, r12, r22, rotated } of design.patterns) {
    // R L, and the Cholesky factor of I + R L (R L)'.
    const [a, b, c, d] = [r11 * first + r12 * below, r12 * second, r22 * below, r22 * second];
    const k11 = Math.sqrt(1 + a * a + b * b);
    const k21 = (a * c + b * d) / k11;
    // 1 + c^2 + d^2 - k21^2, written so that large effects do not cancel.
    const k22 = Math.sqrt((k11 * k11 + c * c + d * d + (a * d - b * c) ** 2) / (k11 * k11));
    logClusterTerms += 2 * clusters * Math.log(k11 * k22);
    const upper = rotated.slice(0, width).map((column) => column.map((value) => value / k11));
    const lower = rotated.slice(width).map((column, j) => column.map((value, i) => (value - k21 * (upper[j]?.[i] as number)) / k22));
    absorbColumns(triangle, upper);
    absorbColumns(triangle, lower);
  }
  const residual = (triangle.entries[order * width + order] as number) ** 2;
  let logDeterminant = 0;
  for (let j = 0; j < order; j++) logDeterminant += 2 * Math.log(Math.abs(triangle.entries[j * width + j] as number));
  const df = rows - order;
  return {
    deviance: df * Math.log(residual / df) + logClusterTerms + logDeterminant,
    coefficients: solveAgainstColumn(triangle, order, order),
    inverse: invertTriangle(triangle, order),
    residual,
    logDeterminant,
    logClusterTerms,
  };
}
