/** Rank tests against R. */

import {
  dunnTest,
  friedmanTest,
  jonckheereTest,
  kruskalWallisTest,
  mannWhitneyTest,
  signedRankChange,
  signedRankTest,
} from '../src/index.ts';
import type { NotEstimable, ShiftEstimate, SignedRankEstimate } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import type { FixtureCase } from './fixture.ts';
import { casesOf } from './fixture.ts';
import { groupsOf } from './groups-of.ts';
import fixture from './rank-tests.json' with { type: 'json' };
import secondRoute from './rank-tests-second-route.json' with { type: 'json' };

const caseOf = (id: string): FixtureCase => casesOf(fixture, id)[0] as FixtureCase;

const computedBy: Readonly<Record<string, string>> = {
  'signed-rank': 'wilcox.test(exact) and counting of all sign patterns',
  'mann-whitney': 'wilcox.test(exact) and counting',
  'kruskal-wallis': 'kruskal.test',
  dunn: 'formula with p.adjust',
  'jonckheere-terpstra': 'formula, equal to cor.test(method = "kendall")',
  friedman: 'friedman.test',
};

function check(one: FixtureCase, method: string, compute: () => unknown, expected: unknown): ReferenceCheck {
  return { id: one.id, method, source: `R 4.2.2, ${computedBy[method]}; ${one.dataset}`, compute, expected, tolerance: one.tolerance };
}

function signedRankMembers(of: SignedRankEstimate | NotEstimable): Record<string, unknown> {
  if (of.kind === 'not-estimable') return {};
  return {
    V: of.test.statistic,
    p_two_sided: of.test.p,
    pseudomedian: of.estimate,
    ci: [of.interval.lower, of.interval.upper],
    achieved_level: of.achievedLevel,
  };
}

function shiftMembers(of: ShiftEstimate | NotEstimable): Record<string, unknown> {
  if (of.kind === 'not-estimable') return {};
  return {
    U_x: of.test.statistic,
    p_two_sided: of.test.p,
    shift: of.estimate,
    ci: [of.interval.lower, of.interval.upper],
    achieved_level: of.achievedLevel,
    prob_superiority: of.probabilityOfSuperiority,
    rank_biserial: of.rankBiserial,
  };
}

const depression = caseOf('wilcoxon.signedrank.exact.depression');
const floatTies = caseOf('wilcoxon.signedrank.floatties');
const anorexia = caseOf('wilcoxon.signedrank.anorexiaFT');
const permeability = caseOf('mannwhitney.exact.permeability');
const ozone = caseOf('mannwhitney.ties.airquality');

const { k: _anorexiaK, ...anorexiaInterval } = anorexia.expected.hodges_lehmann;
const { k: _depressionK, ...depressionInterval } = depression.expected.hodges_lehmann;
const { k: _permeabilityK, ...permeabilityInterval } = permeability.expected.hodges_lehmann;
const { k: _ozoneK, ...ozoneInterval } = ozone.expected.hodges_lehmann;

/** Large samples, where the normal approximation takes over, and small ones with ties, counted one by one. */
const secondRouteChecks: readonly ReferenceCheck[] = [
  ...secondRoute.mannWhitney.map((one): ReferenceCheck => ({
    ...one,
    method: 'mann-whitney',
    compute: () => shiftMembers(mannWhitneyTest(one.first, one.second)),
  })),
  ...secondRoute.signedRank.map((one): ReferenceCheck => ({
    ...one,
    method: 'signed-rank',
    compute: () => signedRankMembers(signedRankTest(one.differences)),
  })),
];

export const rankTestChecks: readonly ReferenceCheck[] = [
  check(depression, 'signed-rank', () => signedRankMembers(signedRankChange(depression.inputs.y, depression.inputs.x)), {
    V: depression.expected.V,
    p_two_sided: depression.expected.p_two_sided,
    ...depressionInterval,
  }),
  check(floatTies, 'signed-rank', () => signedRankMembers(signedRankChange(floatTies.inputs.y, floatTies.inputs.x, 0.1)), {
    V: floatTies.expected.V_rounded,
    p_two_sided: floatTies.expected.exact_midrank.p_two_sided,
  }),
  check(anorexia, 'signed-rank', () => signedRankMembers(signedRankTest(anorexia.inputs.diff)), {
    ...anorexia.expected.exact,
    ...anorexiaInterval,
  }),
  check(permeability, 'mann-whitney', () => shiftMembers(mannWhitneyTest(permeability.inputs.x, permeability.inputs.y)), {
    U_x: permeability.expected.U_x,
    p_two_sided: permeability.expected.p_two_sided,
    prob_superiority: permeability.expected.normal_cc.prob_superiority,
    rank_biserial: permeability.expected.normal_cc.rank_biserial,
    ...permeabilityInterval,
  }),
  check(ozone, 'mann-whitney', () => shiftMembers(mannWhitneyTest(ozone.inputs.x, ozone.inputs.y)), {
    U_x: ozone.expected.normal_cc.U_x,
    prob_superiority: ozone.expected.normal_cc.prob_superiority,
    rank_biserial: ozone.expected.normal_cc.rank_biserial,
    ...ozoneInterval,
  }),
  ...casesOf(fixture, 'kruskal.').flatMap((one) => {
    const { H, df, p, epsilon2, eta2_H, group_names, mean_rank, dunn } = one.expected;
    return [
      check(
        one,
        'kruskal-wallis',
        () => {
          const of = kruskalWallisTest(groupsOf(one));
          if (of.kind === 'not-estimable') return of;
          return {
            H: of.statistic,
            df: of.df[0],
            p: of.p,
            epsilon2: of.epsilonSquared,
            eta2_H: of.etaSquared,
            group_names: of.groups.map(({ name }) => name),
            mean_rank: of.groups.map(({ meanRank }) => meanRank),
          };
        },
        { H, df, p, epsilon2, eta2_H, group_names, mean_rank },
      ),
      check(
        { ...one, id: `${one.id} Dunn` },
        'dunn',
        () => {
          const of = dunnTest(groupsOf(one));
          if (of.kind === 'not-estimable') return of;
          return {
            pairs: of.pairs.map(({ first, second }) => [first, second]),
            z: of.pairs.map(({ z }) => z),
            p: of.pairs.map((pair) => pair.p),
            p_holm: of.pairs.map(({ holmP }) => holmP),
          };
        },
        { pairs: dunn.pairs, z: dunn.z, p: dunn.p, p_holm: dunn.p_holm },
      ),
    ];
  }),
  ...casesOf(fixture, 'jonckheere.').map((one) =>
    check(
      one,
      'jonckheere-terpstra',
      () => {
        const of = jonckheereTest(groupsOf(one).sort((a, b) => Number(a.name) - Number(b.name)));
        if (of.kind === 'not-estimable') return of;
        return { J: of.statistic, mean: of.expected, variance: of.variance, z: of.z, p_two_sided: of.p };
      },
      one.expected,
    ),
  ),
  ...casesOf(fixture, 'friedman.').map((one) =>
    check(
      one,
      'friedman',
      () => {
        const rows: readonly (readonly number[])[] = one.inputs.rows;
        const of = friedmanTest([0, 1, 2].map((visit) => rows.map((row) => row[visit])));
        return of.kind === 'test' ? { chi2: of.statistic, df: of.df[0], p: of.p, kendall_W: of.kendallW } : of;
      },
      one.expected,
    ),
  ),
  ...secondRouteChecks,
];
