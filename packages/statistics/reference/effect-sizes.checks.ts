/** Effect sizes, balance and measurement error against R. */

import {
  classBalance,
  minimalDetectableChange,
  numberBalance,
  smallSampleFactor,
  standardisedChange,
  standardisedDifference,
} from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import fixture from './effect-sizes.json' with { type: 'json' };
import type { FixtureCase } from './fixture.ts';
import { casesOf } from './fixture.ts';

const computedBy: Readonly<Record<string, string>> = {
  'hedges-g': 'pt(ncp) with uniroot and lgamma, checked with effectsize 0.8.3',
  'standardised-response-mean': 'pt(ncp) with uniroot, checked with effectsize 0.8.3',
  'standardised-mean-difference': 'formula',
  'minimal-detectable-change': 'formula with qnorm',
};

function check(one: FixtureCase, method: string, compute: () => unknown, expected: unknown): ReferenceCheck {
  return { id: one.id, method, source: `R 4.2.2, ${computedBy[method]}; ${one.dataset}`, compute, expected, tolerance: one.tolerance };
}

/** Smokers minus non-smokers, as the case has it. */
function birthweight(one: FixtureCase): Record<string, unknown> {
  const group: readonly number[] = one.inputs.group;
  const of = (name: string, code: number): number[] => (one.inputs[name] as number[]).filter((_, i) => group[i] === code);
  const counts = (name: string, code: number, classes: readonly number[]): number[] =>
    classes.map((value) => of(name, code).filter((found) => found === value).length);
  const difference = (balance: ReturnType<typeof numberBalance>): unknown => (balance.kind === 'balance' ? balance.difference : balance);
  return {
    age: difference(numberBalance(of('age', 1), of('age', 0))),
    lwt: difference(numberBalance(of('lwt', 1), of('lwt', 0))),
    ht: difference(classBalance(counts('ht', 1, [1, 0]), counts('ht', 0, [1, 0]))),
    race: difference(classBalance(counts('race', 1, [1, 2, 3]), counts('race', 0, [1, 2, 3]))),
  };
}

export const effectSizeChecks: readonly ReferenceCheck[] = [
  ...casesOf(fixture, 'effectsize.independent').map((one) => {
    const { sd_pooled, d, d_ci95_noncentral_t, J_exact, g, g_ci95 } = one.expected;
    return check(
      one,
      'hedges-g',
      () => {
        const of = standardisedDifference(one.inputs.x, one.inputs.y);
        if (of.kind === 'not-estimable') return of;
        return {
          sd_pooled: of.pooledSd,
          d: of.cohenD,
          d_ci95_noncentral_t: [of.cohenDInterval.lower, of.cohenDInterval.upper],
          J_exact: of.smallSampleFactor,
          g: of.estimate,
          g_ci95: [of.interval.lower, of.interval.upper],
        };
      },
      { sd_pooled, d, d_ci95_noncentral_t, J_exact, g, g_ci95 },
    );
  }),
  ...casesOf(fixture, 'effectsize.independent').map((one) =>
    check(
      { ...one, id: `${one.id} balance` },
      'standardised-mean-difference',
      () => {
        const of = numberBalance(one.inputs.x, one.inputs.y);
        return of.kind === 'balance' ? of.difference : of;
      },
      one.expected.smd_balance,
    ),
  ),
  ...casesOf(fixture, 'effectsize.change').map((one) => {
    const { n, sd_change, srm, dz_ci95_noncentral_t, gz, gz_ci95, glass_es_baseline_sd } = one.expected;
    return check(
      one,
      'standardised-response-mean',
      () => {
        const of = standardisedChange(one.inputs.pre, one.inputs.post);
        if (of.kind === 'not-estimable' || of.corrected.kind === 'no-figure' || of.baselineEffectSize.kind === 'no-figure') return of;
        const { estimate, interval } = of.corrected.value;
        return {
          n: of.n,
          sd_change: of.sdOfChange,
          srm: of.estimate,
          dz_ci95_noncentral_t: [of.interval.lower, of.interval.upper],
          gz: estimate,
          gz_ci95: [interval.lower, interval.upper],
          glass_es_baseline_sd: of.baselineEffectSize.value,
        };
      },
      { n, sd_change, srm, dz_ci95_noncentral_t, gz, gz_ci95, glass_es_baseline_sd },
    );
  }),
  ...casesOf(fixture, 'hedges.').map((one) =>
    check(one, 'hedges-g', () => (one.inputs.df as number[]).map((df) => smallSampleFactor(df)), one.expected.exact),
  ),
  ...casesOf(fixture, 'mdc.').map((one) =>
    check(
      one,
      'minimal-detectable-change',
      () => {
        const { sd, icc } = one.inputs as { sd: number; icc: number };
        const at95 = minimalDetectableChange(sd, icc);
        return {
          sem: at95.standardErrorOfMeasurement,
          mdc90: minimalDetectableChange(sd, icc, 0.9).minimalDetectableChange,
          mdc95: at95.minimalDetectableChange,
        };
      },
      one.expected,
    ),
  ),
  ...casesOf(fixture, 'smd.').map((one) => {
    const { age, lwt, ht, race } = one.expected;
    return check(one, 'standardised-mean-difference', () => birthweight(one), { age, lwt, ht, race });
  }),
];
