import { requireSmallestShown, SMALLEST_SHOWN } from './smallest-shown.ts';

/** People beyond a quantile that is shown, on its nearer side, at least: quartiles from 20 people, tenths from 50, twentieths from 100. */
const FEWEST_BEYOND = 5;

/**
 * Whether a quantile of n people may be shown. The median needs 11, like every figure; minimum and maximum are never shown.
 * A shown quantile is rounded to the measure's step, as with type 7 it is one person's own value whenever (n - 1)·p is whole.
 *
 * Source: house rule on order statistics (five people beyond a shown quantile).
 *
 * @param p between 0 and 1
 * @throws RangeError otherwise
 */
export function isQuantileShown(n: number, p: number, smallestShown: number = SMALLEST_SHOWN): boolean {
  if (!(p >= 0 && p <= 1)) throw new RangeError('A quantile lies between 0 and 1.');
  const nearerSide = Math.min(p, 1 - p);
  // A margin for decimal fractions such as 0.05, which have no exact binary form.
  return n >= requireSmallestShown(smallestShown) && n * nearerSide > FEWEST_BEYOND - 1e-9;
}
