/**
 * Kaplan-Meier curve with Greenwood's standard error and intervals on the scale log(-log S). Events at a time come before the ends of
 * watching at the same time. At S = 1 the interval is 1 to 1; at S = 0 the standard error and the interval do not exist and are left out.
 *
 * Source: Kaplan & Meier (1958) J Am Stat Assoc 53:457-481; Kalbfleisch & Prentice (2002) The Statistical Analysis of Failure Time Data,
 * 2nd ed., section 1.4 (interval); quantiles and their limits as Brookmeyer & Crowley (1982) Biometrics 38:29-41 on that scale.
 */

import { normalMultiplier } from '../distributions/normal.ts';
import type { Interval, NotEstimable, Provenance } from '../result.ts';
import { notEstimable, reasons, requireLevel, verySmallSample } from '../result.ts';
import { percentText } from '../test-figures.ts';
import type { EventTime, FollowUp } from './follow-up.ts';
import { cleanFollowUp, eventTimes } from './follow-up.ts';

export interface SurvivalStep extends EventTime {
  /** Share still without the event after this time. */
  readonly survival: number;
  readonly standardError?: number;
  readonly interval?: Interval;
}

export interface SurvivalCurve extends Provenance {
  readonly kind: 'survival-curve';
  readonly events: number;
  /** Every distinct time, upwards; before the first one everybody is without the event. */
  readonly steps: readonly SurvivalStep[];
  readonly median: SurvivalQuantile | NotEstimable;
  readonly level: number;
}

/** A limit is absent where its curve does not come down far enough. */
export interface SurvivalQuantile {
  readonly time: number;
  readonly lower?: number;
  readonly upper?: number;
}

/** Shares this close to each other are the same share. */
const sameShare = 1e-12;

function logLogInterval(survival: number, standardError: number, level: number): Interval {
  if (survival === 1) return { lower: 1, upper: 1, level };
  const spread = (normalMultiplier(level) * standardError) / (survival * -Math.log(survival));
  return { lower: survival ** Math.exp(spread), upper: survival ** Math.exp(-spread), level };
}

export function kaplanMeier(followUp: FollowUp, level = 0.95): SurvivalCurve | NotEstimable {
  requireLevel(level);
  const { time, event, n, leftOut } = cleanFollowUp(followUp);
  if (n === 0) return notEstimable(reasons.noData, { n, leftOut });
  let survival = 1;
  let greenwood = 0;
  const steps = eventTimes(time, event).map((step): SurvivalStep => {
    const { atRisk, events } = step;
    survival *= (atRisk - events) / atRisk;
    if (survival === 0) return { ...step, survival };
    greenwood += events / (atRisk * (atRisk - events));
    const standardError = survival * Math.sqrt(greenwood);
    return { ...step, survival, standardError, interval: logLogInterval(survival, standardError, level) };
  });
  return {
    kind: 'survival-curve',
    n,
    leftOut,
    events: steps.reduce((sum, step) => sum + step.events, 0),
    steps,
    median: survivalQuantile({ steps, n, leftOut }, 0.5),
    level,
    method: `Kaplan-Meier estimate, Greenwood standard error, intervals on the log(-log) scale (two-sided, ${percentText(level)}).`,
    failedAssumptions: verySmallSample(n),
  };
}

interface CurvePoint {
  readonly time: number;
  readonly share: number;
}

/** First time a curve is at or below `share`; where it stays at exactly that share, the middle of the stretch. */
function timeAt(curve: readonly CurvePoint[], share: number): number | undefined {
  const reached = curve.find((point) => point.share <= share + sameShare);
  if (reached === undefined || reached.share < share - sameShare) return reached?.time;
  const below = curve.find((point) => point.share < share - sameShare) ?? curve.at(-1);
  return below && reached.time + (below.time - reached.time) / 2;
}

/** The time by which the share `p` has had the event. */
export function survivalQuantile(curve: Pick<SurvivalCurve, 'steps' | 'n' | 'leftOut'>, p: number): SurvivalQuantile | NotEstimable {
  if (!(p > 0 && p < 1)) throw new RangeError('A quantile of survival is asked for at a share strictly between 0 and 1.');
  const { steps } = curve;
  const time = timeAt(
    steps.map((step) => ({ time: step.time, share: step.survival })),
    1 - p,
  );
  if (time === undefined) return notEstimable('not reached', curve);
  // Once everybody has had the event the lower curve is at 0 too, while the upper one comes down no further.
  const lower = timeAt(
    steps.map((step) => ({ time: step.time, share: step.interval?.lower ?? 0 })),
    1 - p,
  );
  const upper = timeAt(
    steps.flatMap((step) => (step.interval ? [{ time: step.time, share: step.interval.upper }] : [])),
    1 - p,
  );
  return { time, ...(lower === undefined ? {} : { lower }), ...(upper === undefined ? {} : { upper }) };
}

export interface SurvivalAt extends Omit<SurvivalStep, 'events' | 'censored'> {
  /** Watched up to this time at least. */
  readonly atRisk: number;
}

/** The curve at any time from 0 up. After the last time watched it is what it was then, with nobody at risk. */
export function survivalAt({ steps, level }: SurvivalCurve, time: number): SurvivalAt {
  if (!(time >= 0)) throw new RangeError('A follow-up time is 0 or more.');
  const atRisk = steps.find((step) => step.time >= time)?.atRisk ?? 0;
  const last = steps.findLast((step) => step.time <= time);
  if (last === undefined) return { time, atRisk, survival: 1, standardError: 0, interval: { lower: 1, upper: 1, level } };
  const { survival, standardError, interval } = last;
  return {
    time,
    atRisk,
    survival,
    ...(standardError === undefined ? {} : { standardError }),
    ...(interval === undefined ? {} : { interval }),
  };
}
