/** Noncentral t: the distribution behind intervals for standardised differences. */

import { findRootOfIncreasing } from '../root.ts';
import { chiDensity } from './chi-density.ts';
import { chiSquareTails } from './chi-square.ts';
import { logIntegral } from './log-concave-integral.ts';
import { halfLogTwoPi } from './log-gamma.ts';
import { normalLogLower, normalTails } from './normal.ts';
import type { Tails } from './tails.ts';
import { mirrored, requireNumber, requireProbability, tailsFrom } from './tails.ts';

/** Beyond this, squares leave the range of a double. */
const largest = 1e150;

/** The normal density is below e^-800 of its height outside. */
const normalReach = 40;

/** ln P(T > t): the chi density times a normal tail, integrated over the ratio s of estimated to true SD. */
function logUpperOverRatio(t: number, df: number, ncp: number): number {
  const density = chiDensity(df);
  return logIntegral((s) => density.log(s) + normalLogLower(ncp - t * s), density.from, density.to);
}

/** ln P(T > t), t > 0: the normal density times the share of s below (z + ncp)/t, integrated over z. */
function logUpperOverNormal(t: number, df: number, ncp: number): number {
  const from = Math.max(-normalReach, -ncp);
  const log = (z: number) => {
    const s = Math.max(0, z + ncp) / t;
    return -(z * z) / 2 - halfLogTwoPi + chiSquareTails(df * s * s, df).logLower;
  };
  return logIntegral(log, from, Math.max(normalReach, from + normalReach));
}

/** ln P(T <= t), t > 0: likewise, and all z below -ncp. */
function logLowerOverNormal(t: number, df: number, ncp: number): number {
  const from = Math.max(-normalReach, -ncp);
  const log = (z: number) => {
    const s = Math.max(0, z + ncp) / t;
    return -(z * z) / 2 - halfLogTwoPi + chiSquareTails(df * s * s, df).logUpper;
  };
  const above = logIntegral(log, from, Math.max(normalReach, from + normalReach));
  const below = normalLogLower(-ncp);
  const larger = Math.max(above, below);
  return larger + Math.log1p(Math.exp(Math.min(above, below) - larger));
}

/**
 * P(T <= t) for df >= 1 and noncentrality `ncp`, integrated by Gauss-Legendre panels over the one of the two variables on which the
 * other factor has no sharp step: the ratio s where t is small beside its spread, the normal deviate where it is large. The smaller tail
 * is the one integrated, so both keep their digits.
 */
export function noncentralTTails(t: number, df: number, ncp: number): Tails {
  requireNumber(t, 'A t value');
  requireNumber(ncp, 'A noncentrality');
  if (!(df >= 1)) throw new RangeError('The noncentral t is computed for 1 degree of freedom or more.');
  if (!(Math.abs(ncp) <= largest)) throw new RangeError('A noncentrality is at most 1e150 in size.');
  if (Math.abs(t) === Infinity) return normalTails(t);
  if (Math.abs(t) > largest) throw new RangeError('A t value is at most 1e150 in size, or infinite.');
  if (df === Infinity) return normalTails(t - ncp);
  if (t < 0) return mirrored(noncentralTTails(-t, df, -ncp));
  const isSteep = t > Math.sqrt(2 * df);
  if (t > ncp) return tailsFrom('upper', (isSteep ? logUpperOverNormal : logUpperOverRatio)(t, df, ncp));
  return tailsFrom('lower', isSteep ? logLowerOverNormal(t, df, ncp) : logUpperOverRatio(-t, df, -ncp));
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
