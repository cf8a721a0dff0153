/** Balance of three or more groups at baseline: the pair that differs most, by the standardised mean difference of two groups. */

import type { Group } from '../groups/groups.ts';
import type { NotEstimable } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons } from '../result.ts';
import type { BalanceFigure } from './balance.ts';
import { classBalance, numberBalance } from './balance.ts';

export interface LargestImbalance extends BalanceFigure {
  /** The sign of the difference is first minus second. */
  readonly first: string;
  readonly second: string;
  readonly pairsCompared: number;
}

/** Counts of a group by class. */
export interface ClassCounts {
  readonly name: string;
  readonly counts: readonly number[];
}

/** Pairs without a figure of their own are passed over; without any pair there is none. */
function largestOf<One extends { readonly name: string }>(
  groups: readonly One[],
  balanceOf: (first: One, second: One) => BalanceFigure | NotEstimable,
): LargestImbalance | NotEstimable {
  const answers = groups.flatMap((first, i) => groups.slice(i + 1).map((second) => ({ first, second, of: balanceOf(first, second) })));
  const found = answers.flatMap(({ first, second, of }) =>
    of.kind === 'balance' ? [{ ...of, first: first.name, second: second.name }] : [],
  );
  const [some, ...rest] = found;
  if (some === undefined) return notEstimable(reasons.noComparison, { n: 0, leftOut: nothingLeftOut });
  const largest = rest.reduce((most, one) => (Math.abs(one.difference) > Math.abs(most.difference) ? one : most), some);
  return { ...largest, pairsCompared: found.length };
}

export function largestNumberImbalance(groups: readonly Group[]): LargestImbalance | NotEstimable {
  return largestOf(groups, (first, second) => numberBalance(first.values, second.values));
}

/** The classes stand in the same order in every group. */
export function largestClassImbalance(groups: readonly ClassCounts[]): LargestImbalance | NotEstimable {
  return largestOf(groups, (first, second) => classBalance(first.counts, second.counts));
}
