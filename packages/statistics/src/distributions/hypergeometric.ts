/** Hypergeometric distribution: marked ones among `draws` taken without return from `marked` + `unmarked`. */

import { binomialLogMass, requireCount } from './binomial.ts';
import { discreteQuantile } from './discrete-quantile.ts';
import type { Tails } from './tails.ts';
import { noneAbove, noneBelow, requireNumber, tailsFrom } from './tails.ts';

function support(marked: number, unmarked: number, draws: number): { least: number; most: number } {
  requireCount(marked, 'The number of marked ones');
  requireCount(unmarked, 'The number of unmarked ones');
  requireCount(draws, 'The number of draws');
  if (draws > marked + unmarked) throw new RangeError('No more can be drawn than there are.');
  return { least: Math.max(0, draws - unmarked), most: Math.min(marked, draws) };
}

/** ln P(X = x) from three binomial probabilities (Loader 2000), which need no factorials. */
export function hypergeometricLogMass(x: number, marked: number, unmarked: number, draws: number): number {
  const { least, most } = support(marked, unmarked, draws);
  if (!Number.isInteger(x) || x < least || x > most) return -Infinity;
  if (least === most) return 0;
  const share = draws / (marked + unmarked);
  return binomialLogMass(x, marked, share) + binomialLogMass(draws - x, unmarked, share) - binomialLogMass(draws, marked + unmarked, share);
}

export function hypergeometricMass(x: number, marked: number, unmarked: number, draws: number): number {
  return Math.exp(hypergeometricLogMass(x, marked, unmarked, draws));
}

/** `lower` is P(X <= x), `upper` P(X > x). The terms are added from x outwards on the side away from the mean. */
export function hypergeometricTails(x: number, marked: number, unmarked: number, draws: number): Tails {
  requireNumber(x, 'A hypergeometric count');
  const { least, most } = support(marked, unmarked, draws);
  const k = Math.floor(x);
  if (k < least) return noneBelow;
  if (k >= most) return noneAbove;
  const mean = (draws * marked) / (marked + unmarked);
  const downwards = k < mean;
  let term = 1;
  let sum = 1;
  if (downwards) {
    for (let i = k; i > least && term > sum * 1e-18; i--) {
      term *= (i * (unmarked - draws + i)) / ((marked - i + 1) * (draws - i + 1));
      sum += term;
    }
  } else {
    for (let i = k + 1; i < most && term > sum * 1e-18; i++) {
      term *= ((marked - i) * (draws - i)) / ((i + 1) * (unmarked - draws + i + 1));
      sum += term;
    }
  }
  const from = downwards ? k : k + 1;
  return tailsFrom(downwards ? 'lower' : 'upper', hypergeometricLogMass(from, marked, unmarked, draws) + Math.log(sum));
}

/** Smallest x with P(X <= x) >= p. */
export function hypergeometricQuantile(p: number, marked: number, unmarked: number, draws: number): number {
  const { least, most } = support(marked, unmarked, draws);
  return discreteQuantile((x) => hypergeometricTails(x, marked, unmarked, draws), p, least, most);
}
