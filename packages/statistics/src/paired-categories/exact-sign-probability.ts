/**
 * Two-sided exact p of the sign test: `up` against `down` movements, ties already left out; twice the smaller binomial tail, at most 1.
 * Source: Conover (1999) Practical Nonparametric Statistics, 3rd ed., section 3.4. Needs at least one movement.
 */

import { binomialTails } from '../distributions/binomial.ts';

export function exactSignProbability(up: number, down: number): number {
  return Math.min(1, 2 * binomialTails(Math.min(up, down), up + down, 0.5).lower);
}
