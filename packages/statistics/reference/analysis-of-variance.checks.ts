/** Analysis of variance and its companions against R, and against the certified values of NIST. */

import { brownForsytheTest, oneWayAnova, tukeyKramer, welchAnova } from '../src/index.ts';
import type { Group } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import fixture from './analysis-of-variance.json' with { type: 'json' };
import { casesOf } from './fixture.ts';
import { groupsOf } from './groups-of.ts';
import nist from './nist-analysis-of-variance.json' with { type: 'json' };

function classic(groups: readonly Group[]): Record<string, unknown> {
  const of = oneWayAnova(groups);
  if (of.kind === 'not-estimable') return {};
  const [df1 = 0, df2 = 0] = of.df;
  return {
    k: of.groups.length,
    N: of.n,
    df_between: df1,
    df_within: df2,
    ss_between: of.sumOfSquaresBetween,
    ss_within: of.sumOfSquaresWithin,
    ms_between: of.sumOfSquaresBetween / df1,
    ms_within: of.sumOfSquaresWithin / df2,
    residual_sd: of.residualSd,
    F: of.statistic,
    p: of.p,
    r2: of.etaSquared,
    eta2: of.etaSquared,
    omega2: of.omegaSquared,
    epsilon2: of.epsilonSquared,
    group_names: of.groups.map(({ name }) => name),
    group_n: of.groups.map(({ n }) => n),
    group_mean: of.groups.map(({ mean }) => mean),
    group_sd: of.groups.map(({ sd }) => sd),
  };
}

const cases = casesOf(fixture, 'anova.');
const source = (by: string, dataset: string): string => `R 4.2.2, ${by}; ${dataset}`;

export const anovaChecks: readonly ReferenceCheck[] = [
  ...cases.map((one): ReferenceCheck => {
    const {
      welch: _welch,
      brown_forsythe_levene: _spread,
      levene_mean: _levene,
      bartlett: _bartlett,
      tukey: _tukey,
      ...expected
    } = one.expected;
    return {
      id: one.id,
      method: 'one-way-anova',
      source: source('anova(lm)', one.dataset),
      compute: () => classic(groupsOf(one)),
      expected,
      tolerance: one.tolerance,
    };
  }),
  ...cases.map((one): ReferenceCheck => ({
    id: `${one.id} Welch`,
    method: 'welch-anova',
    source: source('oneway.test', one.dataset),
    compute: () => {
      const of = welchAnova(groupsOf(one));
      return of.kind === 'test' ? { F: of.statistic, df1: of.df[0], df2: of.df[1], p: of.p } : of;
    },
    expected: one.expected.welch,
    tolerance: one.tolerance,
  })),
  ...cases.map((one): ReferenceCheck => ({
    id: `${one.id} Brown-Forsythe`,
    method: 'brown-forsythe',
    source: source('leveneTest of car 3.1-1', one.dataset),
    compute: () => {
      const of = brownForsytheTest(groupsOf(one));
      return of.kind === 'test' ? { F: of.statistic, p: of.p } : of;
    },
    expected: one.expected.brown_forsythe_levene,
    tolerance: one.tolerance,
  })),
  ...cases.map((one): ReferenceCheck => ({
    id: `${one.id} Tukey-Kramer`,
    method: 'tukey-kramer',
    source: `QUADPACK on the upper tail of the studentised range (SciPy 1.17.1); ${one.dataset}`,
    compute: () => {
      const of = tukeyKramer(groupsOf(one));
      if (of.kind === 'not-estimable') return of;
      return of.pairs.map(({ first, second, estimate, interval, p }) => ({
        pair: [second, first],
        diff: estimate,
        ci: [interval.lower, interval.upper],
        p,
      }));
    },
    expected: one.expected.tukey,
    // R's studentised range has an absolute error of about 1e-10, and 7 to 9 digits in its quantiles.
    tolerance: { rel: 1e-10, abs: 0 },
  })),
  ...nist.sets.map((set): ReferenceCheck => ({
    id: `NIST ${set.name}`,
    method: 'one-way-anova',
    source: `NIST StRD analysis of variance; ${set.name}`,
    compute: () => classic(groupsOf({ inputs: { y: set.y, group: set.treatment } })),
    expected: set.certified,
    tolerance: { rel: 10 ** -set.digits, abs: 0 },
  })),
];
