/** Distribution functions against the values computed with mpmath. */

import * as statistics from '../src/index.ts';
import type { ReferenceCheck, Tolerance } from './agreement.ts';
import values from './distribution-values.json' with { type: 'json' };

interface Row {
  readonly args: readonly number[];
  readonly expected: number;
  readonly tail?: string;
}

interface FunctionValues {
  readonly rows: readonly Row[];
}

type Answer = number | statistics.Tails;

/** Arguments in the order the fixture names them. */
const functions: Readonly<Record<string, (a: number, b: number, c: number, d: number) => Answer>> = {
  normal: (x) => statistics.normalTails(x),
  normalQuantile: (p) => statistics.normalQuantile(p),
  t: (t, df) => statistics.tTails(t, df),
  tQuantile: (p, df) => statistics.tQuantile(p, df),
  chiSquare: (x, df) => statistics.chiSquareTails(x, df),
  chiSquareQuantile: (p, df) => statistics.chiSquareQuantile(p, df),
  f: (f, df1, df2) => statistics.fTails(f, df1, df2),
  fQuantile: (p, df1, df2) => statistics.fQuantile(p, df1, df2),
  beta: (x, a, b) => statistics.betaTails(x, a, b),
  betaQuantile: (p, a, b) => statistics.betaQuantile(p, a, b),
  noncentralT: (t, df, ncp) => statistics.noncentralTTails(t, df, ncp),
  studentisedRange: (q, groups, df) => statistics.studentisedRangeTails(q, groups, df),
  studentisedRangeQuantile: (p, groups, df) => statistics.studentisedRangeQuantile(p, groups, df),
  binomial: (x, trials, probability) => statistics.binomialTails(x, trials, probability),
  binomialMass: (x, trials, probability) => statistics.binomialMass(x, trials, probability),
  gamma: (x, shape, scale) => statistics.gammaTails(x, shape, scale),
  gammaQuantile: (p, shape, scale) => statistics.gammaQuantile(p, shape, scale),
  poisson: (x, mean) => statistics.poissonTails(x, mean),
  poissonMass: (x, mean) => statistics.poissonMass(x, mean),
  hypergeometricMass: (x, marked, unmarked, draws) => statistics.hypergeometricMass(x, marked, unmarked, draws),
  logGamma: (x) => statistics.logGamma(x),
  hypergeometric: (x, marked, unmarked, draws) => statistics.hypergeometricTails(x, marked, unmarked, draws),
  signedRank: (v, n) => statistics.signedRankTails(v, n),
  rankSum: (u, m, n) => statistics.rankSumTails(u, m, n),
};

/** Tighter than needed for any printed figure; values below the smallest normal double may be answered by 0. */
const tolerance: Tolerance = { rel: 1e-11, abs: 1e-300 };
const rangeTolerance: Tolerance = { rel: 1e-9, abs: 1e-300 };

export const distributionChecks: readonly ReferenceCheck[] = Object.entries(functions).flatMap(([name, call]) =>
  (values.functions as Readonly<Record<string, FunctionValues>>)[name]!.rows.map((row): ReferenceCheck => {
    const [a = 0, b = 0, c = 0, d = 0] = row.args;
    return {
      id: `${name}(${row.args.join(', ')}) ${row.tail ?? ''}`.trim(),
      method: 'distributions',
      source: 'mpmath 1.3.0 at 40 digits',
      compute: () => {
        const answer = call(a, b, c, d);
        return typeof answer === 'number' ? answer : row.tail === 'upper' ? answer.upper : answer.lower;
      },
      expected: row.expected,
      tolerance: name.startsWith('studentisedRange') ? rangeTolerance : tolerance,
    };
  }),
);
