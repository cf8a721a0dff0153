/**
 * Chooses the further places to hide.
 *
 * A place that is still too exposed is cut off from wider values by a smallest cut of the network; at least one more place on that
 * cut has to be hidden. The cheapest chain of places across the cut is hidden, until nothing is exposed; then every choice that turns
 * out not to be needed is shown again, dearest first.
 */
import type { TableWithTotals } from './count-table.ts';
import { placeAt } from './count-table.ts';
import type { Knowledge } from './interval-audit.ts';
import type { ProtectionRule, Weakness } from './protection-rule.ts';
import { weaknesses } from './protection-rule.ts';
import type { TableNetwork } from './table-network.ts';
import { endOf, tableNetwork } from './table-network.ts';

export interface Complement {
  readonly hidden: readonly boolean[];
  readonly provenLeast: boolean;
}

/** What the choice works on. */
interface Problem {
  readonly table: TableWithTotals;
  readonly network: TableNetwork;
  readonly required: readonly boolean[];
  readonly knowledgeAt: (position: number) => Knowledge;
  readonly rule: ProtectionRule;
  /** People hidden, per place that may be hidden besides the required ones. */
  readonly costs: (number | undefined)[];
}

/**
 * @param required places that are hidden in any case
 * @returns the whole pattern, or `undefined` when no pattern that leaves the zeros and the grand total shown is safe
 */
export function chooseComplement(
  table: TableWithTotals,
  required: readonly boolean[],
  knowledgeAt: (position: number) => Knowledge,
  rule: ProtectionRule,
): Complement | undefined {
  const problem: Problem = { table, network: tableNetwork(table), required, knowledgeAt, rule, costs: hidingCosts(table, required) };
  if (!dropHopeless(problem)) return undefined;
  return { hidden: withoutNeedless(problem, greedily(problem)), provenLeast: false };
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

function exposed(problem: Problem, hidden: readonly boolean[], onlyFirst: boolean): Weakness[] {
  return weaknesses(problem.table, problem.network, hidden, problem.knowledgeAt, problem.rule, onlyFirst);
}

/** Hiding more only widens intervals: what is exposed with everything hidden can never be hidden safely. False if a required one is. */
function dropHopeless(problem: Problem): boolean {
  for (;;) {
    const everything = problem.required.map((isRequired, position) => isRequired || problem.costs[position] !== undefined);
    const hopeless = exposed(problem, everything, false);
    if (hopeless.length === 0) return true;
    if (hopeless.some(({ position }) => problem.required[position] === true)) return false;
    for (const { position } of hopeless) problem.costs[position] = undefined;
  }
}

function greedily(problem: Problem): boolean[] {
  const hidden = [...problem.required];
  for (;;) {
    const [weakness] = exposed(problem, hidden, true);
    if (weakness === undefined) return hidden;
    for (const position of cheapestChain(problem, weakness, hidden)) hidden[position] = true;
  }
}

/** Shown places whose hiding lets the exposed place widen further; growing is preferred to shrinking at equal cost. */
function cheapestChain(problem: Problem, weakness: Weakness, hidden: readonly boolean[]): readonly number[] {
  const { position, up, down, mustGrow } = weakness;
  const from = problem.network.from[position] ?? 0;
  const to = problem.network.to[position] ?? 0;
  const grow = shortestChain(problem, hidden, position, up.residual, to, from);
  const shrink = mustGrow ? undefined : shortestChain(problem, hidden, position, down.residual, from, to);
  const best = grow !== undefined && (shrink === undefined || grow.cost <= shrink.cost) ? grow : shrink;
  if (best === undefined) throw new Error('A place is exposed although hiding everything would protect it.');
  return best.positions;
}

interface Chain {
  readonly cost: number;
  readonly positions: readonly number[];
}

/** Dijkstra over half-arcs: hidden places with room left cost nothing, shown ones what hiding them costs. */
function shortestChain(
  problem: Problem,
  hidden: readonly boolean[],
  around: number,
  residual: Float64Array,
  source: number,
  sink: number,
): Chain | undefined {
  const { network } = problem;
  const distance = new Array<number>(network.nodes).fill(Number.POSITIVE_INFINITY);
  const cameBy = new Int32Array(network.nodes).fill(-1);
  const settled = new Array<boolean>(network.nodes).fill(false);
  distance[source] = 0;
  for (;;) {
    const node = nearest(distance, settled);
    if (node === undefined || node === sink) break;
    settled[node] = true;
    for (const halfArc of network.leaving[node] ?? []) {
      const position = halfArc >> 1;
      if (position === around) continue;
      const length = hidden[position] === true ? lengthIfHidden(residual, halfArc) : lengthIfShown(problem, halfArc);
      const next = endOf(network, halfArc);
      const through = (distance[node] ?? 0) + length;
      if (through < (distance[next] ?? 0)) {
        distance[next] = through;
        cameBy[next] = halfArc;
      }
    }
  }
  const cost = distance[sink] ?? Number.POSITIVE_INFINITY;
  if (cost === Number.POSITIVE_INFINITY) return undefined;
  const positions: number[] = [];
  for (let node = sink; node !== source;) {
    const halfArc = cameBy[node] ?? -1;
    if (hidden[halfArc >> 1] !== true) positions.push(halfArc >> 1);
    node = endOf(network, halfArc ^ 1);
  }
  return { cost, positions };
}

function nearest(distance: readonly number[], settled: readonly boolean[]): number | undefined {
  let best: number | undefined;
  let bestDistance = Number.POSITIVE_INFINITY;
  distance.forEach((far, node) => {
    if (settled[node] !== true && far < bestDistance) {
      best = node;
      bestDistance = far;
    }
  });
  return best;
}

function lengthIfHidden(residual: Float64Array, halfArc: number): number {
  return (residual[halfArc] ?? 0) > 0 ? 0 : Number.POSITIVE_INFINITY;
}

/** What hiding a shown place costs, if it then has room to move in this direction. */
function lengthIfShown(problem: Problem, halfArc: number): number {
  const position = halfArc >> 1;
  const value = problem.table.values[position] ?? 0;
  const { least, most } = problem.knowledgeAt(position);
  const hasRoom = (halfArc & 1) === 0 ? value < most : value > least;
  return hasRoom ? (problem.costs[position] ?? Number.POSITIVE_INFINITY) : Number.POSITIVE_INFINITY;
}

function withoutNeedless(problem: Problem, hidden: readonly boolean[]): boolean[] {
  const kept = [...hidden];
  const chosen = kept.flatMap((isHidden, position) => (isHidden && problem.required[position] !== true ? [position] : []));
  chosen.sort((a, b) => (problem.costs[b] ?? 0) - (problem.costs[a] ?? 0) || b - a);
  for (const position of chosen) {
    kept[position] = false;
    if (exposed(problem, kept, true).length > 0) kept[position] = true;
  }
  return kept;
}
