/**
 * Probability that somebody with the event has the higher score than somebody without, ties counting half (area under the ROC curve),
 * from the rank sum. Source: Hanley & McNeil (1982) Radiology 143:29-36. Needs at least one of each.
 */

import { midranks } from '../ranks/midranks.ts';

export function areaUnderCurve(scores: Float64Array, events: Float64Array): number {
  const { ranks } = midranks(scores);
  let [withEvent, rankSum] = [0, 0];
  for (let i = 0; i < events.length; i++) {
    if (events[i] !== 1) continue;
    withEvent++;
    rankSum += ranks[i] as number;
  }
  return (rankSum - (withEvent * (withEvent + 1)) / 2) / (withEvent * (events.length - withEvent));
}
