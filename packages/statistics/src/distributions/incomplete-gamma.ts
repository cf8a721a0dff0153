/** Regularised incomplete gamma function, both tails: the distribution function of gamma, chi-square and Poisson. */

import { excessOverLogOfRatio } from './deviance.ts';
import { halfLogTwoPi, logGammaOnePlus, stirlingError } from './log-gamma.ts';
import type { Tails } from './tails.ts';
import { noneAbove, noneBelow, requireNumber, requirePositive, tailsFrom } from './tails.ts';

/** The work grows with the square root of the shape; beyond this a question is refused rather than answered slowly. */
const largestShape = 1e12;

/** ln of x^a e^-x / Gamma(a + 1): Loader's saddle-point form, so that large a and x do not cancel. */
export function logGammaTerm(a: number, x: number): number {
  if (a < 0.5) return a * Math.log(x) - x - logGammaOnePlus(a);
  return -(halfLogTwoPi + Math.log(a) / 2) - stirlingError(a) - a * excessOverLogOfRatio((x - a) / a, x / a);
}

/** P(a, x) = term × (1 + x/(a+1) + x²/((a+1)(a+2)) + …), x < a + 1. */
function logLowerSeries(a: number, x: number): number {
  let sum = 1;
  let term = 1;
  for (let k = 1; term > sum * 1e-17; k++) {
    term *= x / (a + k);
    sum += term;
  }
  return logGammaTerm(a, x) + Math.log(sum);
}

/** Q(a, x) by Legendre's continued fraction (modified Lentz), x >= a + 1. */
function logUpperFraction(a: number, x: number): number {
  let b = x + 1 - a;
  let c = Infinity;
  let d = 1 / b;
  let h = d;
  for (let k = 1; ; k++) {
    const an = -k * (k - a);
    b += 2;
    d = 1 / (an * d + b || 1e-300);
    c = b + an / c || 1e-300;
    const factor = c * d;
    h *= factor;
    if (Math.abs(factor - 1) < 2e-16 || k > 1e7) break;
  }
  // x^a e^-x / Gamma(a) is a times the term above.
  return logGammaTerm(a, x) + Math.log(a) + Math.log(h);
}

export function incompleteGamma(a: number, x: number): Tails {
  requirePositive(a, 'The shape of a gamma distribution');
  requireNumber(x, 'A gamma variate');
  if (a > largestShape) throw new RangeError('The shape of a gamma distribution is at most 1e12.');
  if (x <= 0) return noneBelow;
  if (x === Infinity) return noneAbove;
  // Whatever the shape, ln P(X > x) is -x there to the last digit.
  if (x > 1e200) return tailsFrom('upper', -x);
  return x < a + 1 ? tailsFrom('lower', logLowerSeries(a, x)) : tailsFrom('upper', logUpperFraction(a, x));
}
