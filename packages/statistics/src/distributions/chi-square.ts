/** Chi-square distribution. */
import { gammaQuantile, gammaTails } from './gamma.ts';
import type { Tail, Tails } from './tails.ts';

export function chiSquareTails(x: number, df: number): Tails {
  return gammaTails(x, df / 2, 2);
}

export function chiSquareQuantile(p: number, df: number, tail: Tail = 'lower'): number {
  return gammaQuantile(p, df / 2, 2, tail);
}
