/**
 * Chooses the further places to hide, at the least number of people hidden.
 *
 * A place that is still exposed is cut off from wider values by a smallest cut of the network, and every safe pattern must hide at
 * least one more place across that cut. Two steps use this:
 *
 * 1. A good pattern: hide the cheapest chain across the cut, until nothing is exposed; then show again, dearest first, what turns out
 *    not to be needed.
 * 2. The best pattern: collect the cuts as sets of which one place each must go, take the cheapest choice that satisfies all sets
 *    collected so far, and add the cuts of whatever that choice leaves exposed. The first choice that leaves nothing exposed is the
 *    cheapest pattern there is, since every safe pattern satisfies all sets. A fixed number of branches ends hard cases with the
 *    best pattern met.
 *
 * Source of the cuts: Fischetti M, Salazar JJ (1999), Models and algorithms for the 2-dimensional cell suppression problem in
 * statistical disclosure control, Math Program 84:283-312.
 */
import type { TableWithTotals } from './count-table.ts';
import { placeAt } from './count-table.ts';
import { cheapestChain } from './cheapest-chain.ts';
import type { Knowledge } from './interval-audit.ts';
import type { SearchBudget } from './least-cost-cover.ts';
import { leastCostCover } from './least-cost-cover.ts';
import type { ProtectionProblem, Weakness } from './protection-problem.ts';
import { capacitiesOf, hasRoom, isSafe, weaknessAt, weaknesses } from './protection-problem.ts';
import type { Flow } from './table-network.ts';
import { endOf, startOf, tableNetwork } from './table-network.ts';

export interface Complement {
  readonly hidden: readonly boolean[];
  readonly provenLeast: boolean;
}

/** Enough to prove the least for about 49 in 50 random tables of up to 30 by 6; the others end with the best pattern met. */
const BRANCHES = 10_000;
const ROUNDS = 60;

/**
 * @param required places that are hidden in any case
 * @returns the whole pattern, or `undefined` when no pattern that leaves the zeros and the grand total shown is safe
 */
export function chooseComplement(
  table: TableWithTotals,
  required: readonly boolean[],
  knowledgeAt: (position: number) => Knowledge,
  smallestShown: number,
): Complement | undefined {
  const network = tableNetwork(table);
  const problem = withoutHopeless({ table, network, smallestShown, required, knowledgeAt, costs: hidingCosts(table, required) });
  return problem === undefined ? undefined : cheapest(problem, goodPattern(problem, required));
}

/** A total costs more than all cells together, so totals go only when cells cannot do it. */
function hidingCosts(table: TableWithTotals, required: readonly boolean[]): (number | undefined)[] {
  const grand = table.values.length - 1;
  const dearerThanAllCells = (table.values[grand] ?? 0) + 1;
  return table.values.map((value, position) => {
    if (value === 0 || position === grand || required[position] === true) return undefined;
    const { row, column } = placeAt(table, position);
    return row === 'total' || column === 'total' ? value + dearerThanAllCells : value;
  });
}

/** Hiding more only widens intervals: what is exposed with everything hidden can never be hidden safely, so it must stay shown. */
function withoutHopeless(problem: ProtectionProblem): ProtectionProblem | undefined {
  const everything = problem.required.map((isRequired, position) => isRequired || problem.costs[position] !== undefined);
  const hopeless = new Set(weaknesses(problem, everything).map(({ position }) => position));
  if (hopeless.size === 0) return problem;
  if (problem.required.some((isRequired, position) => isRequired && hopeless.has(position))) return undefined;
  return withoutHopeless({ ...problem, costs: problem.costs.map((cost, position) => (hopeless.has(position) ? undefined : cost)) });
}

/** Adds cheapest chains until nothing is exposed, then takes back what is not needed. A place once safe stays so as more is hidden. */
function goodPattern(problem: ProtectionProblem, start: readonly boolean[]): boolean[] {
  const hidden = [...start];
  const toCheck = hidden.flatMap((isHidden, position) => (isHidden ? [position] : []));
  let capacities = capacitiesOf(problem, hidden);
  for (const position of toCheck) {
    for (;;) {
      const weakness = weaknessAt(problem, capacities, position);
      if (weakness === undefined) break;
      for (const added of cheapestChain(problem, weakness, hidden)) {
        hidden[added] = true;
        toCheck.push(added);
      }
      capacities = capacitiesOf(problem, hidden);
    }
  }
  return withoutNeedless(problem, hidden);
}

