/** The shape of the JSON fixtures: figures from outside this project, by case. */
import type { Tolerance } from './agreement.ts';

export interface FixtureCase {
  readonly id: string;
  /** Data set, with the package it ships in. */
  readonly dataset: string;
  readonly origin: string;
  /* eslint-disable @typescript-eslint/no-explicit-any -- the members differ from case to case; the checks that read them name what they expect */
  readonly inputs: any;
  readonly expected: any;
  /* eslint-enable @typescript-eslint/no-explicit-any */
  readonly tolerance: Tolerance;
}

export interface Fixture {
  /** Software and versions that computed the expected figures. */
  readonly source: string;
  readonly cases: readonly FixtureCase[];
}

/** The cases whose id starts with `prefix`; none is a mistake in the prefix. */
export function casesOf(fixture: Fixture, prefix: string): readonly FixtureCase[] {
  const found = fixture.cases.filter((one) => one.id.startsWith(prefix));
  if (found.length === 0) throw new Error(`No reference case starts with "${prefix}".`);
  return found;
}
