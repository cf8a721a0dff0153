/**
 * Members of answers in the shape that fixtures of published figures have. An answer without figures gives none, so its check fails by
 * name.
 */

import type { Coefficient, Interval, NotEstimable, TestFigures } from '../src/index.ts';

export function limits({ lower, upper }: Interval): readonly [number, number] {
  return [lower, upper];
}

export function figures({ statistic, df, p }: TestFigures): { statistic: number; df: readonly number[]; p: number } {
  return { statistic, df, p };
}

/** What `read` takes from the answer; the reason instead where there is none. */
export function membersOf<T extends object>(answer: T | NotEstimable, read: (given: T) => unknown): unknown {
  return 'kind' in answer && answer.kind === 'not-estimable' ? answer : read(answer as T);
}

/** A table of coefficients turned into columns. */
export function coefficientColumns(coefficients: readonly Coefficient[]): Record<string, readonly (number | undefined)[]> {
  return {
    coefficients: coefficients.map((one) => one.estimate),
    standardErrors: coefficients.map((one) => one.standardError),
    lower: coefficients.map((one) => one.interval.lower),
    upper: coefficients.map((one) => one.interval.upper),
    t: coefficients.map((one) => one.test?.statistic),
    p: coefficients.map((one) => one.test?.p),
  };
}
