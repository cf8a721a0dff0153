/**
 * Which code computes a method, and why that. The two libraries were measured against R, NIST and mpmath before the choice; what they do
 * to the last digits they do here, the rest is the registry's own code.
 */

export type Library = 'own code' | 'simple-statistics';

export interface Computation {
  readonly by: readonly Library[];
  readonly why: string;
}

export const computations = {
  describing: {
    by: ['simple-statistics', 'own code'],
    why: 'Mean and quantiles by simple-statistics, whose compensated sums reach every digit certified by NIST. Squares and cubes in a second pass of own code, which gives exactly 0 where all values are equal.',
  },
  quantiles: { by: ['simple-statistics'], why: 'Its quantiles are of type 7, equal to those of R. Those of jstat are of another type.' },
  means: {
    by: ['simple-statistics', 'own code'],
    why: 'Means by simple-statistics. Tests and limits by own code: the t tests of simple-statistics give no p, those of jstat assume equal variances.',
  },
  ranks: {
    by: ['own code'],
    why: 'simple-statistics stops at the rank sum and jstat has no rank test; neither counts the exact distribution.',
  },
  studentisedRange: {
    by: ['own code'],
    why: 'jstat has the studentised range with an absolute error of about 1e-10, too much for a small p. It is the second opinion in the tests.',
  },
  counts: { by: ['own code'], why: 'Neither simple-statistics nor jstat has it with an exact p or exact limits.' },
  correlation: {
    by: ['own code'],
    why: 'Columns are centred and scaled first, so that numbers of any size keep their digits. simple-statistics gives the coefficient alone and is the second opinion in the tests.',
  },
  regression: {
    by: ['own code'],
    why: 'jstat solves the normal equations, which costs digits (NIST’s Longley set: 10 there, 13 here); simple-statistics has one predictor only and is the second opinion in the tests.',
  },
  absent: { by: ['own code'], why: 'Neither simple-statistics nor jstat has it.' },
  distributions: {
    by: ['own code'],
    why: 'Measured against the same values, jstat keeps 7 to 10 digits and loses tails below 1e-16, and simple-statistics reads the normal distribution from a table of four decimals. jstat is the second opinion in the tests.',
  },
  rounding: { by: ['own code'], why: 'The language’s own rounding takes 1.005 to 1.00, because it sees the binary number.' },
  resampling: {
    by: ['own code'],
    why: 'The same data and seed must give the same limits everywhere, so the generator is part of the method.',
  },
} as const satisfies Readonly<Record<string, Computation>>;
