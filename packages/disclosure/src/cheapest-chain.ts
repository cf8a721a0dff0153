/** The cheapest way to let an exposed place widen: a chain of places that ends where the exposed one begins. */
import type { ProtectionProblem, Weakness } from './protection-problem.ts';
import { hasRoom } from './protection-problem.ts';
import { endOf, startOf } from './table-network.ts';

/** Shown places whose hiding lets the exposed place widen further; growing is preferred to shrinking at equal cost. */
export function cheapestChain(problem: ProtectionProblem, weakness: Weakness, hidden: readonly boolean[]): readonly number[] {
  const { position, up, down } = weakness;
  const from = startOf(problem.network, 2 * position);
  const to = endOf(problem.network, 2 * position);
  const grow = weakness.canGrow ? shortestChain(problem, hidden, position, up.residual, to, from) : undefined;
  const shrink = weakness.canShrink ? shortestChain(problem, hidden, position, down.residual, from, to) : undefined;
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
  problem: ProtectionProblem,
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
      const next = endOf(network, halfArc);
      const through = (distance[node] ?? 0) + lengthOf(problem, hidden, residual, halfArc);
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
    node = startOf(network, halfArc);
  }
  return { cost, positions };
}

function lengthOf(problem: ProtectionProblem, hidden: readonly boolean[], residual: Float64Array, halfArc: number): number {
  const position = halfArc >> 1;
  if (hidden[position] === true) return (residual[halfArc] ?? 0) > 0 ? 0 : Number.POSITIVE_INFINITY;
  return hasRoom(problem, halfArc) ? (problem.costs[position] ?? Number.POSITIVE_INFINITY) : Number.POSITIVE_INFINITY;
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
