/**
 * Intraclass correlation of people within sites by one-way analysis of variance, sites of unequal size: the share of all variance that
 * lies between sites, set to 0 where the sites differ less than people within them do.
 * Source: Donner (1986) Int Stat Rev 54:67-82 (analysis of variance estimator); n0 = (N - sum n^2/N)/(k - 1). Needs at least 5 sites.
 */

import type { Label } from '../complete-rows.ts';
import { completeRows } from '../complete-rows.ts';
import { centredColumn, rangeObstacle } from '../linear-algebra/centred-column.ts';
import type { NotEstimable, Provenance, TestFigures } from '../result.ts';
import { notEstimable, reasons } from '../result.ts';
import type { Observation } from '../samples.ts';
import { fFigures } from '../test-figures.ts';

export interface IntraclassCorrelation extends Provenance {
  readonly kind: 'intraclass-correlation';
  /** 0 to 1. */
  readonly correlation: number;
  readonly sites: number;
  readonly meanSquareBetween: number;
  readonly meanSquareWithin: number;
  /** Size of a site that stands for all in the estimate. */
  readonly typicalSize: number;
  readonly varianceBetween: number;
  /** That there is no variance between sites. */
  readonly test: TestFigures;
}

const fewestSites = 5;

export function intraclassCorrelation(values: ArrayLike<Observation>, site: ArrayLike<Label>): IntraclassCorrelation | NotEstimable {
  const { columns, labels, n, leftOut } = completeRows([values], [site]);
  const basis = { n, leftOut };
  const { names, codes } = labels[0] as (typeof labels)[number];
  const k = names.length;
  if (n === 0) return notEstimable(reasons.noData, basis);
  if (k < fewestSites) return notEstimable(`${k} sites: an intraclass correlation needs at least ${fewestSites}`, basis);
  if (k === n) return notEstimable('no site has more than one person', basis);
  const centred = centredColumn(columns[0] as Float64Array, true);
  const { norm, unit } = centred;
  const outOfRange = rangeObstacle([centred]);
  if (norm === 0) return notEstimable(reasons.allEqual, basis);
  if (outOfRange !== undefined) return notEstimable(outOfRange, basis);
  const sizes = new Float64Array(k);
  const sums = new Float64Array(k);
  for (const [i, code] of codes.entries()) {
    sizes[code] = (sizes[code] as number) + 1;
    sums[code] = (sums[code] as number) + (unit[i] as number);
  }
  const means = sums.map((sum, c) => sum / (sizes[c] as number));
  const within = unit.reduce((sum, value, i) => sum + (value - (means[codes[i] as number] as number)) ** 2, 0);
  const between = means.reduce((sum, mean, c) => sum + (sizes[c] as number) * mean * mean, 0);
  const meanSquareWithin = (within / (n - k)) * norm ** 2;
  const meanSquareBetween = (between / (k - 1)) * norm ** 2;
  if (within < n * Number.EPSILON ** 2) return notEstimable('all people of a site have the same value', basis);
  const typicalSize = (n - sizes.reduce((sum, size) => sum + size * size, 0) / n) / (k - 1);
  const varianceBetween = Math.max(0, (meanSquareBetween - meanSquareWithin) / typicalSize);
  return {
    kind: 'intraclass-correlation',
    ...basis,
    correlation: varianceBetween / (varianceBetween + meanSquareWithin),
    sites: k,
    meanSquareBetween,
    meanSquareWithin,
    typicalSize,
    varianceBetween,
    test: fFigures(between / (k - 1) / (within / (n - k)), k - 1, n - k),
    method: 'Intraclass correlation by one-way analysis of variance with sites of unequal size, F test (one-sided by its nature).',
    failedAssumptions: varianceBetween === 0 ? ['no variation between sites detected'] : [],
  };
}
