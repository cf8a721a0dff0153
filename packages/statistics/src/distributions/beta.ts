/** Beta distribution. */
import { betaLogitQuantile, incompleteBeta } from './incomplete-beta.ts';
import type { Tail, Tails } from './tails.ts';
import { noneAbove, noneBelow, requireNumber } from './tails.ts';

export function betaTails(x: number, a: number, b: number): Tails {
  requireNumber(x, 'A beta variate');
  if (x < 0) return noneBelow;
  if (x > 1) return noneAbove;
  return incompleteBeta(a, b, x, 1 - x);
}

export function betaQuantile(p: number, a: number, b: number, tail: Tail = 'lower'): number {
  return 1 / (1 + Math.exp(-betaLogitQuantile(p, a, b, tail)));
}
