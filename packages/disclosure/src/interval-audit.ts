/** What a reader can work out about each hidden place of one two-way table. */
import type { CountTable, HiddenPattern, Place, TableWithTotals } from './count-table.ts';
import { flagsOf, placeAt, withTotals } from './count-table.ts';
import { flowRound, tableNetwork } from './table-network.ts';

/** The smallest and largest number of people a hidden place can hold, given everything published. `high` is `Infinity` if unbounded. */
export interface HiddenInterval {
  readonly place: Place;
  readonly low: number;
  readonly high: number;
}

/** What a reader knows about a hidden place before looking at the rest of the table. */
export interface Knowledge {
  readonly least: number;
  readonly most: number;
}

/** Zeros are published, so whatever is hidden holds at least one person. */
export const notZero: Knowledge = { least: 1, most: Number.POSITIVE_INFINITY };

export interface AuditOptions {
  /** What the reader knows about each hidden place; without it, that it is not zero. The true value must lie within. */
  readonly knowledge?: (place: Place) => Knowledge;
}

/** Half-arc capacities: how far each hidden place may grow or shrink; published places do neither. */
export function hiddenCapacities(
  table: TableWithTotals,
  hidden: readonly boolean[],
  knowledgeAt: (position: number) => Knowledge,
): Float64Array {
  const capacities = new Float64Array(2 * table.values.length);
  table.values.forEach((value, position) => {
    if (hidden[position] !== true) return;
    const { least, most } = knowledgeAt(position);
    if (value < least || value > most) throw new RangeError('A hidden count lies outside what the reader is said to know about it.');
    capacities[2 * position] = most - value;
    capacities[2 * position + 1] = value - least;
  });
  return capacities;
}

/**
 * Exact integer intervals of all hidden places, in the order of the table (row by row, totals last in their line).
 *
 * A reader is taken to know every published place and that lines add up. Source: house rule "audit, not a per-row count";
 * the method is described in `table-network.ts`.
 *
 * @throws RangeError for a malformed table or pattern, or a true count outside the stated knowledge.
 */
export function intervalAudit(table: CountTable, hidden: HiddenPattern, options: AuditOptions = {}): HiddenInterval[] {
  const full = withTotals(table);
  const flags = flagsOf(full, hidden);
  const knowledgeAt = (position: number) => options.knowledge?.(placeAt(full, position)) ?? notZero;
  const capacities = hiddenCapacities(full, flags, knowledgeAt);
  const network = tableNetwork(full);
  return flags.flatMap((isHidden, position) => {
    if (!isHidden) return [];
    const value = full.values[position] ?? 0;
    const up = flowRound(network, capacities, 2 * position);
    const down = flowRound(network, capacities, 2 * position + 1);
    return [
      {
        place: placeAt(full, position),
        low: value - Math.min(down.amount, capacities[2 * position + 1] ?? 0),
        high: value + Math.min(up.amount, capacities[2 * position] ?? 0),
      },
    ];
  });
}
