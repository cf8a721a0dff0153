/**
 * How likely people are found again in a set of rows.
 *
 * Prosecutor risk is used because relatives and staff know who trained where: whoever looks for a person knows that the person is in
 * the file, and finds them with probability 1 / class size. Source of the terms and of k: Sweeney L (2002), k-anonymity: a model for
 * protecting privacy, Int J Uncertainty Fuzziness Knowl-Based Syst 10:557-570; El Emam K et al. (2010), PMC2858714.
 */
export interface RiskReport {
  readonly people: number;
  readonly classes: number;
  /** k: every person shares their quasi-identifiers with at least k - 1 others. */
  readonly smallestClass: number;
  /** People alone in their class. */
  readonly unique: number;
  readonly inClassesBelow5: number;
  readonly inClassesBelow11: number;
  /** Prosecutor risk of the person easiest to find: 1 / k. */
  readonly highestRisk: number;
  /** Marketer risk, the share of people linked rightly on average: classes / people. */
  readonly averageRisk: number;
}

/**
 * @param sizes people per equivalence class
 * @throws RangeError when there is nobody, or a size is no whole number from 1
 */
export function riskReport(sizes: readonly number[]): RiskReport {
  if (sizes.length === 0) throw new RangeError('There is nobody to report a risk for.');
  if (sizes.some((size) => !Number.isSafeInteger(size) || size < 1)) throw new RangeError('A class holds a whole number of people from 1.');
  const peopleBelow = (limit: number) => sizes.reduce((sum, size) => (size < limit ? sum + size : sum), 0);
  const people = peopleBelow(Number.POSITIVE_INFINITY);
  const smallestClass = sizes.reduce((least, size) => Math.min(least, size));
  return {
    people,
    classes: sizes.length,
    smallestClass,
    unique: peopleBelow(2),
    inClassesBelow5: peopleBelow(5),
    inClassesBelow11: peopleBelow(11),
    highestRisk: 1 / smallestClass,
    averageRisk: sizes.length / people,
  };
}
