/**
 * Whether a sum or mean rests too much on one or two contributors, so that another contributor (or anybody) could estimate theirs.
 *
 * Source of the rules: Handbook on Statistical Disclosure Control (sdcTools), chapter 4: (n,k) dominance and p%.
 */

/** (n,k): unsafe when the n largest contributors make up more than k percent of the sum. */
export interface ShareVerdict {
  readonly share: number;
  readonly unsafe: boolean;
}

/**
 * @param contributions what each contributor adds, not negative (people per site, steps per person)
 * @param n how many of the largest are taken together @param k percent
 * @throws RangeError for negative or non-finite contributions, no positive one, n below 1, or k outside 0 to 100
 */
export function dominanceByShare(contributions: readonly number[], n: number, k: number): ShareVerdict {
  if (!Number.isSafeInteger(n) || n < 1) throw new RangeError('At least one contributor is taken.');
  requirePercent(k);
  const { sorted, total } = ordered(contributions);
  const largest = sorted.slice(0, n).reduce((sum, value) => sum + value, 0);
  return { share: largest / total, unsafe: largest * 100 > k * total };
}

/** p%: unsafe when the second largest, knowing its own part, can estimate the largest to within p percent. */
export interface EstimateVerdict {
  /** What all but the two largest add: the uncertainty of the second about the first. */
  readonly remainder: number;
  /** What the remainder must reach. */
  readonly limit: number;
  readonly unsafe: boolean;
}

/** @throws RangeError as `dominanceByShare` */
export function dominanceByEstimate(contributions: readonly number[], p: number): EstimateVerdict {
  requirePercent(p);
  const { sorted, total } = ordered(contributions);
  const [first = 0, second = 0] = sorted;
  const remainder = total - first - second;
  const limit = (first * p) / 100;
  return { remainder, limit, unsafe: remainder < limit };
}

/** Fewest sites in a figure shown outside them, and the largest share one of them may have. Source: house rule on dominance. */
export const FEWEST_SITES = 3;
export const LARGEST_SITE_PERCENT = 75;

/** Whether a group's figures may be shown without a single site's consent: at least 3 sites, none with more than 75 percent. */
export function siteDominance(contributions: readonly number[]): {
  readonly sites: number;
  readonly largestShare: number;
  readonly unsafe: boolean;
} {
  const sites = contributions.filter((value) => value > 0).length;
  const { share, unsafe } = dominanceByShare(contributions, 1, LARGEST_SITE_PERCENT);
  return { sites, largestShare: share, unsafe: unsafe || sites < FEWEST_SITES };
}

function ordered(contributions: readonly number[]): { sorted: number[]; total: number } {
  if (contributions.some((value) => !Number.isFinite(value) || value < 0)) throw new RangeError('Contributions are numbers from 0.');
  const total = contributions.reduce((sum, value) => sum + value, 0);
  if (total <= 0) throw new RangeError('Nobody contributes.');
  return { sorted: [...contributions].sort((a, b) => b - a), total };
}

function requirePercent(percent: number): void {
  if (!(percent >= 0 && percent <= 100)) throw new RangeError('A percentage lies between 0 and 100.');
}
