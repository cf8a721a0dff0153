/** Noncentral t: the distribution behind intervals for standardised differences. */

import { findRootOfIncreasing } from '../root.ts';
import { chiDensity } from './chi-density.ts';
import { logIntegral } from './log-concave-integral.ts';
import { normalLogLower, normalTails } from './normal.ts';
import type { Tails } from './tails.ts';
import { requireNumber, requireProbability, tailsFrom } from './tails.ts';

/**
 * P(T <= t) for df >= 1 and noncentrality `ncp`: the chi density times a normal tail, integrated by Gauss-Legendre panels. The
 * smaller tail is the one integrated, so both keep their digits.
 */
export function noncentralTTails(t: number, df: number, ncp: number): Tails {
  requireNumber(t, 'A t value');
  requireNumber(ncp, 'A noncentrality');
  if (!(df >= 1)) throw new RangeError('The noncentral t is computed for 1 degree of freedom or more.');
  if (!Number.isFinite(ncp)) throw new RangeError('A noncentrality is finite.');
  if (Math.abs(t) === Infinity) return normalTails(t);
  if (df === Infinity) return normalTails(t - ncp);
  const density = chiDensity(df);
  const sign = t > ncp ? -1 : 1;
  const log = logIntegral((s) => density.log(s) + normalLogLower(sign * (t * s - ncp)), density.from, density.to);
  return tailsFrom(t > ncp ? 'upper' : 'lower', log);
}

/** The noncentrality for which P(T <= t) = p: it falls as p rises. */
export function noncentralityWithLowerTail(t: number, df: number, p: number): number {
  requireProbability(p);
  if (p === 0 || p === 1) return p === 0 ? Infinity : -Infinity;
  const target = Math.log(Math.min(p, 1 - p));
  // P(T <= t) falls as the noncentrality grows.
  return findRootOfIncreasing(
    (ncp) => {
      const tails = noncentralTTails(t, df, ncp);
      return p <= 0.5 ? target - tails.logLower : tails.logUpper - target;
    },
    t,
    1,
  );
}
