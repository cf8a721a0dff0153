/**
 * Whether the people of a class differ in what is sensitive: if all have the same, being in the class tells it, however large it is.
 *
 * Source: Machanavajjhala A, Kifer D, Gehrke J, Venkitasubramaniam M (2007), l-diversity: privacy beyond k-anonymity, ACM Trans Knowl
 * Discov Data 1(1):3 (distinct, entropy and recursive (c,l) diversity).
 */
import type { CellValue, EquivalenceClass, PersonRow } from './equivalence-classes.ts';

export interface ClassDiversity {
  readonly values: readonly CellValue[];
  readonly size: number;
  /** People per sensitive value, largest first. */
  readonly counts: readonly number[];
  /** Number of different sensitive values. */
  readonly distinct: number;
  /** e to the entropy: the number of equally frequent values with the same uncertainty. */
  readonly entropyL: number;
  readonly mostFrequentShare: number;
  /** Recursive (c,2) diversity holds for every c above this; `Infinity` when all have the same value. */
  readonly recursiveC: number;
}

export interface DiversityReport {
  /** l of the least diverse class. */
  readonly distinct: number;
  readonly entropyL: number;
  readonly classes: readonly ClassDiversity[];
}

/** @throws RangeError when there are no classes, or a row lacks the sensitive column */
export function diversity(rows: readonly PersonRow[], classes: readonly EquivalenceClass[], sensitive: string): DiversityReport {
  if (classes.length === 0) throw new RangeError('There is nobody to report a diversity for.');
  const reports = classes.map(({ values, members }): ClassDiversity => {
    const counts = countsOf(members.map((member) => valueOf(rows[member], sensitive)));
    const [largest = 0, ...others] = counts;
    const rest = others.reduce((sum, count) => sum + count, 0);
    const shares = counts.map((count) => count / members.length);
    return {
      values,
      size: members.length,
      counts,
      distinct: counts.length,
      entropyL: Math.exp(-shares.reduce((sum, share) => sum + share * Math.log(share), 0)),
      mostFrequentShare: largest / members.length,
      recursiveC: largest / rest,
    };
  });
  return {
    distinct: Math.min(...reports.map(({ distinct }) => distinct)),
    entropyL: Math.min(...reports.map(({ entropyL }) => entropyL)),
    classes: reports,
  };
}

function valueOf(row: PersonRow | undefined, name: string): CellValue {
  const value = row?.[name];
  if (value === undefined) throw new RangeError(`A row has no column "${name}".`);
  return value;
}

function countsOf(values: readonly CellValue[]): number[] {
  const counts = new Map<CellValue, number>();
  for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1);
  return [...counts.values()].sort((a, b) => b - a);
}