function withoutNeedless(problem: ProtectionProblem, hidden: readonly boolean[]): boolean[] {
  const kept = [...hidden];
  const chosen = kept.flatMap((isHidden, position) => (isHidden && problem.required[position] !== true ? [position] : []));
  chosen.sort((a, b) => costAt(problem, b) - costAt(problem, a) || b - a);
  for (const position of chosen) {
    kept[position] = false;
    if (!isSafe(problem, kept)) kept[position] = true;
  }
  return kept;
}

function cheapest(problem: ProtectionProblem, good: readonly boolean[]): Complement {
  const budget: SearchBudget = { branches: BRANCHES };
  const sets: (readonly number[])[] = [];
  let best = good;
  for (let round = 0; round < ROUNDS; round++) {
    const cover = leastCostCover(sets, (position) => costAt(problem, position), costOf(problem, best), budget);
    if (cover === 'out-of-budget') break;
    if (cover === undefined) return { hidden: best, provenLeast: true };
    const hidden = [...problem.required];
    for (const position of cover.items) hidden[position] = true;
    const exposed = weaknesses(problem, hidden);
    if (exposed.length === 0) return { hidden, provenLeast: true };
    sets.push(...exposed.flatMap((weakness) => cutsAround(problem, weakness, hidden)));
    const repaired = goodPattern(problem, hidden);
    if (costOf(problem, repaired) < costOf(problem, best)) best = repaired;
  }
  return { hidden: best, provenLeast: false };
}

function costAt(problem: ProtectionProblem, position: number): number {
  return problem.costs[position] ?? 0;
}

function costOf(problem: ProtectionProblem, hidden: readonly boolean[]): number {
  return hidden.reduce((sum, isHidden, position) => sum + (isHidden ? costAt(problem, position) : 0), 0);
}

/** Sets of shown places of which at least one must be hidden: those across the cuts nearest to either end of the exposed place. */
function cutsAround(problem: ProtectionProblem, weakness: Weakness, hidden: readonly boolean[]): number[][] {
  const { position, up, down, canGrow, canShrink } = weakness;
  const from = startOf(problem.network, 2 * position);
  const to = endOf(problem.network, 2 * position);
  const [growNear, growFar] = canGrow ? [nearSide(up), farSide(problem, up, from)] : [undefined, undefined];
  const [shrinkNear, shrinkFar] = canShrink ? [nearSide(down), farSide(problem, down, to)] : [undefined, undefined];
  return [
    [growNear, shrinkFar],
    [growFar, shrinkNear],
  ].map((sides) => [...new Set(sides.flatMap((side) => (side === undefined ? [] : across(problem, side, position, hidden))))]);
}

function nearSide(flow: Flow): readonly boolean[] {
  return Array.from(flow.reachable, (reached) => reached === 1);
}

/** Nodes from which the sink can no longer be reached. */
function farSide(problem: ProtectionProblem, flow: Flow, sink: number): readonly boolean[] {
  const { network } = problem;
  const reaches = new Array<boolean>(network.nodes).fill(false);
  reaches[sink] = true;
  const queue = [sink];
  for (const node of queue) {
    for (const leaving of network.leaving[node] ?? []) {
      const towards = leaving ^ 1;
      const before = endOf(network, leaving);
      if (reaches[before] !== true && (flow.residual[towards] ?? 0) > 0) {
        reaches[before] = true;
        queue.push(before);
      }
    }
  }
  return reaches.map((reached) => !reached);
}

/** Shown places that may be hidden and would then carry people from the inside of a cut to its outside. */
function across(problem: ProtectionProblem, inside: readonly boolean[], around: number, hidden: readonly boolean[]): number[] {
  const { network } = problem;
  return network.leaving.flatMap((halfArcs, node) =>
    inside[node] !== true
      ? []
      : [...halfArcs].flatMap((halfArc) => {
          const position = halfArc >> 1;
          const leads = inside[endOf(network, halfArc)] !== true && position !== around && hidden[position] !== true;
          return leads && problem.costs[position] !== undefined && hasRoom(problem, halfArc) ? [position] : [];
        }),
  );
}
