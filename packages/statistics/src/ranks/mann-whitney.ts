/**
 * Mann-Whitney test of two independent groups, the Hodges-Lehmann shift and the probability of superiority.
 *
 * U counts the pairs in which the first group's value is the larger, ties by half. p by counting all ways to form the groups up to 100
 * values in all (exact with ties too), p = 2 min(lower, upper), at most 1; beyond that normal with tie-corrected variance and a
 * continuity correction of 1/2. Shift: median of all differences first minus second; interval from the k-th smallest and k-th largest,
 * k from the distribution of U without ties.
 * Sources: Mann & Whitney (1947) Annals of Mathematical Statistics 18:50-60; Hollander & Wolfe (1973) chapter 4;
 * Hodges & Lehmann (1963) Annals of Mathematical Statistics 34:598-611.
 */

import { computableScale } from '../description/computable-scale.ts';
import { logBeta } from '../distributions/log-gamma.ts';
import { normalMultiplier, normalUpper } from '../distributions/normal.ts';
import type { NotEstimable, TestedEstimate } from '../result.ts';
import { addLeftOut, notEstimable, reasons, requireLevel, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { cleanSample, roundToResolution } from '../samples.ts';
import { percentText } from '../test-figures.ts';
import { pairwiseDifferences } from './kth-smallest-sum.ts';
import type { Midranks } from './midranks.ts';
import { midranks, tieTerm } from './midranks.ts';
import { chosenSumTails, rankSumShares, tailsOfShares } from './rank-sum-distribution.ts';
import { smallestReaching } from './signed-rank-distribution.ts';

/** Up to this many values in both groups together p-value and interval come from exact counting. */
const exactUpTo = 100;

export interface ShiftEstimate extends TestedEstimate {
  readonly groupSizes: readonly [number, number];
  /** Share of pairs in which the first group's value is the larger, ties by half: U/(mn). */
  readonly probabilityOfSuperiority: number;
  /** 2U/(mn) - 1. */
  readonly rankBiserial: number;
  readonly tied: boolean;
  readonly exact: boolean;
  /** No data of these sizes can give a smaller p. */
  readonly smallestPossibleP: number;
  /** The level the interval really has: ranks allow steps only. */
  readonly achievedLevel: number;
}

interface ExactOrNormal {
  readonly exact: boolean;
  readonly p: number;
  /** Which order statistic of the differences bounds the interval, and the level that gives. */
  readonly k: number;
  readonly achievedLevel: number;
}

function byCounting(u: number, m: number, n: number, { ranks, tieSizes }: Midranks, level: number): ExactOrNormal {
  const shares = rankSumShares(m, n);
  const { v, below } = smallestReaching(shares, (1 - level) / 2);
  const k = Math.max(1, v);
  const achievedLevel = Math.max(0, 1 - 2 * (v >= 1 ? below : (shares[0] as number)));
  if (tieSizes.length === 0) {
    const smaller = Math.min(tailsOfShares(shares, u).lower, tailsOfShares(shares, u - 1).upper);
    return { exact: true, p: Math.min(1, 2 * smaller), k, achievedLevel };
  }
  const doubled = Array.from(ranks, (rank) => 2 * rank);
  const { atMost, atLeast } = chosenSumTails(doubled, m, 2 * u + m * (m + 1));
  return { exact: true, p: Math.min(1, 2 * Math.min(atMost, atLeast)), k, achievedLevel };
}

function byNormal(u: number, m: number, n: number, { tieSizes }: Midranks, level: number): ExactOrNormal {
  const all = m + n;
  const variance = ((m * n) / 12) * (all + 1 - tieTerm(tieSizes) / (all * (all - 1)));
  const distance = Math.max(0, Math.abs(u - (m * n) / 2) - 0.5);
  const reach = normalMultiplier(level) * Math.sqrt((m * n * (all + 1)) / 12);
  return {
    exact: false,
    p: Math.min(1, 2 * normalUpper(distance / Math.sqrt(variance))),
    k: Math.max(1, Math.round((m * n) / 2 - reach)),
    achievedLevel: level,
  };
}

/** `resolution`: the step to which the values are rounded before ranking, for values that were computed rather than read. */
export function mannWhitneyTest(
  first: ArrayLike<Observation>,
  second: ArrayLike<Observation>,
  resolution?: number,
  level = 0.95,
): ShiftEstimate | NotEstimable {
  requireLevel(level);
  const [one, two] = [cleanSample(first), cleanSample(second)];
  const [m, n] = [one.n, two.n];
  const basis = { n: m + n, leftOut: addLeftOut(one.leftOut, two.leftOut) };
  if (m === 0 || n === 0) return notEstimable(reasons.noComparison, basis);
  if (computableScale([one.values, two.values]) === 'too large') return notEstimable(reasons.tooLarge, basis);
  const rounded = (values: Float64Array): Float64Array =>
    resolution === undefined ? values : values.map((value) => roundToResolution(value, resolution));
  const [x, y] = [rounded(one.values), rounded(two.values)];
  const ranked = midranks(Float64Array.of(...x, ...y));
  if (ranked.tieSizes[0] === m + n) return notEstimable(reasons.allEqual, basis, 0);
  const u = ranked.ranks.subarray(0, m).reduce((sum, rank) => sum + rank, 0) - (m * (m + 1)) / 2;
  const { exact, p, k, achievedLevel } = (m + n <= exactUpTo ? byCounting : byNormal)(u, m, n, ranked, level);
  const differences = pairwiseDifferences(x, y);
  const short = achievedLevel < level ? [`the interval reaches a level of ${percentText(Number(achievedLevel.toPrecision(3)))} only`] : [];
  return {
    kind: 'estimate',
    ...basis,
    estimate: differences.median(),
    interval: { lower: differences.kth(k), upper: differences.kth(differences.total + 1 - k), level },
    test: { statisticName: 'U', statistic: u, df: [], p },
    groupSizes: [m, n],
    probabilityOfSuperiority: u / (m * n),
    rankBiserial: (2 * u) / (m * n) - 1,
    tied: ranked.tieSizes.length > 0,
    exact,
    // One in C(m + n, m) arrangements is the most extreme: 1/C = (m + n + 1) B(m + 1, n + 1).
    smallestPossibleP: Math.min(1, 2 * (m + n + 1) * Math.exp(logBeta(m + 1, n + 1))),
    achievedLevel,
    method:
      `Hodges-Lehmann shift (first minus second group) with ${percentText(level)} interval and Mann-Whitney test ` +
      `(two-sided, ${exact ? 'exact' : 'normal approximation with continuity correction'}).`,
    failedAssumptions: [...verySmallSample(Math.min(m, n)), ...short],
  };
}
