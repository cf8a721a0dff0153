/**
 * Common odds ratio of a 2 x 2 table over strata and the test that it is 1, without continuity correction.
 * Estimate: Mantel & Haenszel (1959) J Natl Cancer Inst 22:719-748. Interval: variance of Robins, Breslow & Greenland (1986) Biometrics
 * 42:311-323. Strata with an empty margin carry no information on the odds ratio and are passed over, as in R's mantelhaen.test.
 */

import { normalMultiplier } from '../distributions/normal.ts';
import type { TestedEstimateResult } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons, requireLevel } from '../result.ts';
import { chiSquareFigures, percentText } from '../test-figures.ts';
import { requireCountTable } from './contingency-table.ts';
import type { TwoByTwo } from './fisher-two-by-two.ts';

export function mantelHaenszel(strata: readonly TwoByTwo[], level = 0.95): TestedEstimateResult {
  requireLevel(level);
  strata.forEach(requireCountTable);
  let n = 0;
  let [agree, disagree, difference, variance] = [0, 0, 0, 0];
  let [agreeSquare, mixed, disagreeSquare] = [0, 0, 0];
  for (const [[a, b], [c, d]] of strata) {
    const total = a + b + c + d;
    n += total;
    const [row1, row2, column1, column2] = [a + b, c + d, a + c, b + d];
    if (row1 === 0 || row2 === 0 || column1 === 0 || column2 === 0) continue;
    const r = (a / total) * d;
    const s = (b / total) * c;
    const p = (a + d) / total;
    const q = (b + c) / total;
    agree += r;
    disagree += s;
    agreeSquare += p * r;
    mixed += p * s + q * r;
    disagreeSquare += q * s;
    difference += a - row1 * (column1 / total);
    variance += (row1 / total) * row2 * (column1 / total) * (column2 / (total - 1));
  }
  const basis = { n, leftOut: nothingLeftOut };
  if (variance === 0) return notEstimable(n === 0 ? reasons.noData : reasons.noComparison, basis);
  if (agree === 0 || disagree === 0)
    return notEstimable('one of the two diagonals is empty in every stratum: the odds ratio has no bounds', basis);
  const estimate = agree / disagree;
  const error = Math.sqrt(agreeSquare / (2 * agree * agree) + mixed / (2 * agree * disagree) + disagreeSquare / (2 * disagree * disagree));
  const factor = Math.exp(normalMultiplier(level) * error);
  return {
    kind: 'estimate',
    ...basis,
    estimate,
    interval: { lower: estimate / factor, upper: estimate * factor, level },
    test: chiSquareFigures((difference * difference) / variance, 1),
    method: `Mantel-Haenszel common odds ratio with the interval of Robins, Breslow and Greenland (two-sided, ${percentText(level)}) and the Mantel-Haenszel test without continuity correction.`,
    failedAssumptions: variance < 5 ? ['little information over the strata: the chi-square approximation is rough'] : [],
  };
}
