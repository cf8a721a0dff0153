/** Poisson distribution. */

import { requireCount } from './binomial.ts';
import { discreteQuantile } from './discrete-quantile.ts';
import { incompleteGamma, logGammaTerm } from './incomplete-gamma.ts';
import type { Tails } from './tails.ts';
import { mirrored, noneBelow, requireNumber, requirePositive, requireProbability } from './tails.ts';

/** `lower` is P(X <= x), `upper` P(X > x). */
export function poissonTails(x: number, mean: number): Tails {
  requireNumber(x, 'A Poisson count');
  requirePositive(mean, 'A Poisson mean');
  if (x < 0) return noneBelow;
  return mirrored(incompleteGamma(Math.floor(x) + 1, mean));
}

/** P(X = x). */
export function poissonMass(x: number, mean: number): number {
  requireCount(x, 'A Poisson count');
  requirePositive(mean, 'A Poisson mean');
  if (x === 0 || mean === Infinity) return Math.exp(-mean);
  return Math.exp(logGammaTerm(x, mean));
}

/** Smallest x with P(X <= x) >= p; Infinity at p = 1. */
export function poissonQuantile(p: number, mean: number): number {
  requireProbability(p);
  requirePositive(mean, 'A Poisson mean');
  if (p === 1) return Infinity;
  let most = Math.ceil(mean) + 10;
  while (poissonTails(most, mean).lower < p) most *= 2;
  return discreteQuantile((x) => poissonTails(x, mean), p, 0, most);
}
