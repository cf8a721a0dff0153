import { noncentralityWithLowerTail } from '../distributions/noncentral-t.ts';
import type { Interval } from '../result.ts';

/** Larger standardised means come of a spread that is rounding, and their noncentralities leave the range of a double. */
const largestT = 1e100;

/**
 * Interval for a standardised mean t × `unit`: the noncentralities that put the observed t at the two tails, times `unit`.
 * None where t is beyond 1e100.
 * Source: Steiger & Fouladi (1997) in Harlow, Mulaik & Steiger (eds), What If There Were No Significance Tests?, chapter 9.
 */
export function noncentralInterval(t: number, df: number, unit: number, level: number): Interval | undefined {
  if (!(Math.abs(t) <= largestT)) return undefined;
  const tail = (1 - level) / 2;
  return {
    lower: noncentralityWithLowerTail(t, df, 1 - tail) * unit,
    upper: noncentralityWithLowerTail(t, df, tail) * unit,
    level,
  };
}

export function scaledInterval(interval: Interval, by: number): Interval {
  return { lower: interval.lower * by, upper: interval.upper * by, level: interval.level };
}
