/** Follow-up times as input: how long each participant was watched and whether the event ended it. */

import type { Label } from '../complete-rows.ts';
import { completeRows } from '../complete-rows.ts';
import type { LeftOut } from '../result.ts';
import type { Observation } from '../samples.ts';

export interface FollowUp {
  /** From 0 up, in one unit (days). */
  readonly time: ArrayLike<Observation>;
  /** 1 when the event happened at `time`, 0 when watching ended without it. */
  readonly event: ArrayLike<Observation>;
}

/** All that happened at one time: events come before the ends of watching at the same time. */
export interface EventTime {
  readonly time: number;
  readonly atRisk: number;
  readonly events: number;
  readonly censored: number;
}

export interface CleanFollowUp {
  readonly n: number;
  readonly leftOut: LeftOut;
  readonly time: Float64Array;
  readonly event: Float64Array;
  readonly labels: ReturnType<typeof completeRows>['labels'];
  readonly covariates: readonly Float64Array[];
}

/** Negative times and events other than 0 and 1 are a mistake of the caller. */
export function cleanFollowUp(
  { time, event }: FollowUp,
  labels: readonly ArrayLike<Label>[] = [],
  covariates: readonly ArrayLike<Observation>[] = [],
): CleanFollowUp {
  const rows = completeRows([time, event, ...covariates], labels);
  const [times, events, ...others] = rows.columns as [Float64Array, Float64Array, ...Float64Array[]];
  if (!times.every((value) => value >= 0)) throw new RangeError('A follow-up time is 0 or more.');
  if (!events.every((value) => value === 0 || value === 1)) throw new RangeError('An event is 0 or 1.');
  return { n: rows.n, leftOut: rows.leftOut, time: times, event: events, labels: rows.labels, covariates: others };
}

/** Places of the rows in order of time. */
export function orderOfTime(time: Float64Array): Int32Array {
  return Int32Array.from({ length: time.length }, (_, i) => i).sort((i, j) => (time[i] as number) - (time[j] as number));
}

/** Every distinct time in order. */
export function eventTimes(time: Float64Array, event: Float64Array): EventTime[] {
  const order = orderOfTime(time);
  const found: EventTime[] = [];
  for (let start = 0; start < order.length;) {
    const now = time[order[start] as number] as number;
    let end = start;
    let events = 0;
    for (; end < order.length && time[order[end] as number] === now; end++) events += event[order[end] as number] as number;
    found.push({ time: now, atRisk: order.length - start, events, censored: end - start - events });
    start = end;
  }
  return found;
}
