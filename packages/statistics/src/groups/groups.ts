/** Several named groups of recorded values, cleaned, with the groups that cannot take part set aside and named. */

import { computableScale } from '../description/computable-scale.ts';
import type { Moments } from '../description/moments.ts';
import { moments } from '../description/moments.ts';
import type { Basis } from '../result.ts';
import { addLeftOut } from '../result.ts';
import type { Observation } from '../samples.ts';
import { cleanSample } from '../samples.ts';

export interface Group {
  readonly name: string;
  readonly values: ArrayLike<Observation>;
}

export interface CleanGroup {
  readonly name: string;
  readonly values: Float64Array;
}

/** A group that took no part in a comparison, and why. Its values are not in the n of the answer. */
export interface GroupSetAside {
  readonly name: string;
  readonly n: number;
  readonly reason: string;
}

export interface ComparableGroups {
  readonly groups: readonly CleanGroup[];
  readonly setAside: readonly GroupSetAside[];
  readonly basis: Basis;
}

/** Keeps groups of at least `least` values for which `unfit` gives no reason. */
export function comparableGroups(
  groups: readonly Group[],
  least: number,
  unfit: (values: Float64Array) => string | undefined = () => undefined,
): ComparableGroups {
  const cleaned = groups.map(({ name, values }) => ({ name, sample: cleanSample(values) }));
  const kept: CleanGroup[] = [];
  const setAside: GroupSetAside[] = [];
  for (const { name, sample } of cleaned) {
    const reason = sample.n === 0 ? 'no data' : sample.n < least ? `fewer than ${least} values` : unfit(sample.values);
    if (reason === undefined) kept.push({ name, values: sample.values });
    else setAside.push({ name, n: sample.n, reason });
  }
  return {
    groups: kept,
    setAside,
    basis: {
      n: kept.reduce((sum, group) => sum + group.values.length, 0),
      leftOut: addLeftOut(...cleaned.map(({ sample }) => sample.leftOut)),
    },
  };
}

/** Cautions to print with a comparison: the groups set aside, and groups so small that little can be said. */
export function groupCautions({ groups, setAside }: ComparableGroups): string[] {
  const small = groups
    .filter((group) => group.values.length < 5)
    .map((group) => `very small group: ${group.name} (n = ${group.values.length})`);
  return [...setAside.map((group) => `group left out: ${group.name} (n = ${group.n}, ${group.reason})`), ...small];
}

export interface ScaledMoments {
  readonly of: readonly Moments[];
  /** Of the values as given: mean of group i is (of[i].mean + shift) * factor. */
  readonly shift: number;
  readonly factor: number;
}

/**
 * Moments of each group after the overall mean was taken off every value, which saves the digits of between-group differences in
 * data with a large common part (NIST SmLs sets).
 */
export function centredMoments(groups: readonly CleanGroup[]): ScaledMoments | 'too large' {
  const scaled = computableScale(groups.map((group) => group.values));
  if (scaled === 'too large') return scaled;
  const sizes = scaled.samples.map((sample) => sample.length);
  const total = sizes.reduce((sum, size) => sum + size, 0);
  const shift = scaled.samples.reduce((sum, sample) => sum + moments(sample).mean * (sample.length / total), 0);
  return { of: scaled.samples.map((sample) => moments(sample.map((value) => value - shift))), shift, factor: scaled.factor };
}

/** Mean of group means weighted by n. */
export function pooledMean(of: readonly Moments[]): number {
  const total = of.reduce((sum, group) => sum + group.n, 0);
  return of.reduce((sum, group) => sum + group.n * group.mean, 0) / total;
}
