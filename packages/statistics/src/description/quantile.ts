/**
 * Sample quantile, type 7 of Hyndman & Fan (1996) American Statistician 50:361-365: h = (n - 1) p, linear between the order
 * statistics on either side. The type of R, NumPy, PostgreSQL's percentile_cont and the inclusive percentile of spreadsheets.
 */

import { quantileSorted } from 'simple-statistics';

/** Of values in ascending order, at least one of them; 0 <= p <= 1. */
export function quantileOfSorted(sorted: Float64Array, p: number): number {
  if (!(p >= 0 && p <= 1)) throw new RangeError('A quantile is asked for at a share between 0 and 1.');
  if (sorted.length === 0) throw new RangeError('A quantile needs at least one value.');
  // The declaration asks for an array; the code reads length and elements only.
  const found = quantileSorted(sorted as unknown as number[], p);
  if (!Number.isFinite(found)) throw new RangeError('Values as large as these cannot be computed with.');
  return found;
}

/** Of finite values in any order, which are left as they are. */
export function quantile(values: Float64Array, p: number): number {
  return quantileOfSorted(values.slice().sort(), p);
}
