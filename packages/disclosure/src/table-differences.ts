/** Differencing of two tables of counts: both may be safe while what lies between them is not. */
import type { CountTable, Place } from './count-table.ts';
import { placeAt, withTotals } from './count-table.ts';
import { requireSmallestShown, SMALLEST_SHOWN } from './smallest-shown.ts';

/**
 * Places, totals included, at which two tables of the same shape differ by 1 to 10 people: all sites against all but one, this
 * release against the last.
 *
 * @throws RangeError when the shapes differ or a table is malformed
 */
export function smallDifferences(one: CountTable, other: CountTable, smallestShown: number = SMALLEST_SHOWN): Place[] {
  const limit = requireSmallestShown(smallestShown) - 1;
  const [a, b] = [withTotals(one), withTotals(other)];
  if (a.rows !== b.rows || a.columns !== b.columns) throw new RangeError('The two tables differ in shape.');
  return a.values.flatMap((value, position) => {
    const difference = Math.abs(value - (b.values[position] ?? 0));
    return difference >= 1 && difference <= limit ? [placeAt(a, position)] : [];
  });
}
