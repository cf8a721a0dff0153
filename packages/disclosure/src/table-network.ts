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

export interface TableNetwork {
  readonly nodes: number;
  /** Per arc (same order as the table's places): where it starts and ends. */
  readonly from: readonly number[];
  readonly to: readonly number[];
  /** Per node: the half-arcs that leave it. Half-arc 2a follows arc a (the place grows), 2a+1 runs against it (the place shrinks). */
  readonly leaving: readonly (readonly number[])[];
}

export function tableNetwork(table: TableWithTotals): TableNetwork {
  const nodes = table.rows + table.columns + 2;
  const from: number[] = [];
  const to: number[] = [];
  const leaving: number[][] = Array.from({ length: nodes }, () => []);
  for (let i = 0; i <= table.rows; i++) {
    for (let j = 0; j <= table.columns; j++) {
      const rowNode = i;
      const columnNode = table.rows + 1 + j;
      const rowToColumn = (i === table.rows) === (j === table.columns);
      const arc = from.length;
      from.push(rowToColumn ? rowNode : columnNode);
      to.push(rowToColumn ? columnNode : rowNode);
      leaving[rowToColumn ? rowNode : columnNode]?.push(2 * arc);
      leaving[rowToColumn ? columnNode : rowNode]?.push(2 * arc + 1);
    }
  }
  return { nodes, from, to, leaving };
}

/** The node a half-arc leads to. */
export function endOf(network: TableNetwork, halfArc: number): number {
  const arc = halfArc >> 1;
  const end = (halfArc & 1) === 0 ? network.to[arc] : network.from[arc];
  if (end === undefined) throw new RangeError('No such arc.');
  return end;
}

export interface Flow {
  /** People that can be pushed; `Infinity` when nothing published bounds them. */
  readonly amount: number;
  /** What is left of each half-arc. */
  readonly residual: Float64Array;
  /** Nodes still reachable from the source: the near side of a smallest cut. */
  readonly reachable: readonly boolean[];
}

/** Largest flow from one node to another by shortest augmenting paths (Edmonds and Karp). Stops early once `enough` is reached. */
export function maximumFlow(
  network: TableNetwork,
  capacities: Float64Array,
  source: number,
  sink: number,
  enough: number = Number.POSITIVE_INFINITY,
): Flow {
  const residual = Float64Array.from(capacities);
  let amount = 0;
  for (;;) {
    const cameBy = new Int32Array(network.nodes).fill(-1);
    const seen = new Array<boolean>(network.nodes).fill(false);
    seen[source] = true;
    const queue = [source];
    for (let head = 0; head < queue.length && seen[sink] !== true; head++) {
      for (const halfArc of network.leaving[queue[head] ?? -1] ?? []) {
        const next = endOf(network, halfArc);
        if (seen[next] !== true && (residual[halfArc] ?? 0) > 0) {
          seen[next] = true;
          cameBy[next] = halfArc;
          queue.push(next);
        }
      }
    }
    if (seen[sink] !== true || amount >= enough) return { amount, residual, reachable: seen };
    const path: number[] = [];
    for (let node = sink; node !== source;) {
      const halfArc = cameBy[node] ?? -1;
      path.push(halfArc);
      node = endOf(network, halfArc ^ 1);
    }
    const bottleneck = Math.min(...path.map((halfArc) => residual[halfArc] ?? 0));
    if (bottleneck === Number.POSITIVE_INFINITY) return { amount: bottleneck, residual, reachable: seen };
    for (const halfArc of path) {
      residual[halfArc] = (residual[halfArc] ?? 0) - bottleneck;
      residual[halfArc ^ 1] = (residual[halfArc ^ 1] ?? 0) + bottleneck;
    }
    amount += bottleneck;
  }
}
