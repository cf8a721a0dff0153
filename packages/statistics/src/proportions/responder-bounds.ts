/**
 * How far results that are missing could move a share: all of them without the event, and all of them with it. Nothing is filled in.
 * Source: best- and worst-case analysis as in Higgins, White & Wood (2008) Clinical Trials 5:225-239.
 */

import type { NotEstimable, Provenance } from '../result.ts';
import { notEstimable, reasons } from '../result.ts';
import type { EventCount } from './counts.ts';
import { requireEventCount } from './counts.ts';

/** Loss beyond this share is marked on every figure of the visit. */
const muchMissing = 0.2;

export interface ResponderBounds extends Provenance {
  readonly kind: 'bounds';
  /** Shares of everybody, with and without a result. */
  readonly lowest: number;
  readonly highest: number;
}

/** `missing`: people who belong to the group but have no result. `n` of the answer counts those who have one. */
export function responderBounds({ events, total }: EventCount, missing: number): ResponderBounds | NotEstimable {
  requireEventCount({ events, total });
  if (!(Number.isSafeInteger(missing) && missing >= 0))
    throw new RangeError('People without a result are counted in whole numbers from 0 up.');
  const basis = { n: total, leftOut: { missing, nonFinite: 0, unable: 0 } };
  const everybody = total + missing;
  if (everybody === 0) return notEstimable(reasons.noData, basis);
  return {
    kind: 'bounds',
    ...basis,
    lowest: events / everybody,
    highest: (events + missing) / everybody,
    method: 'Bounds of a proportion: all missing results without the event, and all with it.',
    failedAssumptions: missing > muchMissing * everybody ? [`${missing} of ${everybody} people have no result`] : [],
  };
}
