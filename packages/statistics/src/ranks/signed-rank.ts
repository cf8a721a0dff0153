/**
 * Wilcoxon's signed rank test and the Hodges-Lehmann estimate of the median change.
 *
 * Test: differences of 0 are dropped and counted; midranks of the sizes; p by counting all sign patterns up to 200 differences (exact
 * with ties too), p = 2 min(lower, upper), at most 1. Beyond that the normal approximation with tie-corrected variance and a continuity
 * correction of 1/2. Estimate: median of the Walsh averages, zeroes kept; interval from the k-th smallest and k-th largest of them,
 * k from the distribution of V without ties.
 * Sources: Wilcoxon (1945) Biometrics Bulletin 1:80-83; Hodges & Lehmann (1963) Annals of Mathematical Statistics 34:598-611;
 * Hollander & Wolfe (1973) Nonparametric Statistical Methods, chapter 3.
 */

import { normalMultiplier, normalUpper } from '../distributions/normal.ts';
import type { LeftOut, NotEstimable, TestedEstimate } from '../result.ts';
import { notEstimable, reasons, requireLevel, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { changes, cleanPairs, cleanSample, defaultResolution, roundToResolution } from '../samples.ts';
import { percentText } from '../test-figures.ts';
import { computableScale } from '../description/computable-scale.ts';
import { walshAverages } from './kth-smallest-sum.ts';
import { midranks, tieTerm } from './midranks.ts';
import { shareOfSumsUpTo, signedRankQuantile } from './signed-rank-distribution.ts';

/** Up to here p-value and interval come from exact counting. */
const exactUpTo = 200;

export interface SignedRankEstimate extends TestedEstimate {
  /** Differences of 0, which the test cannot use; they stay in the estimate and in n. */
  readonly zeroDifferences: number;
  readonly tied: boolean;
  readonly exact: boolean;
  /** No data of this size can give a smaller p. */
  readonly smallestPossibleP: number;
  /** The level the interval really has: ranks allow steps only. */
  readonly achievedLevel: number;
}

interface ExactOrNormal {
  readonly p: number;
  readonly exact: boolean;
}

/** Two-sided p of V, the sum of the ranks of the positive among n non-zero differences. */
function probabilityOf(v: number, ranks: Float64Array, tieSizes: readonly number[]): ExactOrNormal {
  const n = ranks.length;
  const total = (n * (n + 1)) / 2;
  if (n <= exactUpTo) {
    const doubled = tieSizes.length > 0 ? 2 : 1;
    const scores = ranks.map((rank) => rank * doubled);
    return { exact: true, p: Math.min(1, 2 * shareOfSumsUpTo(scores, Math.min(v, total - v) * doubled)) };
  }
  const variance = (n * (n + 1) * (2 * n + 1)) / 24 - tieTerm(tieSizes) / 48;
  const distance = Math.max(0, Math.abs(v - total / 2) - 0.5);
  return { exact: false, p: Math.min(1, 2 * normalUpper(distance / Math.sqrt(variance))) };
}

/** Which order statistic of the Walsh averages bounds the interval, and the level that gives. */
function boundOf(n: number, level: number): { readonly k: number; readonly achievedLevel: number } {
  const tail = (1 - level) / 2;
  if (n <= exactUpTo) {
    const { v, below } = signedRankQuantile(tail, n);
    if (v >= 1) return { k: v, achievedLevel: 1 - 2 * below };
    return { k: 1, achievedLevel: 1 - 2 * 0.5 ** n };
  }
  const reach = normalMultiplier(level) * Math.sqrt((n * (n + 1) * (2 * n + 1)) / 24);
  return { k: Math.max(1, Math.round((n * (n + 1)) / 4 - reach)), achievedLevel: level };
}

function signedRankOf(differences: Float64Array, leftOut: LeftOut, level: number, what: string): SignedRankEstimate | NotEstimable {
  requireLevel(level);
  const basis = { n: differences.length, leftOut };
  if (basis.n === 0) return notEstimable(reasons.noData, basis);
  if (computableScale([differences]) === 'too large') return notEstimable(reasons.tooLarge, basis);
  const moved = differences.filter((difference) => difference !== 0);
  if (moved.length === 0) return notEstimable('all differences are zero', basis, 0);
  const { ranks, tieSizes } = midranks(moved.map(Math.abs));
  const v = ranks.reduce((sum, rank, i) => sum + ((moved[i] as number) > 0 ? rank : 0), 0);
  const { p, exact } = probabilityOf(v, ranks, tieSizes);
  const walsh = walshAverages(differences);
  const { k, achievedLevel } = boundOf(basis.n, level);
  const zeroDifferences = basis.n - moved.length;
  const short = achievedLevel < level ? [`the interval reaches a level of ${percentText(Number(achievedLevel.toPrecision(3)))} only`] : [];
  return {
    kind: 'estimate',
    ...basis,
    estimate: walsh.median(),
    interval: { lower: walsh.kth(k), upper: walsh.kth(walsh.total + 1 - k), level },
    test: { statisticName: 'V', statistic: v, df: [], p },
    zeroDifferences,
    tied: tieSizes.length > 0,
    exact,
    smallestPossibleP: Math.min(1, 2 * 0.5 ** moved.length),
    achievedLevel,
    method:
      `Hodges-Lehmann estimate of ${what} with ${percentText(level)} interval from the Walsh averages, and Wilcoxon signed rank test ` +
      `(two-sided, ${exact ? 'exact' : 'normal approximation with continuity correction'}, ${zeroDifferences} zero differences dropped).`,
    failedAssumptions: [...verySmallSample(basis.n), ...short],
  };
}

/** Differences (or values against 0), rounded to `resolution` before they are ranked. */
export function signedRankTest(
  differences: ArrayLike<Observation>,
  resolution: number = defaultResolution,
  level = 0.95,
): SignedRankEstimate | NotEstimable {
  const { values, leftOut } = cleanSample(differences);
  return signedRankOf(
    values.map((value) => roundToResolution(value, resolution)),
    leftOut,
    level,
    'the median difference',
  );
}

/** Follow-up minus baseline of complete pairs, rounded to the instrument's resolution before they are ranked. */
export function signedRankChange(
  baseline: ArrayLike<Observation>,
  followUp: ArrayLike<Observation>,
  resolution: number = defaultResolution,
  level = 0.95,
): SignedRankEstimate | NotEstimable {
  const pairs = cleanPairs(baseline, followUp);
  return signedRankOf(changes(pairs, resolution), pairs.leftOut, level, 'the median change (follow-up minus baseline)');
}
