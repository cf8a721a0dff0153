import type { Tails } from './tails.ts';
import { requireProbability } from './tails.ts';

/** A cumulative probability this close below p counts as reaching it: rounding must not push a quantile to the next number. */
const slack = 64 * Number.EPSILON;

/** Smallest whole x in [least, most] with P(X <= x) >= p, by bisection. */
export function discreteQuantile(tails: (x: number) => Tails, p: number, least: number, most: number): number {
  requireProbability(p);
  let below = least - 1;
  let reached = most;
  while (reached - below > 1) {
    const middle = below + Math.floor((reached - below) / 2);
    if (tails(middle).lower >= p * (1 - slack)) reached = middle;
    else below = middle;
  }
  return reached;
}
