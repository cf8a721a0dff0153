/** What two printed means of one group, one person apart, tell about that person. */

export interface RevealedValue {
  readonly value: number;
  /** How far off the printed digits let it be. */
  readonly low: number;
  readonly high: number;
}

/**
 * n·mean(n) - (n-1)·mean(n-1), known to within (2n - 1) half units of the last printed place. A group may be renewed one person at a
 * time only if that exceeds what the measure can tell apart; otherwise it waits for enough changes (`sitesHoldingTheCut`).
 *
 * @param nAfter people in the later mean; the earlier one has one less
 * @param decimals digits printed after the point
 * @throws RangeError for fewer than 2 people
 */
export function valueBetweenMeans(meanBefore: number, meanAfter: number, nAfter: number, decimals: number): RevealedValue {
  if (!Number.isSafeInteger(nAfter) || nAfter < 2) throw new RangeError('Two means one person apart need at least two people.');
  const value = nAfter * meanAfter - (nAfter - 1) * meanBefore;
  const doubt = ((2 * nAfter - 1) * 0.5) / 10 ** decimals;
  return { value, low: value - doubt, high: value + doubt };
}
