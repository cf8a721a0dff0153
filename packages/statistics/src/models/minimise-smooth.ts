/**
 * Minimum of a smooth function of a few numbers: BFGS steps with central differences and backtracking, then Newton steps on differences
 * until the gradient is as small as differences can tell.
 * Source: Nocedal & Wright (2006) Numerical Optimization, 2nd ed., algorithm 6.1 and section 8.1.
 */

import { symmetricSolver } from '../linear-algebra/solve-symmetric.ts';

export interface Minimum {
  readonly at: readonly number[];
  readonly value: number;
  /** Whether the gradient vanished to the precision of the differences. */
  readonly converged: boolean;
}

const mostSteps = 200;
const gradientStep = 1e-5;
const curvatureStep = 1e-3;

const mostPolishing = 6;
const smallestStep = 1e-9;
const roundingShare = 1e-13;

/** A gradient below this share of the value counts as none; differences themselves are good to about 1e-10 of it. */
const flatGradient = 1e-7;

type Point = readonly number[];

function moved(at: Point, direction: Point, length: number): number[] {
  return at.map((value, i) => value + length * (direction[i] as number));
}

function dot(a: Point, b: Point): number {
  return a.reduce((sum, value, i) => sum + value * (b[i] as number), 0);
}

function axis(i: number, dimensions: number): number[] {
  return Array.from({ length: dimensions }, (_, j) => (i === j ? 1 : 0));
}

function gradientOf(f: (at: Point) => number, at: Point): number[] {
  return at.map((_, i) => {
    const along = axis(i, at.length);
    return (f(moved(at, along, gradientStep)) - f(moved(at, along, -gradientStep))) / (2 * gradientStep);
  });
}

function curvatureOf(f: (at: Point) => number, at: Point): number[][] {
  const centre = f(at);
  const h = curvatureStep;
  return at.map((_, i) =>
    at.map((_, j) => {
      const [one, other] = [axis(i, at.length), axis(j, at.length)];
      if (i === j) return (f(moved(at, one, h)) - 2 * centre + f(moved(at, one, -h))) / (h * h);
      const both = moved(one, other, 1);
      const against = moved(one, other, -1);
      return (f(moved(at, both, h)) - f(moved(at, against, h)) - f(moved(at, against, -h)) + f(moved(at, both, -h))) / (4 * h * h);
    }),
  );
}

export function minimiseSmooth(f: (at: Point) => number, start: Point): Minimum {
  const n = start.length;
  let at = [...start];
  let value = f(at);
  let gradient = gradientOf(f, at);
  let inverse = at.map((_, i) => axis(i, n));
  for (let step = 0; step < mostSteps; step++) {
    const direction = inverse.map((row) => -dot(row, gradient));
    const descent = dot(direction, gradient);
    if (!(descent < 0)) break;
    let length = Math.min(1, 2 / Math.sqrt(dot(direction, direction)));
    let next = moved(at, direction, length);
    let nextValue = f(next);
    while (!(nextValue <= value + 1e-4 * length * descent) && length > 1e-12) {
      length /= 2;
      next = moved(at, direction, length);
      nextValue = f(next);
    }
    if (!(nextValue < value)) break;
    const nextGradient = gradientOf(f, next);
    const change = next.map((x, i) => x - (at[i] as number));
    const turn = nextGradient.map((g, i) => g - (gradient[i] as number));
    const curvature = dot(change, turn);
    if (curvature > 0) inverse = updated(inverse, change, turn, curvature, step === 0);
    const gain = value - nextValue;
    [at, value, gradient] = [next, nextValue, nextGradient];
    if (gain < 1e-12 * Math.abs(value)) break;
  }
  return polished(f, at);
}

/** BFGS update of the inverse curvature; the first one also sets its scale. */
function updated(inverse: number[][], change: Point, turn: Point, curvature: number, first: boolean): number[][] {
  const base = first ? inverse.map((row) => row.map((value) => (value * curvature) / dot(turn, turn))) : inverse;
  const turned = base.map((row) => dot(row, turn));
  const factor = 1 + dot(turn, turned) / curvature;
  return base.map((row, i) =>
    row.map(
      (value, j) =>
        value +
        (factor * (change[i] as number) * (change[j] as number) -
          (change[i] as number) * (turned[j] as number) -
          (turned[i] as number) * (change[j] as number)) /
          curvature,
    ),
  );
}

/** Newton steps as long as they lead down; where the curvature is singular (a parameter without effect) the point stays as it is. */
function polished(f: (at: Point) => number, from: Point): Minimum {
  let at = [...from];
  let value = f(at);
  for (let step = 0; step < mostPolishing; step++) {
    const direction = symmetricSolver(curvatureOf(f, at))?.solve(gradientOf(f, at).map((g) => -g));
    if (direction === undefined) break;
    const next = moved(at, direction, 1);
    const nextValue = f(next);
    // A rise within rounding is none.
    if (!(nextValue <= value + roundingShare * Math.abs(value))) break;
    [at, value] = [next, nextValue];
    if (Math.sqrt(dot(direction, direction)) < smallestStep) break;
  }
  const gradient = gradientOf(f, at);
  return { at, value, converged: Math.sqrt(dot(gradient, gradient)) <= flatGradient * Math.max(1, Math.abs(value)) };
}
