/** ln 0!, ln 1!, … ln n! as a list, for loops over tables of counts. */

import { logGamma } from '../distributions/log-gamma.ts';

export function logFactorials(n: number): Float64Array {
  return Float64Array.from({ length: n + 1 }, (_, i) => logGamma(i + 1));
}
