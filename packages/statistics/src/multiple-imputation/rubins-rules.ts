/**
 * One estimate from the m analyses of a data set whose gaps were filled m times: total variance = within + (1 + 1/m) between, t with the
 * degrees of freedom of Barnard and Rubin, which never exceed those of the complete data.
 * Source: Rubin (1987) Multiple Imputation for Nonresponse in Surveys, chapter 3; Barnard & Rubin (1999) Biometrika 86:948-955.
 */

import { tMultiplier } from '../distributions/student-t.ts';
import type { NotEstimable, TestedEstimate } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons, requireLevel } from '../result.ts';
import { percentText, tFigures } from '../test-figures.ts';

export interface ImputedAnalysis {
  readonly estimate: number;
  /** Squared standard error. */
  readonly variance: number;
}

export interface PooledAnalyses extends TestedEstimate {
  readonly standardError: number;
  readonly varianceWithin: number;
  readonly varianceBetween: number;
  readonly df: number;
  /** Share of the total variance that comes from the gaps. */
  readonly shareFromGaps: number;
  /** Share of the information that the gaps took. */
  readonly missingInformation: number;
}

/** `completeDf`: degrees of freedom the analysis would have without gaps. `n` of the answer counts the analyses. */
export function rubinsRules(analyses: readonly ImputedAnalysis[], completeDf: number, level = 0.95): PooledAnalyses | NotEstimable {
  requireLevel(level);
  if (!(completeDf > 0)) throw new RangeError('The degrees of freedom of the complete data are positive.');
  if (!analyses.every(({ estimate, variance }) => Number.isFinite(estimate) && Number.isFinite(variance) && variance >= 0)) {
    throw new RangeError('Each analysis has a finite estimate and a variance from 0 up.');
  }
  const m = analyses.length;
  const basis = { n: m, leftOut: nothingLeftOut };
  if (m === 0) return notEstimable(reasons.noData, basis);
  const estimate = analyses.reduce((sum, one) => sum + one.estimate / m, 0);
  if (m === 1) return notEstimable('one analysis: the variance between imputations is not known', basis, estimate);
  const varianceWithin = analyses.reduce((sum, one) => sum + one.variance, 0) / m;
  const varianceBetween = analyses.reduce((sum, one) => sum + (one.estimate - estimate) ** 2, 0) / (m - 1);
  const fromGaps = (1 + 1 / m) * varianceBetween;
  const total = varianceWithin + fromGaps;
  if (!(varianceWithin > 0 && Number.isFinite(total))) return notEstimable('the analyses give no variance to pool', basis, estimate);
  const share = fromGaps / total;
  const observedDf = completeDf === Infinity ? Infinity : ((completeDf + 1) / (completeDf + 3)) * completeDf * (1 - share);
  const manyDf = (m - 1) / share ** 2;
  // The harmonic sum; with one of the two without bounds it is the other.
  const df = 1 / (1 / manyDf + 1 / observedDf);
  const standardError = Math.sqrt(total);
  const half = tMultiplier(level, df) * standardError;
  // (r + 2/(df + 3))/(r + 1) with r = share/(1 - share), written so that a share of 1 does no harm.
  const missingInformation = share + ((1 - share) * 2) / (df + 3);
  return {
    kind: 'estimate',
    ...basis,
    estimate,
    interval: { lower: estimate - half, upper: estimate + half, level },
    test: tFigures(estimate / standardError, df),
    standardError,
    varianceWithin,
    varianceBetween,
    df,
    shareFromGaps: share,
    missingInformation,
    method: `Multiple imputation pooled by Rubin's rules with Barnard-Rubin degrees of freedom (m = ${m}, two-sided, ${percentText(level)}).`,
    failedAssumptions: m < 5 ? [`pooled from ${m} imputations only`] : [],
  };
}
