/** Binomial distribution. */

import { incompleteBeta } from './incomplete-beta.ts';
import { discreteQuantile } from './discrete-quantile.ts';
import { excessOverLogOfRatio } from './deviance.ts';
import { stirlingError } from './log-gamma.ts';
import type { Tails } from './tails.ts';
import { noneAbove, noneBelow, requireNumber, requireProbability } from './tails.ts';

export function requireCount(value: number, name: string): void {
  if (!(Number.isSafeInteger(value) && value >= 0)) throw new RangeError(`${name} is a whole number from 0 up.`);
}

/** `lower` is P(X <= x), `upper` P(X > x); for P(X >= x) ask at x - 1. Between whole numbers x is taken down. */
export function binomialTails(x: number, trials: number, probability: number): Tails {
  requireNumber(x, 'A binomial count');
  requireCount(trials, 'The number of trials');
  requireProbability(probability);
  const k = Math.floor(x);
  if (k < 0) return noneBelow;
  if (k >= trials || probability === 0) return noneAbove;
  if (probability === 1) return noneBelow;
  return incompleteBeta(trials - k, k + 1, 1 - probability, probability);
}

/** ln P(X = x): Loader (2000). -Infinity where it cannot happen. */
export function binomialLogMass(x: number, trials: number, probability: number): number {
  requireCount(trials, 'The number of trials');
  requireProbability(probability);
  if (!Number.isInteger(x) || x < 0 || x > trials) return -Infinity;
  if (probability === 0) return x === 0 ? 0 : -Infinity;
  if (probability === 1) return x === trials ? 0 : -Infinity;
  if (x === 0) return trials * Math.log1p(-probability);
  if (x === trials) return trials * Math.log(probability);
  const rest = trials - x;
  const expected = trials * probability;
  const expectedRest = trials * (1 - probability);
  const deviance =
    x * excessOverLogOfRatio((expected - x) / x, expected / x) +
    rest * excessOverLogOfRatio((expectedRest - rest) / rest, expectedRest / rest);
  return stirlingError(trials) - stirlingError(x) - stirlingError(rest) - deviance + Math.log(trials / (2 * Math.PI * x * rest)) / 2;
}

export function binomialMass(x: number, trials: number, probability: number): number {
  return Math.exp(binomialLogMass(x, trials, probability));
}

/** Smallest x with P(X <= x) >= p. */
export function binomialQuantile(p: number, trials: number, probability: number): number {
  requireCount(trials, 'The number of trials');
  return discreteQuantile((x) => binomialTails(x, trials, probability), p, 0, trials);
}
