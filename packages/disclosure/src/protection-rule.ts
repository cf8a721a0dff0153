/**
 * When a hidden place is safe.
 *
 * With `smallestShown` = 11 (counts 1 to 10 are not shown): the interval a reader can derive is at least 10 wide, and it reaches 11,
 * so that the reader can neither pin the count down nor even tell that it is a small one.
 *
 * Why this also keeps means safe. A published mean or SD (with its n) of a total is a sum over its cells, so a reader can subtract the
 * shown cells and is left with the mean of the hidden ones together; the same works for any rows minus any columns. Suppose such
 * arithmetic isolates a set of hidden cells with s people in all. Then their counts add up to s in every table the reader considers,
 * so none of them can exceed s. But every hidden cell's interval reaches at least `smallestShown`; hence s is at least
 * `smallestShown`, and no set of 1 to 10 people stands alone. The argument needs every hidden place to be audited, the complementary
 * ones as well, and it is why `protectTable` does so.
 *
 * What it does not cover: weighted differences that isolate nobody (the mean of one hidden cell minus the mean of another), and a
 * reader who re-runs the choice of complementary cells in the head.
 */
import type { TableWithTotals } from './count-table.ts';
import type { Knowledge } from './interval-audit.ts';
import { hiddenCapacities, wideningFlows } from './interval-audit.ts';
import type { Flow, TableNetwork } from './table-network.ts';

export interface ProtectionRule {
  /** Smallest count shown; 1 to one less are hidden. */
  readonly smallestShown: number;
}

/** A hidden place that fails, with the flows that show why. */
export interface Weakness {
  readonly position: number;
  readonly up: Flow;
  readonly down: Flow;
  /** The upper bound itself is too low, so only growing helps. */
  readonly mustGrow: boolean;
}

/** Hidden places that a reader could work out too closely. Empty when the pattern is safe. */
export function weaknesses(
  table: TableWithTotals,
  network: TableNetwork,
  hidden: readonly boolean[],
  knowledgeAt: (position: number) => Knowledge,
  rule: ProtectionRule,
  onlyFirst = false,
): Weakness[] {
  const capacities = hiddenCapacities(table, hidden, knowledgeAt);
  const enough = 2 * rule.smallestShown;
  const found: Weakness[] = [];
  for (const [position, isHidden] of hidden.entries()) {
    if (!isHidden) continue;
    const value = table.values[position] ?? 0;
    const { up, down } = wideningFlows(network, capacities, position, enough);
    const mustGrow = value + up.amount < rule.smallestShown;
    const width = up.amount + Math.min(down.amount, capacities[2 * position + 1] ?? 0);
    if (mustGrow || width < rule.smallestShown - 1) {
      found.push({ position, up, down, mustGrow });
      if (onlyFirst) return found;
    }
  }
  return found;
}
