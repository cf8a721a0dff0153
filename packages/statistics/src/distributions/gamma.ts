/** Gamma distribution with shape and scale. */
import { findRootOfIncreasing } from '../root.ts';
import { incompleteGamma } from './incomplete-gamma.ts';
import type { Tail, Tails } from './tails.ts';
import { requirePositive, requireProbability } from './tails.ts';

function requireScale(scale: number): void {
  requirePositive(scale, 'The scale of a gamma distribution');
  if (scale === Infinity) throw new RangeError('The scale of a gamma distribution is finite.');
}

export function gammaTails(x: number, shape: number, scale = 1): Tails {
  requireScale(scale);
  return incompleteGamma(shape, x / scale);
}

/** Solved on the logarithms of x and of the smaller tail. 0 and Infinity at the ends. */
export function gammaQuantile(p: number, shape: number, scale = 1, tail: Tail = 'lower'): number {
  requireProbability(p);
  requirePositive(shape, 'The shape of a gamma distribution');
  requireScale(scale);
  if (p === 0 || p === 1) return (p === 0) === (tail === 'lower') ? 0 : Infinity;
  const direct: Tail = p <= 0.5 === (tail === 'lower') ? 'lower' : 'upper';
  const target = Math.log(Math.min(p, 1 - p));
  const logX = findRootOfIncreasing(
    (log) => {
      const tails = incompleteGamma(shape, Math.exp(log));
      return direct === 'lower' ? tails.logLower - target : target - tails.logUpper;
    },
    Math.log(shape),
    0.5 / Math.sqrt(shape),
  );
  return scale * Math.exp(logX);
}
