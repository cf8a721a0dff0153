/**
 * Kendall's tau-b: concordant minus discordant pairs over the pairs not tied, for ordinal scales. Interval on Fisher's z scale with
 * standard error sqrt(0.437/(n - 4)). p: exact by counting inversions for n < 50 without ties, else normal with the variance corrected
 * for ties, no continuity correction.
 * Source: Kendall & Gibbons (1990) Rank Correlation Methods, 5th ed., chapters 3 to 5; interval Fieller, Hartley & Pearson (1957)
 * Biometrika 44:470-481; counting in n log n steps by Knight (1966) J Am Stat Assoc 61:436-439.
 */

import type { TestFigures, TestedEstimateResult } from '../result.ts';
import { notEstimable, requireLevel, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { cleanPairs } from '../samples.ts';
import { percentText, zFigures } from '../test-figures.ts';
import { doesNotVary, fisherInterval, tooFewPairs } from './pearson-correlation.ts';
import { inversionProbability } from './inversion-probability.ts';
import { sortCountingInversions } from './sort-counting-inversions.ts';

const exactBelow = 50;

/** Sizes of the runs of equal neighbours, single ones left out. */
function runSizes(length: number, equal: (i: number) => boolean): number[] {
  const sizes: number[] = [];
  let size = 1;
  for (let i = 1; i <= length; i++) {
    if (i < length && equal(i)) {
      size++;
    } else {
      if (size > 1) sizes.push(size);
      size = 1;
    }
  }
  return sizes;
}

function sumOver(sizes: readonly number[], term: (size: number) => number): number {
  return sizes.reduce((sum, size) => sum + term(size), 0);
}

const pairsOf = (size: number): number => (size * (size - 1)) / 2;

export function kendallCorrelation(x: ArrayLike<Observation>, y: ArrayLike<Observation>, level = 0.95): TestedEstimateResult {
  requireLevel(level);
  const pairs = cleanPairs(x, y);
  const { n, leftOut } = pairs;
  const basis = { n, leftOut };
  const at = (values: Float64Array, i: number): number => values[i] as number;
  const order = Int32Array.from({ length: n }, (_, i) => i).sort(
    (i, j) => at(pairs.first, i) - at(pairs.first, j) || at(pairs.second, i) - at(pairs.second, j),
  );
  const first = Float64Array.from(order, (i) => at(pairs.first, i));
  const second = Float64Array.from(order, (i) => at(pairs.second, i));
  const tiedFirst = runSizes(n, (i) => first[i] === first[i - 1]);
  const tiedBoth = runSizes(n, (i) => first[i] === first[i - 1] && second[i] === second[i - 1]);
  const discordant = sortCountingInversions(second);
  const tiedSecond = runSizes(n, (i) => second[i] === second[i - 1]);

  const all = pairsOf(n);
  const [freeFirst, freeSecond] = [all - sumOver(tiedFirst, pairsOf), all - sumOver(tiedSecond, pairsOf)];
  const tooFew = tooFewPairs(n);
  if (tooFew !== undefined) return notEstimable(tooFew, basis);
  if (freeFirst === 0 || freeSecond === 0) return notEstimable(doesNotVary, basis);
  const score = all - sumOver(tiedFirst, pairsOf) - sumOver(tiedSecond, pairsOf) + sumOver(tiedBoth, pairsOf) - 2 * discordant;
  const tau = score / Math.sqrt(freeFirst) / Math.sqrt(freeSecond);
  if (Math.abs(score) === freeFirst && freeFirst === freeSecond) {
    return notEstimable('the pairs are in exactly the same, or opposite, order: no interval', basis, Math.sign(score));
  }
  if (n < 5) return notEstimable('n = 4: the interval of tau-b needs at least 5 pairs', basis, tau);

  const exact = n < exactBelow && tiedFirst.length === 0 && tiedSecond.length === 0;
  const test: TestFigures = exact
    ? { statisticName: 'tau', statistic: tau, df: [], p: inversionProbability(n, discordant) }
    : zFigures(score / Math.sqrt(varianceOfScore(n, tiedFirst, tiedSecond)));
  return {
    kind: 'estimate',
    ...basis,
    estimate: tau,
    interval: fisherInterval(tau, Math.sqrt(0.437 / (n - 4)), level),
    test,
    method: `Kendall tau-b with the interval of Fieller, Hartley and Pearson and ${exact ? 'exact test' : 'normal test, variance corrected for ties, no continuity correction'} (two-sided, ${percentText(level)}).`,
    failedAssumptions: verySmallSample(n),
  };
}

function varianceOfScore(n: number, tiedFirst: readonly number[], tiedSecond: readonly number[]): number {
  const cubic = (t: number): number => t * (t - 1) * (2 * t + 5);
  const triples = (t: number): number => t * (t - 1) * (t - 2);
  const doubles = (t: number): number => t * (t - 1);
  return (
    (cubic(n) - sumOver(tiedFirst, cubic) - sumOver(tiedSecond, cubic)) / 18 +
    (sumOver(tiedFirst, triples) * sumOver(tiedSecond, triples)) / (9 * triples(n)) +
    (sumOver(tiedFirst, doubles) * sumOver(tiedSecond, doubles)) / (2 * doubles(n))
  );
}
