/**
 * Standardised mean differences for the balance of two groups at baseline: no test, because balance is a matter of this sample.
 * Numbers: (m1 - m2)/sqrt((s1² + s2²)/2). Yes/no: (p1 - p2)/sqrt((p1 q1 + p2 q2)/2). Classes: Mahalanobis distance of the shares of all
 * but one class, never negative.
 * Sources: Austin (2009) Statistics in Medicine 28:3083-3107; Yang & Dalton (2012) SAS Global Forum paper 335 (classes).
 */

import { computableScale } from '../description/computable-scale.ts';
import type { Moments } from '../description/moments.ts';
import { moments } from '../description/moments.ts';
import { symmetricSolver } from '../linear-algebra/solve-symmetric.ts';
import type { LeftOut, NotEstimable, Provenance } from '../result.ts';
import { addLeftOut, notEstimable, nothingLeftOut, reasons, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { cleanSample } from '../samples.ts';

export interface BalanceFigure extends Provenance {
  readonly kind: 'balance';
  readonly difference: number;
  /** Beyond 0.10 in size a difference is flagged, beyond 0.25 marked as large. */
  readonly concern: 'none' | 'flagged' | 'large';
  readonly groupSizes: readonly [number, number];
}

const flaggedBeyond = 0.1;
const largeBeyond = 0.25;

function balance(difference: number, groupSizes: readonly [number, number], leftOut: LeftOut, how: string): BalanceFigure {
  const size = Math.abs(difference);
  return {
    kind: 'balance',
    n: groupSizes[0] + groupSizes[1],
    leftOut,
    difference,
    concern: size > largeBeyond ? 'large' : size > flaggedBeyond ? 'flagged' : 'none',
    groupSizes,
    method: `Standardised mean difference (${how}).`,
    failedAssumptions: verySmallSample(Math.min(...groupSizes)),
  };
}

/** Numbers of two groups, two or more in each; positive when the first group's mean is the larger. */
export function numberBalance(first: ArrayLike<Observation>, second: ArrayLike<Observation>): BalanceFigure | NotEstimable {
  const [one, two] = [cleanSample(first), cleanSample(second)];
  const basis = { n: one.n + two.n, leftOut: addLeftOut(one.leftOut, two.leftOut) };
  if (one.n === 0 || two.n === 0) return notEstimable(reasons.noComparison, basis);
  if (one.n === 1 || two.n === 1) return notEstimable('a group has fewer than two values', basis);
  const scaled = computableScale([one.values, two.values]);
  if (scaled === 'too large') return notEstimable(reasons.tooLarge, basis);
  const [a, b] = scaled.samples.map(moments) as [Moments, Moments];
  const spread = Math.sqrt((a.sumOfSquares / (a.n - 1) + b.sumOfSquares / (b.n - 1)) / 2);
  if (spread === 0) return notEstimable('all values equal within each group', basis);
  return balance((a.mean - b.mean) / spread, [one.n, two.n], basis.leftOut, 'difference of means over the root mean variance');
}

/** Counts of two groups by class, the classes in the same order. For a yes/no question the first class is "yes" and gives the sign. */
export function classBalance(first: readonly number[], second: readonly number[]): BalanceFigure | NotEstimable {
  if (first.length !== second.length) throw new RangeError('Both groups need counts of the same classes.');
  if (![...first, ...second].every((count) => Number.isSafeInteger(count) && count >= 0))
    throw new RangeError('Counts are whole numbers from 0 up.');
  const used = first.flatMap((count, i) => (count + (second[i] as number) > 0 ? [i] : []));
  const groupSizes = [first, second].map((counts) => counts.reduce((sum, count) => sum + count, 0)) as [number, number];
  const basis = { n: groupSizes[0] + groupSizes[1], leftOut: nothingLeftOut };
  if (groupSizes[0] === 0 || groupSizes[1] === 0) return notEstimable(reasons.noComparison, basis);
  if (used.length === 1) return balance(0, groupSizes, basis.leftOut, 'one class only');
  const shares = (counts: readonly number[], n: number): number[] => used.map((i) => (counts[i] as number) / n);
  const [p, q] = [shares(first, groupSizes[0]), shares(second, groupSizes[1])];
  const apart = p.map((share, i) => share - (q[i] as number));
  if (used.length === 2) {
    const [p1 = 0] = p;
    const [q1 = 0] = q;
    const spread = Math.sqrt((p1 * (1 - p1) + q1 * (1 - q1)) / 2);
    if (spread === 0) return notEstimable('the groups have no class in common', basis);
    return balance((apart[0] as number) / spread, groupSizes, basis.leftOut, 'difference of shares over the root mean variance');
  }
  // The last class follows from the others.
  const free = used.length - 1;
  const covariance = Array.from({ length: free }, (_, i) =>
    Array.from({ length: free }, (_, j) => {
      const [pi, pj, qi, qj] = [p[i], p[j], q[i], q[j]] as [number, number, number, number];
      return i === j ? (pi * (1 - pi) + qi * (1 - qi)) / 2 : -(pi * pj + qi * qj) / 2;
    }),
  );
  const solver = symmetricSolver(covariance);
  if (solver === undefined) return notEstimable('the groups have too few classes in common', basis);
  const difference = apart.slice(0, free);
  const distance = solver.solve(difference).reduce((sum, value, i) => sum + value * (difference[i] as number), 0);
  return balance(Math.sqrt(distance), groupSizes, basis.leftOut, 'Mahalanobis distance of the shares');
}
