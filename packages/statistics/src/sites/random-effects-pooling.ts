/**
 * One figure from the estimates of several sites that may differ in truth: DerSimonian-Laird variance between sites, interval and test by
 * Hartung and Knapp (t with k - 1 degrees of freedom), prediction interval for a further site (t with k - 2), and each site's estimate
 * drawn towards the pooled one.
 *
 * Fewer than three sites are not pooled. A site without a positive standard error has no weight and is left out, which the answer says.
 *
 * Source: DerSimonian & Laird (1986) Control Clin Trials 7:177-188; Hartung & Knapp (2001) Stat Med 20:3875-3889; Higgins, Thompson &
 * Spiegelhalter (2009) J R Stat Soc A 172:137-159.
 */

import { completeRows } from '../complete-rows.ts';
import { tMultiplier } from '../distributions/student-t.ts';
import type { Interval, NotEstimable, TestFigures, TestedEstimate } from '../result.ts';
import { notEstimable, requireLevel } from '../result.ts';
import type { Observation } from '../samples.ts';
import { chiSquareFigures, percentText, tFigures } from '../test-figures.ts';

export interface SiteEstimate {
  readonly site: string;
  readonly estimate: Observation;
  readonly standardError: Observation;
}

export interface PooledSite {
  readonly site: string;
  /** Share of the pooled figure, adding up to 1. */
  readonly weight: number;
  /** The site's estimate drawn towards the pooled one by what its standard error leaves open. */
  readonly shrunken: number;
}

export interface PooledEstimate extends TestedEstimate {
  /** Hartung-Knapp; the interval and the test rest on it. */
  readonly standardError: number;
  /** Standard error of DerSimonian and Laird, which the prediction interval rests on. */
  readonly unadjustedStandardError: number;
  /** Variance between sites; 0 when the sites differ no more than their standard errors say. */
  readonly varianceBetween: number;
  /** Share of the spread of the estimates that is not chance, 0 to 1 (I squared). */
  readonly inconsistency: number;
  /** Cochran's Q. */
  readonly heterogeneity: TestFigures;
  /** Where the true value of a further site would lie. */
  readonly predictionInterval: Interval;
  readonly sites: readonly PooledSite[];
}

const fewestSites = 3;

export function randomEffectsPooling(siteEstimates: readonly SiteEstimate[], level = 0.95): PooledEstimate | NotEstimable {
  requireLevel(level);
  const rows = completeRows(
    [siteEstimates.map((one) => one.estimate), siteEstimates.map((one) => one.standardError)],
    [siteEstimates.map((one) => one.site)],
  );
  const [allEstimates, allErrors] = rows.columns as [Float64Array, Float64Array];
  const { names, codes } = rows.labels[0] as (typeof rows.labels)[number];
  if (names.length < rows.n) throw new RangeError('Each site is pooled once.');
  const kept = [...allErrors.keys()].filter((i) => (allErrors[i] as number) ** 2 > 0);
  const k = kept.length;
  const basis = { n: k, leftOut: rows.leftOut };
  if (k < fewestSites) return notEstimable(`fewer than ${fewestSites} sites: no pooling statistics`, basis);
  const estimates = kept.map((i) => allEstimates[i] as number);
  const variances = kept.map((i) => (allErrors[i] as number) ** 2);
  const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);
  const weightedMean = (weights: readonly number[]): number =>
    sum(weights.map((weight, i) => weight * (estimates[i] as number))) / sum(weights);
  const spreadAbout = (weights: readonly number[], centre: number): number =>
    sum(weights.map((weight, i) => weight * ((estimates[i] as number) - centre) ** 2));

  const precision = variances.map((variance) => 1 / variance);
  const q = spreadAbout(precision, weightedMean(precision));
  const varianceBetween = Math.max(0, (q - (k - 1)) / (sum(precision) - sum(precision.map((weight) => weight * weight)) / sum(precision)));
  const weights = variances.map((variance) => 1 / (variance + varianceBetween));
  const pooled = weightedMean(weights);
  const unadjustedStandardError = Math.sqrt(1 / sum(weights));
  const standardError = Math.sqrt(spreadAbout(weights, pooled) / (k - 1) / sum(weights));
  if (![pooled, standardError, unadjustedStandardError, q].every(Number.isFinite))
    return notEstimable('the standard errors are too small, or the estimates too large, to weigh', basis);
  if (standardError === 0) return notEstimable('all sites give the same estimate: no interval', basis, pooled);

  const half = tMultiplier(level, k - 1) * standardError;
  const predictionHalf = tMultiplier(level, k - 2) * Math.sqrt(varianceBetween + unadjustedStandardError ** 2);
  const without = rows.n - k;
  return {
    kind: 'estimate',
    ...basis,
    estimate: pooled,
    interval: { lower: pooled - half, upper: pooled + half, level },
    test: tFigures(pooled / standardError, k - 1),
    standardError,
    unadjustedStandardError,
    varianceBetween,
    inconsistency: q > 0 ? Math.max(0, (q - (k - 1)) / q) : 0,
    heterogeneity: chiSquareFigures(q, k - 1),
    predictionInterval: { lower: pooled - predictionHalf, upper: pooled + predictionHalf, level },
    sites: kept.map((i, place) => ({
      site: names[codes[i] as number] as string,
      weight: (weights[place] as number) / sum(weights),
      shrunken: pooled + (varianceBetween / (varianceBetween + (variances[place] as number))) * ((estimates[place] as number) - pooled),
    })),
    method: `Random-effects pooling of site estimates: DerSimonian-Laird variance between sites, Hartung-Knapp interval and test (two-sided, ${percentText(level)}).`,
    failedAssumptions: [
      ...(k < 5 ? [`pooled from ${k} sites only`] : []),
      ...(without > 0 ? [`${without} site${without === 1 ? '' : 's'} without a positive standard error left out`] : []),
      ...(standardError < unadjustedStandardError
        ? ['the sites agree better than their standard errors say: the Hartung-Knapp interval may be too narrow']
        : []),
    ],
  };
}
