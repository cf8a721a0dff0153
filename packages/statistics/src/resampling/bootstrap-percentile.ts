/**
 * Percentile interval of any statistic by drawing participants with return. The limits are order statistics, the (B + 1) p-th of the B
 * resampled values, so B is chosen to make that a whole number (1999 or 9999 for 95%). The generator is seeded, and seed and B are part
 * of the answer.
 *
 * Source: Davison & Hinkley (1997) Bootstrap Methods and their Application, section 5.3.1.
 */

import type { Estimate, Interval, NotEstimable } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons, requireLevel, verySmallSample } from '../result.ts';
import { percentText } from '../test-figures.ts';
import { seededGenerator } from './seeded-generator.ts';

export interface BootstrapInput {
  /** Participants to draw from. */
  readonly n: number;
  /**
   * The statistic of the participants whose places, from 0 to n - 1, are listed; a place may be listed more than once. The list is used
   * again: do not keep it.
   */
  readonly statistic: (places: Int32Array) => number;
  readonly seed: number;
  readonly replicates?: number;
  readonly level?: number;
}

export interface BootstrapEstimate extends Estimate {
  readonly seed: number;
  readonly replicates: number;
  /** Standard deviation of the resampled values. */
  readonly standardError: number;
}

/** Limits from the resampled values, by order statistics. */
export function percentileLimits(resampled: Float64Array, level: number): Interval {
  requireLevel(level);
  const place = Number((((resampled.length + 1) * (1 - level)) / 2).toPrecision(12));
  if (!(Number.isInteger(place) && place >= 1))
    throw new RangeError('(B + 1)(1 - level)/2 must be a whole number: choose B = 1999 or 9999.');
  const sorted = resampled.slice().sort();
  return { lower: sorted[place - 1] as number, upper: sorted[sorted.length - place] as number, level };
}

export function bootstrapPercentile({
  n,
  statistic,
  seed,
  replicates = 1999,
  level = 0.95,
}: BootstrapInput): BootstrapEstimate | NotEstimable {
  if (!(Number.isSafeInteger(n) && n >= 0)) throw new RangeError('The number of participants is a whole number from 0 up.');
  const basis = { n, leftOut: nothingLeftOut };
  if (n === 0) return notEstimable(reasons.noData, basis);
  if (n === 1) return notEstimable('n = 1: nothing to resample', basis);
  const places = Int32Array.from({ length: n }, (_, i) => i);
  const estimate = statistic(places);
  if (!Number.isFinite(estimate)) return notEstimable('the statistic cannot be computed', basis);
  const generator = seededGenerator(seed);
  const resampled = new Float64Array(replicates);
  for (let b = 0; b < replicates; b++) {
    for (let i = 0; i < n; i++) places[i] = generator.nextIndex(n);
    resampled[b] = statistic(places);
  }
  if (!resampled.every(Number.isFinite)) return notEstimable('the statistic cannot be computed in some resamples', basis, estimate);
  const mean = resampled.reduce((sum, value) => sum + value, 0) / replicates;
  const spread = resampled.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (replicates - 1);
  if (!Number.isFinite(spread)) return notEstimable(reasons.tooLarge, basis, estimate);
  return {
    kind: 'estimate',
    ...basis,
    estimate,
    interval: percentileLimits(resampled, level),
    seed,
    replicates,
    standardError: Math.sqrt(spread),
    method: `Bootstrap percentile interval (${percentText(level)}) from B = ${replicates} resamples of participants, seed ${seed}.`,
    failedAssumptions: [...verySmallSample(n), ...(n >= 5 && n < 20 ? [`a bootstrap interval from n = ${n} is likely too narrow`] : [])],
  };
}
