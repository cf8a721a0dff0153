/** From recorded values to numbers that may be computed with: what cannot be used is dropped and counted, never guessed. */

import type { LeftOut } from './result.ts';

/** A recorded value. `'unable'` is an outcome ("tried, could not"), counted apart and never taken as a number here. */
export type Observation = number | null | undefined | 'unable';

export interface Sample {
  /** Finite numbers in the order they came. */
  readonly values: Float64Array;
  readonly n: number;
  readonly leftOut: LeftOut;
}

export interface PairedSample {
  readonly first: Float64Array;
  readonly second: Float64Array;
  /** Complete pairs. */
  readonly n: number;
  /** Counted once per pair, by the worse of its two values: missing before unable before non-finite. */
  readonly leftOut: LeftOut;
}

type Fitness = 'usable' | keyof LeftOut;

/** Whether a recorded value can be computed with, and if not, why. */
export function fitness(value: Observation): Fitness {
  if (value === null || value === undefined) return 'missing';
  if (value === 'unable') return 'unable';
  return Number.isFinite(value) ? 'usable' : 'nonFinite';
}

export function cleanSample(observations: ArrayLike<Observation>): Sample {
  const kept = new Float64Array(observations.length);
  const leftOut = { missing: 0, nonFinite: 0, unable: 0 };
  let n = 0;
  for (let i = 0; i < observations.length; i++) {
    const value = observations[i];
    const state = fitness(value);
    if (state === 'usable') kept[n++] = value as number;
    else leftOut[state]++;
  }
  return { values: kept.subarray(0, n), n, leftOut };
}

/** Keeps the positions where both lists hold a finite number. Lists of different length are a mistake of the caller. */
export function cleanPairs(first: ArrayLike<Observation>, second: ArrayLike<Observation>): PairedSample {
  if (first.length !== second.length) throw new RangeError('Paired values need lists of the same length.');
  const a = new Float64Array(first.length);
  const b = new Float64Array(first.length);
  const leftOut = { missing: 0, nonFinite: 0, unable: 0 };
  let n = 0;
  for (let i = 0; i < first.length; i++) {
    const [one, two] = [fitness(first[i]), fitness(second[i])];
    if (one === 'usable' && two === 'usable') {
      a[n] = first[i] as number;
      b[n] = second[i] as number;
      n++;
    } else {
      const worst = (['missing', 'unable', 'nonFinite'] as const).find((state) => state === one || state === two);
      leftOut[worst as keyof LeftOut]++;
    }
  }
  return { first: a.subarray(0, n), second: b.subarray(0, n), n, leftOut };
}

/** Differences are rounded to this step when the instrument's own is not known, so that 0.7 - 0.4 equals 1.1 - 0.8. */
export const defaultResolution = 1e-9;

/** Halves up, as the 15-digit decimal reads. Only near a half does the slow way through the decimal decide. */
function nearestWhole(steps: number): number {
  const fraction = steps - Math.floor(steps);
  if (steps < 1e12 && Math.abs(fraction - 0.5) > 0.001) return Math.round(steps);
  return Math.floor(Number(steps.toPrecision(15)) + 0.5);
}

/**
 * The multiple of `resolution` nearest to `value`, halves away from zero, judged on the 15-digit decimal: 0.7 - 0.4 and 1.1 - 0.8
 * become the same double. A value too large to have digits at that step comes back unchanged.
 */
export function roundToResolution(value: number, resolution: number): number {
  if (!(resolution > 0) || !Number.isFinite(resolution)) throw new RangeError('A resolution is a positive number.');
  if (Number.isNaN(value)) throw new RangeError('Only a number can be rounded.');
  const steps = Math.abs(value / resolution);
  if (!(steps < 2 ** 53)) return value;
  const whole = Math.sign(value) * nearestWhole(steps);
  // Dividing by 100 gives the double nearest to the decimal; multiplying by 0.01 does not.
  const perUnit = Math.round(1 / resolution);
  const divides = perUnit >= 1 && Math.abs(perUnit * resolution - 1) < 1e-12;
  return divides ? whole / perUnit + 0 : whole * resolution + 0;
}

/** Follow-up minus baseline of complete pairs, each rounded to the instrument's resolution. */
export function changes(pairs: PairedSample, resolution: number = defaultResolution): Float64Array {
  return pairs.second.map((after, i) => roundToResolution(after - (pairs.first[i] as number), resolution));
}
