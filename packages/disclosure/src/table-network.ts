/**
 * A two-way table with totals seen as a network: one node per row, one per column, one for the row of totals and one for the column
 * of totals. Each place is an arc, and "the cells of a line add up to its total" says that what flows into a node flows out again.
 * Cells run from row to column, column totals from the column to the row of totals, the grand total from there to the column of
 * totals, row totals from there to the row.
 *
 * Every other table with the same published figures is reached from the true one by pushing people round cycles of hidden arcs, so
 * the largest and smallest value of a hidden place are maximum flows, in whole people.
 *
 * Source: Cox LH (1995), Network models for complementary cell suppression, J Am Stat Assoc 90:1453-1462.
 */
import type { TableWithTotals } from './count-table.ts';

/** Half-arc 2a follows arc a (the place grows), half-arc 2a + 1 runs against it (the place shrinks). */
export interface TableNetwork {
  readonly nodes: number;
  /** Per half-arc: the node it leads to. */
  readonly head: Int32Array;
  /** Per node: the half-arcs that leave it. */
  readonly leaving: readonly Int32Array[];
}

export function tableNetwork(table: TableWithTotals): TableNetwork {
  const nodes = table.rows + table.columns + 2;
  const head = new Int32Array(2 * table.values.length);
  const leaving: number[][] = Array.from({ length: nodes }, () => []);
  for (let i = 0; i <= table.rows; i++) {
    for (let j = 0; j <= table.columns; j++) {
      const arc = i * table.width + j;
      const columnNode = table.rows + 1 + j;
      const runsToColumn = (i === table.rows) === (j === table.columns);
      const [from, to] = runsToColumn ? [i, columnNode] : [columnNode, i];
      head[2 * arc] = to;
      head[2 * arc + 1] = from;
      leaving[from]?.push(2 * arc);
      leaving[to]?.push(2 * arc + 1);
    }
  }
  return { nodes, head, leaving: leaving.map((halfArcs) => Int32Array.from(halfArcs)) };
}

/** The node a half-arc leads to. */
export function endOf(network: TableNetwork, halfArc: number): number {
  return network.head[halfArc] ?? -1;
}

/** The node a half-arc leaves. */
export function startOf(network: TableNetwork, halfArc: number): number {
  return endOf(network, halfArc ^ 1);
}

export interface Flow {
  /** People that can be pushed; `Infinity` when nothing published bounds them. */
  readonly amount: number;
  /** What is left of each half-arc. */
  readonly residual: Float64Array;
  /** Per node, 1 where the source still reaches: the near side of a smallest cut, unless the flow was stopped early. */
  readonly reachable: Uint8Array;
}

/**
 * How many people can be pushed round through one half-arc, by shortest augmenting paths from its end back to its start (Edmonds and
 * Karp). The place of the half-arc itself is left out of the paths.
 *
 * @param enough stop as soon as so many are reached
 */
export function flowRound(network: TableNetwork, capacities: Float64Array, halfArc: number, enough = Number.POSITIVE_INFINITY): Flow {
  const source = endOf(network, halfArc);
  const sink = startOf(network, halfArc);
  const residual = Float64Array.from(capacities);
  residual[halfArc] = 0;
  residual[halfArc ^ 1] = 0;
  const cameBy = new Int32Array(network.nodes);
  const queue = new Int32Array(network.nodes);
  let amount = 0;
  for (;;) {
    const reachable = search(network, residual, source, sink, cameBy, queue);
    if (reachable[sink] !== 1 || amount >= enough) return { amount, residual, reachable };
    let bottleneck = Number.POSITIVE_INFINITY;
    for (let node = sink; node !== source; node = startOf(network, cameBy[node] ?? -1)) {
      bottleneck = Math.min(bottleneck, residual[cameBy[node] ?? -1] ?? 0);
    }
    amount += bottleneck;
    if (amount === Number.POSITIVE_INFINITY) return { amount, residual, reachable };
    for (let node = sink; node !== source; node = startOf(network, cameBy[node] ?? -1)) {
      const step = cameBy[node] ?? -1;
      residual[step] = (residual[step] ?? 0) - bottleneck;
      residual[step ^ 1] = (residual[step ^ 1] ?? 0) + bottleneck;
    }
  }
}

/** Breadth first from the source until the sink is met; notes by which half-arc each node was reached. */
function search(
  network: TableNetwork,
  residual: Float64Array,
  source: number,
  sink: number,
  cameBy: Int32Array,
  queue: Int32Array,
): Uint8Array {
  const seen = new Uint8Array(network.nodes);
  seen[source] = 1;
  queue[0] = source;
  let waiting = 1;
  for (let at = 0; at < waiting; at++) {
    for (const halfArc of network.leaving[queue[at] ?? -1] ?? []) {
      if ((residual[halfArc] ?? 0) <= 0) continue;
      const next = endOf(network, halfArc);
      if (seen[next] === 1) continue;
      seen[next] = 1;
      cameBy[next] = halfArc;
      if (next === sink) return seen;
      queue[waiting++] = next;
    }
  }
  return seen;
}
