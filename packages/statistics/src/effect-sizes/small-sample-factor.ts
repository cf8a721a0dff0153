import { stirlingError } from '../distributions/log-gamma.ts';
import { requirePositive } from '../distributions/tails.ts';

/**
 * Hedges' factor J(v) = Gamma(v/2)/(sqrt(v/2) Gamma((v - 1)/2)), exact, for v > 1. Through the Stirling errors, so that nothing
 * cancels however large v. Source: Hedges (1981) Journal of Educational Statistics 6:107-128.
 */
export function smallSampleFactor(df: number): number {
  requirePositive(df - 1, 'A number of degrees of freedom less 1');
  if (df === Infinity) return 1;
  const x = df / 2;
  return Math.exp(-(x - 1) * Math.log1p(-0.5 / x) - 0.5 + stirlingError(x) - stirlingError(x - 0.5));
}
