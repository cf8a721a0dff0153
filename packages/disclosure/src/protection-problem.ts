/**
 * When a hidden place is safe, and what may be hidden to make it so.
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
import { hiddenCapacities } from './interval-audit.ts';
import type { Flow, TableNetwork } from './table-network.ts';
import { flowRound } from './table-network.ts';

export interface ProtectionProblem {
  readonly table: TableWithTotals;
  readonly network: TableNetwork;
  /** Smallest count shown; 1 to one less are hidden. */
  readonly smallestShown: number;
  /** Places that are hidden in any case. */
  readonly required: readonly boolean[];
  /** What a reader knows about a place once it is hidden. */
  readonly knowledgeAt: (position: number) => Knowledge;
  /** What hiding a place costs; `undefined` where it must stay shown or is required anyway. */
  readonly costs: readonly (number | undefined)[];
}

/** A hidden place that fails, with the flows that show why. */
export interface Weakness {
  readonly position: number;
  readonly up: Flow;
  readonly down: Flow;
  /** Hiding more places can help by letting this one grow, or shrink. */
  readonly canGrow: boolean;
  readonly canShrink: boolean;
}

/** Room of each half-arc under a pattern. */
export function capacitiesOf(problem: ProtectionProblem, hidden: readonly boolean[]): Float64Array {
  return hiddenCapacities(problem.table, hidden, problem.knowledgeAt);
}

/** Whether a reader could work out one hidden place too closely, and why; `undefined` when it is safe. */
export function weaknessAt(problem: ProtectionProblem, capacities: Float64Array, position: number): Weakness | undefined {
  const { table, network, smallestShown } = problem;
  const roomUp = capacities[2 * position] ?? 0;
  const roomDown = capacities[2 * position + 1] ?? 0;
  const up = flowRound(network, capacities, 2 * position, smallestShown);
  const tooLow = (table.values[position] ?? 0) + Math.min(up.amount, roomUp) < smallestShown;
  if (!tooLow && Math.min(up.amount, roomUp) >= smallestShown - 1) return undefined;
  const down = flowRound(network, capacities, 2 * position + 1, smallestShown);
  if (!tooLow && Math.min(up.amount, roomUp) + Math.min(down.amount, roomDown) >= smallestShown - 1) return undefined;
  return { position, up, down, canGrow: up.amount < roomUp, canShrink: !tooLow && down.amount < roomDown };
}

/** All hidden places that a reader could work out too closely. */
export function weaknesses(problem: ProtectionProblem, hidden: readonly boolean[]): Weakness[] {
  const capacities = capacitiesOf(problem, hidden);
  return hidden.flatMap((isHidden, position) => (isHidden ? (weaknessAt(problem, capacities, position) ?? []) : []));
}

export function isSafe(problem: ProtectionProblem, hidden: readonly boolean[]): boolean {
  const capacities = capacitiesOf(problem, hidden);
  return hidden.every((isHidden, position) => !isHidden || weaknessAt(problem, capacities, position) === undefined);
}

/** Whether a place, once hidden, could grow (even half-arc) or shrink (odd half-arc). */
export function hasRoom(problem: ProtectionProblem, halfArc: number): boolean {
  const position = halfArc >> 1;
  const value = problem.table.values[position] ?? 0;
  const { least, most } = problem.knowledgeAt(position);
  return (halfArc & 1) === 0 ? value < most : value > least;
}
