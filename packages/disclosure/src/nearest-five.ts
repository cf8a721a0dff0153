/**
 * Counts for public pages, to the nearest 5. Totals are rounded from the true totals, so a line need not add up. Rounding does not
 * replace hiding: with several tables a reader narrows a count down again.
 *
 * @param count a whole number from 0; what is not shown must not be rounded either
 * @throws RangeError otherwise
 */
export function nearestFive(count: number): number {
  if (!Number.isSafeInteger(count) || count < 0) throw new RangeError('Counts of people are whole numbers from 0.');
  return 5 * Math.round(count / 5);
}
