/**
 * Groups compared on follow-up, allowing for baseline: follow-up = intercept + slope x baseline + group. Adjusted means are what the model
 * says at the overall mean baseline. Pairs are compared with Holm's and Tukey's (studentised range) adjustment.
 *
 * The model holds one slope for all groups; the test that slopes differ is reported beside it, and where its p is below 0.05 the means by
 * group are given at the quartiles of baseline from the model with a slope for each group.
 *
 * Source: Milliken & Johnson (2002) Analysis of Messy Data III: Analysis of Covariance, chapters 2 and 3; Holm (1979) Scand J Stat 6:65-70;
 * Kramer (1956) Biometrics 12:307-310 for the studentised range with unequal variances of differences.
 */

import type { Label } from '../complete-rows.ts';
import { completeRows } from '../complete-rows.ts';
import { quantile } from '../description/quantile.ts';
import { studentisedRangeTails } from '../distributions/studentised-range.ts';
import { tMultiplier } from '../distributions/student-t.ts';
import { holmAdjusted } from '../multiplicity/adjusted-p-values.ts';
import type { Interval, NotEstimable, Provenance, TestFigures } from '../result.ts';
import { notEstimable, reasons, requireLevel } from '../result.ts';
import type { Observation } from '../samples.ts';
import { fFigures, percentText } from '../test-figures.ts';
import type { Coefficient } from './coefficient.ts';
import { neededPerCoefficient, tCoefficient } from './coefficient.ts';
import type { FittedLeastSquares } from './least-squares.ts';
import { fitLeastSquares, fittedMean } from './least-squares.ts';
import { coefficientsOf, reasonForUnfit, tooFewParticipants } from './linear-regression.ts';

export interface AdjustedMean {
  readonly group: string;
  readonly n: number;
  readonly mean: number;
  readonly standardError: number;
  readonly interval: Interval;
  /** Adjusted mean minus the baseline it is given at. */
  readonly change: number;
}

/** `group` minus `reference`; its interval and t test are not adjusted for the number of pairs. */
export interface AdjustedDifference extends Coefficient {
  readonly group: string;
  readonly reference: string;
  readonly holmP?: number;
  /** Absent below 2 residual degrees of freedom, where the studentised range is not used. */
  readonly tukeyP?: number;
}

export interface Ancova extends Provenance {
  readonly kind: 'ancova';
  /** Intercept, baseline, then each group against the first. */
  readonly coefficients: readonly Coefficient[];
  readonly meanBaseline: number;
  readonly adjustedMeans: readonly AdjustedMean[];
  readonly differences: readonly AdjustedDifference[];
  /** Absent, as all tests, where the model rests on too few participants to show p. */
  readonly groupTest?: TestFigures;
  /** Share of what baseline leaves open that the groups explain. */
  readonly partialEtaSquared: number;
  readonly slopeHomogeneity: TestFigures | NotEstimable;
  /** Only where slopes differ (p < 0.05): means from the model with one slope per group. */
  readonly meansByBaseline?: readonly { readonly baseline: number; readonly means: readonly AdjustedMean[] }[];
  readonly residualSd: number;
  readonly residualDf: number;
}

export interface AncovaInput {
  readonly baseline: ArrayLike<Observation>;
  readonly followUp: ArrayLike<Observation>;
  readonly group: ArrayLike<Label>;
  readonly level?: number;
}

/** Slopes that differ at this p call for means at several baselines. */
const slopesDifferBelow = 0.05;

/** Predictor values of a group at a baseline value. */
type RowOf = (group: number, baseline: number) => number[];

function adjustedMeansOf(
  fit: FittedLeastSquares,
  rowOf: RowOf,
  baseline: number,
  groups: readonly { name: string; n: number }[],
  level: number,
): AdjustedMean[] {
  const residualSd = Math.sqrt(fit.residualSumOfSquares / fit.residualDf);
  const multiplier = tMultiplier(level, fit.residualDf);
  return groups.map(({ name, n }, g) => {
    const { mean, varianceFactor } = fittedMean(fit, rowOf(g, baseline));
    const standardError = residualSd * Math.sqrt(varianceFactor);
    const half = multiplier * standardError;
    return { group: name, n, mean, standardError, interval: { lower: mean - half, upper: mean + half, level }, change: mean - baseline };
  });
}

function differencesOf(fit: FittedLeastSquares, names: readonly string[], level: number, tested: boolean): AdjustedDifference[] {
  const residualVariance = fit.residualSumOfSquares / fit.residualDf;
  // Predictor g is the indicator of group g; the first group has none and stands for zero.
  const effect = (g: number): number => (g === 0 ? 0 : (fit.slopes[g] as number));
  const factor = (g: number, h: number): number => (g === 0 || h === 0 ? 0 : (fit.slopeFactor[g]?.[h] as number));
  const plain = names.flatMap((group, g) =>
    names.slice(0, g).map((reference, h) => {
      const variance = residualVariance * (factor(g, g) + factor(h, h) - 2 * factor(g, h));
      const uncertain = { name: `${group} minus ${reference}`, estimate: effect(g) - effect(h), standardError: Math.sqrt(variance) };
      return { ...tCoefficient(uncertain, fit.residualDf, level, tested), group, reference };
    }),
  );
  const holm = holmAdjusted(plain.flatMap(({ test }) => (test ? [test.p] : [])));
  return plain.map((difference, i) => {
    const { test } = difference;
    if (test === undefined) return difference;
    const range = Math.abs(test.statistic) * Math.SQRT2;
    const tukeyP = fit.residualDf < 2 ? {} : { tukeyP: studentisedRangeTails(range, names.length, fit.residualDf).upper };
    return { ...difference, holmP: holm[i] as number, ...tukeyP };
  });
}

