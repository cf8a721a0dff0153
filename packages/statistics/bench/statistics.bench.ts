/**
 * Speed of the statistics at sizes a registry can reach, each beside a named peer: R where it is installed, else a library that
 * answers a like question.
 */
import { performance } from 'node:perf_hooks';
import { linearRegression, mean, permutationTest, quantile, standardDeviation, wilcoxonRankSum } from 'simple-statistics';
import type { Measured, Scenario } from '../../../infra/bench/scenario.ts';
import { timeInR, type InR } from '../../../infra/bench/r-peer.ts';
import { describe, indicatorPredictors, mannWhitneyTest, randomInterceptModel, signedRankTest } from '../src/index.ts';
import { grades, registryVisits, roundedNumbers, visits } from './registry-visits.ts';

/** Median of several runs, in milliseconds, after one to warm up. */
function medianTime(run: () => unknown, repeats = 7): number {
  run();
  const times = Array.from({ length: repeats }, () => {
    const start = performance.now();
    run();
    return performance.now() - start;
  }).sort((a, b) => a - b);
  return times[repeats >> 1] as number;
}

const library = 'simple-statistics';

interface Peer {
  readonly peer: number;
  readonly peerName: string;
}

const asPeer = (inR: InR, what: string): Peer => ({ peer: inR.milliseconds, peerName: `${inR.version}, ${what}` });

const scenario = (
  name: string,
  measure: () => { readonly run: () => unknown; readonly peer: Peer } & Pick<Measured, 'goal' | 'note'>,
): Scenario => ({
  name,
  run: async () => {
    const { run, peer, ...rest } = measure();
    return { ours: medianTime(run), unit: 'ms', ...peer, ...rest };
  },
});

export const scenarios: readonly Scenario[] = [
  scenario('describe 1,000,000 numbers, with quartiles', () => {
    const numbers = roundedNumbers(1_000_000, 1);
    const sorting = medianTime(() => numbers.slice().sort());
    const values = Array.from(numbers);
    const byLibrary = medianTime(() => [mean(values), standardDeviation(values), quantile(values, [0.25, 0.5, 0.75])]);
    return {
      run: () => describe(numbers),
      peer: { peer: sorting, peerName: 'sorting them, Float64Array.prototype.sort' },
      goal: 3 * sorting,
      note: `mean, SD and quartiles by ${library}: ${byLibrary.toFixed(0)} ms`,
    };
  }),
  scenario('exact signed rank test, n = 200, with interval', () => {
    const numbers = roundedNumbers(200, 4).map((value) => value - 4.5);
    const inR = timeInR({ x: numbers }, 'wilcox.test(x, exact = TRUE, conf.int = TRUE)');
    const zeroes = Array.from(numbers, () => 0);
    return {
      run: () => signedRankTest(numbers, 0.01),
      peer: inR
        ? asPeer(inR, 'wilcox.test (ties: by the normal approximation)')
        : {
            peer: medianTime(() => permutationTest(Array.from(numbers), zeroes, 'two_side', 10_000), 3),
            peerName: `${library}, permutation test of 10,000`,
          },
      goal: 20,
    };
  }),
  scenario('Mann-Whitney test of 2 x 30,000, with shift', () => {
    const [first, second] = [roundedNumbers(30_000, 2), roundedNumbers(30_000, 3)];
    const inR = timeInR({ x: first, y: second }, 'wilcox.test(x, y)');
    return {
      run: () => mannWhitneyTest(first, second),
      peer: inR
        ? asPeer(inR, 'wilcox.test, without the shift')
        : {
            peer: medianTime(() => wilcoxonRankSum(Array.from(first), Array.from(second)), 3),
            peerName: `${library}, the statistic alone`,
          },
    };
  }),
  scenario('random intercept by REML, 30,000 people with six visits', () => {
    const { outcome, participant, visit, grade } = registryVisits(30_000);
    const predictors = [...indicatorPredictors('visit', visit, visits), ...indicatorPredictors('grade', grade, grades)];
    const numbers = {
      y: outcome.map((value) => value ?? Number.NaN),
      person: participant.map((name) => Number(name.slice(1))),
      visit: visit.map((name) => visits.indexOf(name)),
      grade: grade.map((name) => grades.indexOf(name)),
    };
    const inR = timeInR(
      numbers,
      'nlme::lme(y ~ factor(visit) + factor(grade), random = ~ 1 | person, na.action = na.omit, data = data.frame(y, visit, grade, person))',
      ['nlme'],
    );
    const points = outcome.flatMap((value, row) => (value === null ? [] : [[numbers.visit[row] ?? 0, value] as [number, number]]));
    return {
      run: () => randomInterceptModel({ outcome, predictors, cluster: participant }),
      peer: inR
        ? asPeer(inR, 'lme of nlme')
        : { peer: medianTime(() => linearRegression(points)), peerName: `${library}, a straight line through the same rows` },
      goal: 300,
    };
  }),
];
