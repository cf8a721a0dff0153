/**
 * Where the figure of a site of n people is expected around the registry's value: exact binomial limits for a proportion, interpolated
 * between counts so that they are smooth in n, and normal limits for a mean.
 *
 * Source: Spiegelhalter (2005) Stat Med 24:1185-1202. For a proportion: r = smallest count with P(X <= r) >= p, limit = (r - (P(X <= r) -
 * p)/P(X = r))/n, clipped to 0 and 1.
 */

import { binomialMass, binomialQuantile, binomialTails } from '../distributions/binomial.ts';
import { normalQuantile } from '../distributions/normal.ts';
import { requireProbability } from '../distributions/tails.ts';

/** Limit at the lower-tail probability `p` for a site of `n` people around the proportion `target`. */
export function proportionFunnelLimit(target: number, n: number, p: number): number {
  if (!(target > 0 && target < 1)) throw new RangeError('The value that sites are held against lies strictly between 0 and 1.');
  if (!(Number.isSafeInteger(n) && n >= 1)) throw new RangeError('A site has at least one person.');
  requireProbability(p);
  const count = binomialQuantile(p, n, target);
  const { lower, upper } = binomialTails(count, n, target);
  // The overshoot from whichever tail is small.
  const overshoot = p > 0.5 ? 1 - p - upper : lower - p;
  return Math.min(1, Math.max(0, (count - overshoot / binomialMass(count, n, target)) / n));
}

/** Limit at the lower-tail probability `p` for the mean of `n` people whose standard deviation within sites is `sdWithin`. */
export function meanFunnelLimit(target: number, sdWithin: number, n: number, p: number): number {
  if (!(Number.isFinite(target) && Number.isFinite(sdWithin) && sdWithin > 0))
    throw new RangeError('A funnel needs a finite value and a positive standard deviation.');
  if (!(Number.isSafeInteger(n) && n >= 1)) throw new RangeError('A site has at least one person.');
  if (!(p > 0 && p < 1)) throw new RangeError('A limit of a funnel is asked for at a probability strictly between 0 and 1.');
  const limit = target + (normalQuantile(p) * sdWithin) / Math.sqrt(n);
  if (!Number.isFinite(limit)) throw new RangeError('A funnel as wide as this cannot be computed.');
  return limit;
}
