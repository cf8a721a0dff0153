import { excessOverLog } from './deviance.ts';
import { stirlingError } from './log-gamma.ts';

/**
 * ln density of s = sqrt(chi-square/df), the ratio of an estimated to the true standard deviation, and the range of s outside which
 * it is below e^-800. For df >= 1 its logarithm is concave.
 */
export function chiDensity(df: number): { readonly log: (s: number) => number; readonly from: number; readonly to: number } {
  const a = df / 2;
  const constant = Math.LN2 + Math.log(a / (2 * Math.PI)) / 2 - stirlingError(a);
  const reach = 40 / Math.sqrt(df);
  return {
    from: Math.max(1e-300, 1 - reach),
    to: 1 + reach,
    log: (s) => {
      // Near the centre the power and the exponential nearly cancel; far from it they do not.
      if (s < 0.5) return constant + (df - 1) * Math.log(s) + a * (1 - s * s);
      return constant - a * excessOverLog((s - 1) * (s + 1)) - Math.log(s);
    },
  };
}
