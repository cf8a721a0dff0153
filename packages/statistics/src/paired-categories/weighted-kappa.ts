/**
 * Agreement beyond chance of two classifications in ordered categories: Cohen's kappa with weights 1 - (distance/(k-1))^2 (quadratic),
 * 1 - distance/(k-1) (linear), or 1 for equal and 0 otherwise (none).
 *
 * Interval by the large-sample standard error, test of kappa = 0 by the one that holds without agreement.
 *
 * Source: Cohen (1968) Psychol Bull 70:213-220; Fleiss, Cohen & Everitt (1969) Psychol Bull 72:323-327.
 */

import { normalMultiplier } from '../distributions/normal.ts';
import type { NotEstimable, TestedEstimate } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons, requireLevel, verySmallSample } from '../result.ts';
import { percentText, zFigures } from '../test-figures.ts';
import type { CountTable } from '../tables/contingency-table.ts';
import { marginsOf, requireSquareTable } from '../tables/contingency-table.ts';

export type KappaWeights = 'quadratic' | 'linear' | 'none';

export interface WeightedKappa extends TestedEstimate {
  readonly standardError: number;
  /** Standard error if there were no agreement beyond chance; the test rests on it. */
  readonly nullStandardError: number;
  /** Weighted share of agreement, seen and expected by chance. */
  readonly observedAgreement: number;
  readonly chanceAgreement: number;
}

function weightOf(distance: number, weights: KappaWeights): number {
  if (weights === 'none') return distance === 0 ? 1 : 0;
  return weights === 'linear' ? 1 - distance : 1 - distance * distance;
}

/** Rows and columns: the same ordered categories. */
export function weightedKappa(table: CountTable, weights: KappaWeights = 'quadratic', level = 0.95): WeightedKappa | NotEstimable {
  requireSquareTable(table);
  requireLevel(level);
  const { rows, columns, total } = marginsOf(table);
  const basis = { n: total, leftOut: nothingLeftOut };
  if (total === 0) return notEstimable(reasons.noData, basis);
  const k = table.length;
  const index = table.map((_, i) => i);
  const weight = (i: number, j: number): number => weightOf(Math.abs(i - j) / (k - 1), weights);
  const before = rows.map((count) => count / total);
  const after = columns.map((count) => count / total);
  const share = (i: number, j: number): number => (table[i]?.[j] as number) / total;
  const over = (term: (i: number, j: number) => number): number =>
    index.reduce((sum, i) => index.reduce((inner, j) => inner + term(i, j), sum), 0);
  // Everybody in the same one category both times: chance alone gives full agreement.
  if (before.some((p, i) => p === 1 && after[i] === 1))
    return notEstimable('everybody is in one category: no agreement beyond chance can be seen', basis);

  const observedAgreement = over((i, j) => weight(i, j) * share(i, j));
  const chanceAgreement = over((i, j) => weight(i, j) * (before[i] as number) * (after[j] as number));
  const room = 1 - chanceAgreement;
  const kappa = (observedAgreement - chanceAgreement) / room;
  const rowWeight = index.map((i) => index.reduce((sum, j) => sum + weight(i, j) * (after[j] as number), 0));
  const columnWeight = index.map((j) => index.reduce((sum, i) => sum + weight(i, j) * (before[i] as number), 0));
  const expectedWeight = (i: number, j: number): number => (rowWeight[i] as number) + (columnWeight[j] as number);

  const spread = over((i, j) => share(i, j) * (weight(i, j) - expectedWeight(i, j) * (1 - kappa)) ** 2);
  const nullSpread = over((i, j) => (before[i] as number) * (after[j] as number) * (weight(i, j) - expectedWeight(i, j)) ** 2);
  const standardError = Math.sqrt(Math.max(0, spread - (kappa - chanceAgreement * (1 - kappa)) ** 2) / total) / room;
  const nullStandardError = Math.sqrt(Math.max(0, nullSpread - chanceAgreement ** 2) / total) / room;
  if (nullStandardError === 0) return notEstimable(reasons.noComparison, basis, kappa);
  const half = normalMultiplier(level) * standardError;
  return {
    kind: 'estimate',
    ...basis,
    estimate: kappa,
    interval: { lower: kappa - half, upper: Math.min(1, kappa + half), level },
    test: zFigures(kappa / nullStandardError),
    method: `Cohen's kappa, ${weights === 'none' ? 'unweighted' : `${weights} weights`}, with the standard errors of Fleiss, Cohen and Everitt (two-sided, ${percentText(level)}).`,
    failedAssumptions: [...verySmallSample(total), ...(total >= 5 && total < 30 ? [`large-sample standard error from n = ${total}`] : [])],
    standardError,
    nullStandardError,
    observedAgreement,
    chanceAgreement,
  };
}