export function ancova({ baseline, followUp, group, level = 0.95 }: AncovaInput): Ancova | NotEstimable {
  requireLevel(level);
  const { columns, labels, n, leftOut } = completeRows([baseline, followUp], [group]);
  const basis = { n, leftOut };
  const [before, after] = columns as [Float64Array, Float64Array];
  const { names, codes } = labels[0] as (typeof labels)[number];
  if (n === 0) return notEstimable(reasons.noData, basis);
  if (names.length < 2) return notEstimable(reasons.noComparison, basis);
  const coefficientCount = names.length + 1;
  if (n - coefficientCount < 1) return notEstimable(tooFewParticipants(n, coefficientCount), basis);

  const indicators = names.slice(1).map((_, g) => Float64Array.from(codes, (code) => (code === g + 1 ? 1 : 0)));
  const predictorNames = ['baseline', ...names.slice(1).map((name) => `group: ${name}`)];
  const fit = fitLeastSquares(after, [before, ...indicators]);
  if (fit.kind !== 'fitted') return notEstimable(reasonForUnfit(fit, predictorNames), basis);
  if (fit.residualSumOfSquares === 0) return notEstimable('baseline and group reproduce the follow-up exactly', basis);

  const meanBaseline = fit.predictorMeans[0] as number;
  const interactions = indicators.map((indicator) => indicator.map((value, i) => value * ((before[i] as number) - meanBaseline)));
  const separate = n - 2 * names.length < 1 ? undefined : fitLeastSquares(after, [before, ...indicators, ...interactions]);
  const enough = n >= neededPerCoefficient * names.length;
  const groups = names.map((name, g) => ({ name, n: codes.reduce((count, code) => (code === g ? count + 1 : count), 0) }));
  const indicatorRow = (g: number, value: number): number[] => names.slice(1).map((_, h) => (h + 1 === g ? value : 0));
  const oneSlope: RowOf = (g, value) => [value, ...indicatorRow(g, 1)];
  const ownSlope: RowOf = (g, value) => [value, ...indicatorRow(g, 1), ...indicatorRow(g, value - meanBaseline)];
  const sumFrom = (fitted: FittedLeastSquares, start: number, end: number): number =>
    fitted.sequentialSumsOfSquares.slice(start, end).reduce((sum, square) => sum + square, 0);

  const groupDf = names.length - 1;
  const groupSquares = sumFrom(fit, 1, names.length);
  const meanSquare = fit.residualSumOfSquares / fit.residualDf;
  const slopeHomogeneity =
    separate?.kind === 'fitted' && separate.residualSumOfSquares > 0
      ? fFigures(
          sumFrom(separate, names.length, 2 * names.length - 1) / groupDf / (separate.residualSumOfSquares / separate.residualDf),
          groupDf,
          separate.residualDf,
        )
      : notEstimable('a slope for each group cannot be estimated', basis);
  const slopesDiffer = separate?.kind === 'fitted' && 'p' in slopeHomogeneity && slopeHomogeneity.p < slopesDifferBelow;
  return {
    kind: 'ancova',
    ...basis,
    coefficients: coefficientsOf(fit, predictorNames, level, enough),
    meanBaseline,
    adjustedMeans: adjustedMeansOf(fit, oneSlope, meanBaseline, groups, level),
    differences: differencesOf(fit, names, level, enough),
    ...(enough ? { groupTest: fFigures(groupSquares / groupDf / meanSquare, groupDf, fit.residualDf) } : {}),
    partialEtaSquared: groupSquares / (groupSquares + fit.residualSumOfSquares),
    slopeHomogeneity,
    ...(slopesDiffer
      ? {
          meansByBaseline: [0.25, 0.5, 0.75].map((p) => {
            const value = quantile(before, p);
            return { baseline: value, means: adjustedMeansOf(separate, ownSlope, value, groups, level) };
          }),
        }
      : {}),
    residualSd: Math.sqrt(meanSquare),
    residualDf: fit.residualDf,
    method: `Analysis of covariance of follow-up on baseline and group, adjusted means at the overall mean baseline, pairs with Holm's and Tukey's adjustment (two-sided, ${percentText(level)}).`,
    failedAssumptions: [
      ...(enough ? [] : [`${tooFewParticipants(n, coefficientCount)}: no p-values`]),
      ...(slopesDiffer ? ['the slope on baseline differs between groups: read the means at low, middle and high baseline'] : []),
    ],
  };
}
