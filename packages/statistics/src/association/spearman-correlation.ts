/**
 * Spearman's rank correlation on midranks, interval on Fisher's z scale with standard error sqrt((1 + rho^2/2)/(n - 3)).
 * p: exact over all permutations for n < 10 without ties, else by t with n - 2 degrees of freedom.
 * Source: Bonett & Wright (2000) Psychometrika 65:23-28 (interval); Kendall & Gibbons (1990) Rank Correlation Methods, 5th ed., chapter 4.
 */

import type { TestFigures, TestedEstimateResult } from '../result.ts';
import { notEstimable, requireLevel, verySmallSample } from '../result.ts';
import { midranks } from '../ranks/midranks.ts';
import type { Observation } from '../samples.ts';
import { cleanPairs } from '../samples.ts';
import { percentText, tFigures } from '../test-figures.ts';
import { correlationOf, fisherInterval, isPerfect, tOfCorrelation } from './pearson-correlation.ts';
import { exactSpearmanProbability } from './exact-spearman-probability.ts';

const exactBelow = 10;

export function spearmanCorrelation(x: ArrayLike<Observation>, y: ArrayLike<Observation>, level = 0.95): TestedEstimateResult {
  requireLevel(level);
  const pairs = cleanPairs(x, y);
  const { n, leftOut } = pairs;
  const first = midranks(pairs.first);
  const second = midranks(pairs.second);
  const rho = correlationOf(first.ranks, second.ranks);
  if (typeof rho === 'string') return notEstimable(rho, { n, leftOut });
  if (isPerfect(rho))
    return notEstimable('the pairs are in exactly the same, or opposite, order: no interval', { n, leftOut }, Math.sign(rho));

  const exact = n < exactBelow && first.tieSizes.length === 0 && second.tieSizes.length === 0;
  const squares = first.ranks.reduce((sum, rank, i) => sum + (rank - (second.ranks[i] as number)) ** 2, 0);
  const test: TestFigures = exact
    ? { statisticName: 'rho', statistic: rho, df: [], p: exactSpearmanProbability(n, squares) }
    : tFigures(tOfCorrelation(rho, n), n - 2);
  return {
    kind: 'estimate',
    n,
    leftOut,
    estimate: rho,
    interval: fisherInterval(rho, Math.sqrt((1 + (rho * rho) / 2) / (n - 3)), level),
    test,
    method: `Spearman rank correlation (midranks) with the interval of Bonett and Wright and ${exact ? 'exact permutation' : 't'} test (two-sided, ${percentText(level)}).`,
    failedAssumptions: verySmallSample(n),
  };
}
