/**
 * Speed of the statistics at sizes a registry can reach. Run with `npx tsx --conditions @cairnstep/source bench/statistics.bench.ts`;
 * a benchmark runner imports `scenarios`.
 */

import { pathToFileURL } from 'node:url';
import {
  describe,
  mannWhitneyTest,
  noncentralTTails,
  oneWayAnova,
  pairedChange,
  signedRankTest,
  standardisedDifference,
  studentisedRangeQuantile,
  tQuantile,
  tukeyKramer,
  welchTest,
} from '../src/index.ts';

export interface Scenario {
  readonly name: string;
  /** What the time is held against, in words. */
  readonly goal: string;
  readonly run: () => unknown;
}

/** Repeatable numbers with two decimals between 0 and 10: a linear congruential generator (Numerical Recipes, ranqd1). */
function numbers(count: number, start: number): Float64Array {
  let state = start;
  return Float64Array.from({ length: count }, () => {
    state = (state * 1664525 + 1013904223) >>> 0;
    return Math.floor((state / 2 ** 32) * 1000) / 100;
  });
}

const million = numbers(1_000_000, 1);
const thousands = [numbers(30_000, 2), numbers(30_000, 3)] as const;
const twoHundred = numbers(200, 4).map((value) => value - 4.5);
const fifties = [numbers(50, 5), numbers(50, 6)] as const;
const groups = Array.from({ length: 6 }, (_, i) => ({ name: `group ${i + 1}`, values: numbers(5_000, 7 + i) }));

export const scenarios: readonly Scenario[] = [
  { name: 'sort 1,000,000 numbers', goal: 'the measure for the next line', run: () => million.slice().sort() },
  { name: 'describe 1,000,000 numbers, with quartiles', goal: 'within 3 times the sort', run: () => describe(million) },
  { name: 'paired change of 30,000 people', goal: 'a blink', run: () => pairedChange(thousands[0], thousands[1], 0.01) },
  { name: 'Welch test of 2 x 30,000', goal: 'a blink', run: () => welchTest(thousands[0], thousands[1]) },
  { name: 'exact signed rank test, n = 200, with interval', goal: 'under 20 ms', run: () => signedRankTest(twoHundred, 0.01) },
  { name: 'exact Mann-Whitney test, 50 + 50 with ties', goal: 'under 100 ms', run: () => mannWhitneyTest(fifties[0], fifties[1]) },
  { name: 'Mann-Whitney test of 2 x 30,000, with shift', goal: 'under a second', run: () => mannWhitneyTest(thousands[0], thousands[1]) },
  { name: 'analysis of variance, 6 groups of 5,000', goal: 'a blink', run: () => oneWayAnova(groups) },
  { name: 'Tukey-Kramer, 6 groups of 5,000', goal: 'under 500 ms', run: () => tukeyKramer(groups) },
  { name: 'Hedges g of 2 x 50 with interval', goal: 'a blink', run: () => standardisedDifference(fifties[0], fifties[1]) },
  { name: 't quantile', goal: 'microseconds', run: () => tQuantile(0.975, 17.3) },
  { name: 'noncentral t, both tails', goal: 'under 1 ms', run: () => noncentralTTails(2.1, 18, 1.3) },
  { name: 'studentised range quantile, 6 groups', goal: 'under 100 ms', run: () => studentisedRangeQuantile(0.95, 6, 66) },
];

/** Median of several runs, in milliseconds, after one to warm up. */
export function medianTime(run: () => unknown, repeats = 7): number {
  run();
  const times = Array.from({ length: repeats }, () => {
    const start = performance.now();
    run();
    return performance.now() - start;
  }).sort((a, b) => a - b);
  return times[repeats >> 1] as number;
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  for (const { name, goal, run } of scenarios) console.log(`${medianTime(run).toFixed(3).padStart(10)} ms  ${name} (${goal})`);
}
