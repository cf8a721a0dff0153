/** Regularised incomplete beta function, both tails: the distribution function of beta, t, F and binomial. */

import { findRootOfIncreasing } from '../root.ts';
import { excessOverLogOfRatio } from './deviance.ts';
import { logBeta, stirlingError } from './log-gamma.ts';
import type { Tail, Tails } from './tails.ts';
import { mirrored, noneAbove, noneBelow, requirePositive, requireProbability, tailsFrom } from './tails.ts';

/** The work grows with the square root of the parameters; beyond this a question is refused rather than answered slowly. */
const largestParameter = 1e12;

/** Below this the variate over the parameter leaves the range of a double. */
const smallestParameter = 1e-280;

/**
 * ln of x^a y^b / B(a, b), y = 1 - x: Loader's saddle-point form of the binomial density. The deviation of n x from a is taken from
 * the smaller of x and y, where it has its digits.
 */
function logBetaTerm(a: number, b: number, x: number, y: number): number {
  const n = a + b;
  const excess = x <= y ? n * x - a : b - n * y;
  const deviance = a * excessOverLogOfRatio(excess / a, (n * x) / a) + b * excessOverLogOfRatio(-excess / b, (n * y) / b);
  return (Math.log(a) + Math.log(b) - Math.log(2 * Math.PI * n)) / 2 + stirlingError(n) - stirlingError(a) - stirlingError(b) - deviance;
}

/** Continued fraction of I_x(a, b) (NIST DLMF 8.17.22) by the modified Lentz method; converges fast for x < (a + 1)/(a + b + 2). */
function betaFraction(a: number, b: number, x: number): number {
  let c = 1;
  let d = 1 / (1 - ((a + b) * x) / (a + 1) || 1e-300);
  let h = d;
  for (let m = 1; m < 1e7; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / (1 + even * d || 1e-300);
    c = 1 + even / c || 1e-300;
    h *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / (1 + odd * d || 1e-300);
    c = 1 + odd / c || 1e-300;
    const factor = d * c;
    h *= factor;
    if (Math.abs(factor - 1) < 2e-16) break;
  }
  return h;
}

function requireParameters(a: number, b: number): void {
  requirePositive(a, 'The first parameter of a beta distribution');
  requirePositive(b, 'The second parameter of a beta distribution');
  if (Math.max(a, b) > largestParameter || Math.min(a, b) < smallestParameter)
    throw new RangeError('The parameters of a beta distribution lie between 1e-280 and 1e12.');
}

/** Both `x` and `y` = 1 - x are given, because near 1 one of them cannot be had from the other. */
export function incompleteBeta(a: number, b: number, x: number, y: number): Tails {
  requireParameters(a, b);
  if (!(x >= 0 && x <= 1 && y >= 0 && y <= 1)) throw new RangeError('A beta variate lies between 0 and 1.');
  if (x === 0) return noneBelow;
  if (y === 0) return noneAbove;
  if (x > (a + 1) / (a + b + 2)) return mirrored(incompleteBetaBelow(b, a, y, x));
  return incompleteBetaBelow(a, b, x, y);
}

function incompleteBetaBelow(a: number, b: number, x: number, y: number): Tails {
  return tailsFrom('lower', logBetaTerm(a, b, x, y) - Math.log(a) + Math.log(betaFraction(a, b, x)));
}

/**
 * ln(x/(1 - x)) of the beta quantile: on this scale both ends keep their digits. Solved on the logarithm of the smaller tail.
 * -Infinity and Infinity where the probability is 0 or 1.
 */
export function betaLogitQuantile(p: number, a: number, b: number, tail: Tail): number {
  requireProbability(p);
  requireParameters(a, b);
  if (p === 0 || p === 1) return (p === 0) === (tail === 'lower') ? -Infinity : Infinity;
  const smaller = Math.min(p, 1 - p);
  const direct: Tail = p <= 0.5 === (tail === 'lower') ? 'lower' : 'upper';
  const target = Math.log(smaller);
  const far = farLogit(target, direct === 'lower' ? a : b, direct === 'lower' ? b : a);
  if (far < -600) return direct === 'lower' ? far : -far;
  return findRootOfIncreasing(
    (logit) => {
      const tails = incompleteBeta(a, b, 1 / (1 + Math.exp(-logit)), 1 / (1 + Math.exp(logit)));
      return direct === 'lower' ? tails.logLower - target : target - tails.logUpper;
    },
    Math.log(a / b),
    Math.max(0.5 / Math.sqrt(Math.min(a, b)), 1e-8),
  );
}

/** Where x is too small for a double, I_x(a, b) is x^a/(a B(a, b)) to all digits. */
function farLogit(logProbability: number, a: number, b: number): number {
  return (logProbability + Math.log(a) + logBeta(a, b)) / a;
}
