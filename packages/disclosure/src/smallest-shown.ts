/** Counts of 1 to 10 are hidden. Source: US CMS cell size suppression policy (resdac.org, "CMS cell size suppression policy"). */
export const SMALLEST_SHOWN = 11;

/**
 * Checks a policy value: a whole number, at least `SMALLEST_SHOWN`. Policy may be stricter, never looser.
 *
 * @throws RangeError otherwise
 */
export function requireSmallestShown(value: number): number {
  if (!Number.isSafeInteger(value) || value < SMALLEST_SHOWN) {
    throw new RangeError(`The smallest count shown must be a whole number of at least ${String(SMALLEST_SHOWN)}.`);
  }
  return value;
}
