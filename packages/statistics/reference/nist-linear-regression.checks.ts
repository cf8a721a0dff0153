/**
 * Linear regression against the certified sets of NIST. Each set asks for as many digits as the reference programs reach on it in double
 * precision.
 */

import type { LinearModel, Predictor } from '../src/index.ts';
import { linearRegression } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import { digitsAgreed } from './agreement.ts';
import { membersOf } from './figures.ts';
import nist from './nist-linear-regression.json' with { type: 'json' };

type NistSet = (typeof nist.sets)[number];

function predictorsOf(set: NistSet): Predictor[] {
  if (set.predictors) return set.predictors.map((values, j) => ({ name: `x${j + 1}`, values }));
  const { x = [], degree = 1 } = set;
  return Array.from({ length: degree }, (_, k) => ({ name: `x^${k + 1}`, values: x.map((value) => value ** (k + 1)) }));
}

export function nistRegression(name: string): ReturnType<typeof linearRegression> {
  const set = nist.sets.find((one) => one.name === name);
  if (set === undefined) throw new Error(`No NIST set is called ${name}.`);
  return linearRegression({ outcome: set.y, predictors: predictorsOf(set), throughOrigin: set.throughOrigin });
}

/** Sets that this package fits: all but Filip, whose tenth power it reports as determined by the lower ones, as R does. */
export const fittedNistSets = nist.sets.filter((set) => set.neededDigits !== undefined);

function members(model: LinearModel) {
  const { residualSd, residualDf, rSquared, residualSumOfSquares } = model;
  return {
    coefficients: model.coefficients.map((one) => one.estimate),
    standardErrors: model.coefficients.map((one) => one.standardError),
    residualSd,
    residualDf,
    rSquared,
    residualSumOfSquares,
  };
}

/** Fewest digits agreed over the coefficients, and over their standard errors. */
export function nistDigits(set: NistSet): { readonly coefficients: number; readonly standardErrors: number } {
  const model = nistRegression(set.name);
  const { coefficients, standardErrors } = model.kind === 'linear-model' ? members(model) : { coefficients: [], standardErrors: [] };
  const fewest = (got: readonly number[], certified: readonly number[]): number =>
    Math.min(...certified.map((value, i) => digitsAgreed(got[i] ?? NaN, value)));
  return {
    coefficients: fewest(coefficients, set.certified.coefficients),
    standardErrors: fewest(standardErrors, set.certified.standardErrors),
  };
}

export const nistRegressionChecks: readonly ReferenceCheck[] = fittedNistSets.map((set): ReferenceCheck => {
  const { f: _f, ...expected } = set.certified;
  return {
    id: `NIST ${set.name}`,
    method: 'linear-regression',
    source: nist.source,
    compute: () => membersOf(nistRegression(set.name), members),
    expected,
    tolerance: { rel: 10 ** -(set.neededDigits ?? 0) },
  };
});
