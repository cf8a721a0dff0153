/**
 * What a group's values look like: n, mean, SD, median, quartiles (type 7), skewness (G1), each only where n allows it.
 * Sources: Hyndman & Fan (1996) American Statistician 50:361-365 (quantiles); Joanes & Gill (1998) The Statistician 47:183-189 (skewness).
 */

import type { Basis, Figure, NotEstimable, Provenance } from '../result.ts';
import { figure, noFigure, notEstimable, reasons, verySmallSample } from '../result.ts';
import type { Observation } from '../samples.ts';
import { cleanSample } from '../samples.ts';
import { computableScale } from './computable-scale.ts';
import type { Moments } from './moments.ts';
import { moments, sampleSd, skewness } from './moments.ts';
import { quantileOfSorted } from './quantile.ts';

export interface Quartiles {
  readonly lower: number;
  readonly upper: number;
}

export interface Description extends Provenance {
  readonly kind: 'description';
  readonly mean: number;
  /** 0 when all values are equal. */
  readonly sd: Figure;
  readonly median: number;
  readonly quartiles: Figure<Quartiles>;
  readonly skewness: Figure;
  readonly least: number;
  readonly greatest: number;
  /** Which summary to print first. */
  readonly leadWith: 'mean' | 'median';
}

export interface DescriptionOptions {
  /** The instrument's values are ordered classes rather than amounts: the median leads. */
  readonly ordinal?: boolean;
}

const quartilesFrom = 5;

function skewnessOf(of: Moments): Figure {
  if (of.n < 3) return noFigure('skewness needs three values');
  if (of.least === of.greatest) return noFigure(reasons.allEqual);
  return figure(skewness(of));
}

export function describe(observations: ArrayLike<Observation>, options: DescriptionOptions = {}): Description | NotEstimable {
  const { values, n, leftOut } = cleanSample(observations);
  const basis: Basis = { n, leftOut };
  if (n === 0) return notEstimable(reasons.noData, basis);
  const scaled = computableScale([values]);
  if (scaled === 'too large') return notEstimable(reasons.tooLarge, basis);
  const { factor } = scaled;
  const of = moments(scaled.samples[0] as Float64Array);
  const sorted = values.slice().sort();
  const skew = skewnessOf(of);
  return {
    kind: 'description',
    ...basis,
    mean: of.mean * factor,
    sd: n === 1 ? noFigure(reasons.singleValue) : figure(sampleSd(of) * factor),
    median: quantileOfSorted(sorted, 0.5),
    quartiles:
      n < quartilesFrom
        ? noFigure('quartiles need five values')
        : figure({ lower: quantileOfSorted(sorted, 0.25), upper: quantileOfSorted(sorted, 0.75) }),
    skewness: skew,
    least: of.least * factor,
    greatest: of.greatest * factor,
    leadWith: options.ordinal === true || (skew.kind === 'figure' && Math.abs(skew.value) > 1) ? 'median' : 'mean',
    method: 'Mean, sample SD (n - 1), median, quartiles of type 7, adjusted skewness G1.',
    failedAssumptions: verySmallSample(n),
  };
}
