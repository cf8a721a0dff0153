/** Fisher-Snedecor F. Degrees of freedom may be fractional (Welch); infinite denominators give chi-square over df. */

import { chiSquareQuantile, chiSquareTails } from './chi-square.ts';
import { betaLogitQuantile, incompleteBeta } from './incomplete-beta.ts';
import type { Tail, Tails } from './tails.ts';
import { noneAbove, noneBelow, requireNumber, requirePositive, requireProbability } from './tails.ts';

/** From here on the denominator is taken as known: relative error below 1e-9 in any tail that can be printed. */
const knownDenominator = 1e11;

export function fTails(f: number, df1: number, df2: number): Tails {
  requireNumber(f, 'An F value');
  requirePositive(df1, 'The numerator degrees of freedom');
  requirePositive(df2, 'The denominator degrees of freedom');
  if (f <= 0) return noneBelow;
  if (f === Infinity) return noneAbove;
  if (df2 > knownDenominator) return chiSquareTails(f * df1, df1);
  const ratio = (df1 / df2) * f;
  const y = 1 / (1 + ratio);
  return incompleteBeta(df1 / 2, df2 / 2, ratio < 1e290 ? ratio * y : 1, y);
}

export function fQuantile(p: number, df1: number, df2: number, tail: Tail = 'lower'): number {
  requireProbability(p);
  requirePositive(df1, 'The numerator degrees of freedom');
  if (df1 === Infinity) throw new RangeError('The numerator degrees of freedom are finite.');
  requirePositive(df2, 'The denominator degrees of freedom');
  if (df2 > knownDenominator) return chiSquareQuantile(p, df1, tail) / df1;
  return (df2 / df1) * Math.exp(betaLogitQuantile(p, df1 / 2, df2 / 2, tail));
}
