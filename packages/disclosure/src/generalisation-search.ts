/**
 * Searches how far to coarsen each quasi-identifier so that everybody shares their values with enough others. All combinations of
 * levels are tried; offered are the best few by loss, without those that are merely a coarser version of another one that leaves out as few people.
 *
 * Source: full-domain generalisation, Samarati P (2001), Protecting respondents' identities in microdata release, IEEE Trans Knowl
 * Data Eng 13:1010-1027; loss as the mean height of generalisation, after Sweeney L (2002), Int J Uncertainty Fuzziness Knowl-Based
 * Syst 10:571-588.
 */
import type { CellValue } from './equivalence-classes.ts';
import type { RiskReport } from './risk-report.ts';
import { riskReport } from './risk-report.ts';

export interface GeneralisationLevel<Row> {
  /** As the steward reads it: "10-year bands". */
  readonly name: string;
  readonly of: (row: Row) => CellValue;
}

/** Levels from finest to coarsest; each must be a function of the one before. A last level with one value for all drops the variable. */
export interface GeneralisedVariable<Row> {
  readonly key: string;
  readonly levels: readonly GeneralisationLevel<Row>[];
}

export interface GeneralisationSearch<Row> {
  /** One row per person. */
  readonly rows: readonly Row[];
  readonly variables: readonly GeneralisedVariable<Row>[];
  /** Smallest class wanted. */
  readonly k: number;
  /** Largest share of people (0 to 1) that may be left out instead of coarsening for them; without it, nobody. */
  readonly largestShareLeftOut?: number;
}

export interface Generalisation {
  /** Level chosen per variable, by position. */
  readonly levels: Readonly<Record<string, number>>;
  /** Mean height of generalisation (0 = all as they are, 1 = all at their coarsest) plus the share of people left out. */
  readonly loss: number;
  /** People in classes below k, who would be left out. */
  readonly leftOut: number;
  /** Risk of those who stay. */
  readonly risk: RiskReport;
}

interface Candidate {
  readonly heights: readonly number[];
  readonly offer: Generalisation;
}

/** How many are offered. */
const OFFERS = 3;

/**
 * The best choices, best first; ties go to the finer earlier variable. Empty when even the coarsest levels do not reach k.
 *
 * @throws RangeError when there is nobody, no variable or level, k is no whole number from 2, the share lies outside 0 to 1, or a
 * level is not a function of the finer one
 */
export function searchGeneralisations<Row>(search: GeneralisationSearch<Row>): Generalisation[] {
  const { rows, variables, k, largestShareLeftOut = 0 } = search;
  if (rows.length === 0) throw new RangeError('There is nobody to generalise for.');
  if (!Number.isSafeInteger(k) || k < 2) throw new RangeError('The smallest class wanted is a whole number from 2.');
  if (!(largestShareLeftOut >= 0 && largestShareLeftOut < 1)) throw new RangeError('The share left out lies between 0 and 1.');
  if (variables.length === 0 || variables.some(({ levels }) => levels.length === 0)) throw new RangeError('A variable has no level.');

  const codes = variables.map((variable) => codesByLevel(rows, variable));
  const goodEnough: Candidate[] = [];
  const descend = (classOf: Int32Array, heights: readonly number[]): void => {
    const levels = codes[heights.length];
    if (levels === undefined) {
      const offer = judge(classOf, heights, variables, k);
      if (offer !== undefined && offer.leftOut <= largestShareLeftOut * rows.length) goodEnough.push({ heights, offer });
      return;
    }
    levels.forEach((codesAtLevel, height) => descend(split(classOf, codesAtLevel), [...heights, height]));
  };
  descend(new Int32Array(rows.length), []);

  return goodEnough
    .filter((one) => !goodEnough.some((other) => other !== one && isNoWorse(other, one)))
    .sort((a, b) => a.offer.loss - b.offer.loss || firstDifference(a.heights, b.heights))
    .slice(0, OFFERS)
    .map(({ offer }) => offer);
}

/** Per level, a small number for each row's value. */
function codesByLevel<Row>(rows: readonly Row[], variable: GeneralisedVariable<Row>): Int32Array[] {
  const byLevel = variable.levels.map(({ of }) => {
    const numbers = new Map<CellValue, number>();
    return Int32Array.from(rows, (row) => numberOf(numbers, of(row)));
  });
  byLevel.forEach((coarse, height) => {
    const parent = new Map<number, number>();
    byLevel[height - 1]?.forEach((fine, row) => {
      const value = coarse[row] ?? 0;
      if ((parent.get(fine) ?? value) !== value) throw new RangeError(`Levels of "${variable.key}" are not nested.`);
      parent.set(fine, value);
    });
  });
  return byLevel;
}

function numberOf<Key>(numbers: Map<Key, number>, key: Key): number {
  const known = numbers.get(key) ?? numbers.size;
  numbers.set(key, known);
  return known;
}

/** Splits classes by one more variable and numbers the parts anew. */
function split(classOf: Int32Array, codes: Int32Array): Int32Array {
  const span = codes.reduce((most, code) => Math.max(most, code), 0) + 1;
  const numbers = new Map<number, number>();
  return classOf.map((group, row) => numberOf(numbers, group * span + (codes[row] ?? 0)));
}

function judge<Row>(
  classOf: Int32Array,
  heights: readonly number[],
  variables: readonly GeneralisedVariable<Row>[],
  k: number,
): Generalisation | undefined {
  const sizes: number[] = [];
  for (const group of classOf) sizes[group] = (sizes[group] ?? 0) + 1;
  const staying = sizes.filter((size) => size >= k);
  if (staying.length === 0) return undefined;
  const risk = riskReport(staying);
  const leftOut = classOf.length - risk.people;
  const height = variables.reduce((sum, { levels }, at) => sum + (levels.length > 1 ? (heights[at] ?? 0) / (levels.length - 1) : 0), 0);
  return {
    levels: Object.fromEntries(variables.map(({ key }, at) => [key, heights[at] ?? 0])),
    loss: height / variables.length + leftOut / classOf.length,
    leftOut,
    risk,
  };
}

/** At least as fine in every variable, and no more people left out. */
function isNoWorse(one: Candidate, other: Candidate): boolean {
  return one.offer.leftOut <= other.offer.leftOut && one.heights.every((height, at) => height <= (other.heights[at] ?? 0));
}

function firstDifference(a: readonly number[], b: readonly number[]): number {
  const at = a.findIndex((height, index) => height !== b[index]);
  return at === -1 ? 0 : (a[at] ?? 0) - (b[at] ?? 0);
}
