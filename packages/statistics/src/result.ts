/**
 * What every statistical function of this package answers: a figure with all that must be printed beside it,
 * or the reason why there is none. No function answers NaN, null or a silent stand-in.
 */

/** Values that a figure was not computed from, by reason. `unable`: the assessment was tried and the participant could not do it. */
export interface LeftOut {
  readonly missing: number;
  readonly nonFinite: number;
  readonly unable: number;
}

/** Two-sided interval; `level` is 0.95 unless asked otherwise. Limits may be infinite only where the header of the function says so. */
export interface Interval {
  readonly lower: number;
  readonly upper: number;
  readonly level: number;
}

/** What every answer carries, whether there is a figure or not. */
export interface Basis {
  /** Effective n: values (or complete pairs, or people) the figure rests on. For several groups the total. */
  readonly n: number;
  readonly leftOut: LeftOut;
}

/** What a figure carries besides its value. */
export interface Provenance extends Basis {
  /** One sentence fit for the methods section of a paper: the method, its variant, sidedness, level. */
  readonly method: string;
  /** What to print beside the figure as a caution, such as "very small sample (n = 3)". Empty when all is well. */
  readonly failedAssumptions: readonly string[];
}

export interface Estimate extends Provenance {
  readonly kind: 'estimate';
  readonly estimate: number;
  readonly interval: Interval;
}

/** Why there is no figure, in words that can be printed in its place. */
export interface NotEstimable extends Basis {
  readonly kind: 'not-estimable';
  readonly reason: string;
  /** The point estimate where that alone can still be shown (the mean of a single value, say). */
  readonly pointEstimate?: number;
}

export type StatisticName = 't' | 'F' | 'z' | 'chi-square' | 'V' | 'U' | 'J' | 'H' | 'r' | 'rho' | 'tau' | 'count' | 'table probability';

/** `df` lists the degrees of freedom in the order of print: none for a rank or exact test, two for F. */
export interface TestFigures {
  readonly statisticName: StatisticName;
  readonly statistic: number;
  readonly df: readonly number[];
  /** Two-sided unless the method sentence says otherwise. */
  readonly p: number;
}

/** A test without an estimate of its own (an omnibus test, a test of a table). */
export interface TestResult extends Provenance, TestFigures {
  readonly kind: 'test';
}

/** An estimate with its interval and the test that belongs to it. */
export interface TestedEstimate extends Estimate {
  readonly test: TestFigures;
}

/** One figure among several of an answer: its value, or why it is not there, in words to print in its place. */
export type Figure<T = number> = { readonly kind: 'figure'; readonly value: T } | { readonly kind: 'no-figure'; readonly reason: string };

export function figure<T>(value: T): Figure<T> {
  return { kind: 'figure', value };
}

export function noFigure(reason: string): { readonly kind: 'no-figure'; readonly reason: string } {
  return { kind: 'no-figure', reason };
}

export type EstimateResult = Estimate | NotEstimable;
export type TestedEstimateResult = TestedEstimate | NotEstimable;
export type TestOutcome = TestResult | NotEstimable;

export const nothingLeftOut: LeftOut = { missing: 0, nonFinite: 0, unable: 0 };

/** Sum of what was left out of several samples. */
export function addLeftOut(...parts: readonly LeftOut[]): LeftOut {
  return parts.reduce(
    (sum, part) => ({ missing: sum.missing + part.missing, nonFinite: sum.nonFinite + part.nonFinite, unable: sum.unable + part.unable }),
    nothingLeftOut,
  );
}

export function notEstimable(reason: string, basis: Basis, pointEstimate?: number): NotEstimable {
  return {
    kind: 'not-estimable',
    reason,
    n: basis.n,
    leftOut: basis.leftOut,
    ...(pointEstimate === undefined ? {} : { pointEstimate }),
  };
}

/** Wordings that several functions share, so that the same lack reads the same everywhere. */
export const reasons = {
  noData: 'no data',
  singleValue: 'n = 1, SD not defined',
  allEqual: 'all values equal',
  noComparison: 'no comparison possible',
  tooLarge: 'values too large to compute with',
  tooSmall: 'values too close together to compute with',
} as const;

/** An interval from fewer than five values is shown, but marked. */
export function verySmallSample(n: number): readonly string[] {
  return n < 5 ? [`very small sample (n = ${n})`] : [];
}

/** Refuses a level outside (0, 1): a mistake of the caller, not of the data. */
export function requireLevel(level: number): void {
  if (!(level > 0 && level < 1)) throw new RangeError('The level of an interval lies strictly between 0 and 1.');
}
