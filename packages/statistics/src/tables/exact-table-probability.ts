/**
 * Exact p of the Fisher-Freeman-Halton test by counting tables with the observed margins, column by column.
 *
 * A state is what is left of the row totals (sorted, since rows may be exchanged). For each state the bounds of what the remaining columns
 * can still contribute are found once; a partial table whose every completion is at most as probable as the observed table is counted
 * whole, one whose every completion is more probable is dropped, and partial tables with equal probability so far are carried together.
 *
 * Source: Mehta & Patel (1983) J Am Stat Assoc 78:427-434 (network algorithm), with the bounds by dynamic programming.
 */

import { logFactorials } from './log-factorials.ts';
import type { Margins } from './contingency-table.ts';
import { equalProbabilitySlack } from './fisher-two-by-two.ts';

/** Steps after which counting is given up; a step is one way to fill one column. About a second's work. */
const workLimit = 6_000_000;

/** ln probabilities that agree to this are carried together. */
const sameLog = 2 ** -33;

interface Bounds {
  readonly most: number;
  readonly least: number;
}

interface Partial {
  readonly log: number;
  /** How many partial tables there are with that probability. */
  count: number;
}

interface State {
  readonly left: readonly number[];
  readonly partials: Map<number, Partial>;
}

class WorkLimitReached extends Error {}

/** ln of the product over columns of (column total)! / product of cell! for one table: its probability up to a constant of the margins. */
export function logTableWeight(table: readonly (readonly number[])[], columns: readonly number[], logFactorial: Float64Array): number {
  const cells = table.flat().reduce((sum, count) => sum + (logFactorial[count] as number), 0);
  return columns.reduce((sum, column) => sum + (logFactorial[column] as number), 0) - cells;
}

/** `undefined` when the tables are too many to count. `table` has no empty row or column. */
export function exactTableProbability(table: readonly (readonly number[])[], margins: Margins): number | undefined {
  // The shorter side makes the states; long columns first leave little to decide at the end.
  const transposed = margins.rows.length > margins.columns.length;
  const rows = transposed ? margins.columns : margins.rows;
  const columns = [...(transposed ? margins.rows : margins.columns)].sort((a, b) => b - a);
  const radix = Math.max(...rows) + 1;
  if (radix ** rows.length > Number.MAX_SAFE_INTEGER) return undefined;

  const logFactorial = logFactorials(margins.total);
  const lf = (count: number): number => logFactorial[count] as number;
  const logAll = (left: readonly number[]): number => lf(left.reduce((a, b) => a + b, 0)) - left.reduce((sum, count) => sum + lf(count), 0);
  const observed = transposed ? (table[0] ?? []).map((_, j) => table.map((row) => row[j] as number)) : table;
  const bar = logTableWeight(observed, columns, logFactorial) + Math.log1p(equalProbabilitySlack);
  const logTotal = logAll(rows);

  let work = 0;
  /** Calls `visit` with what is left of the rows and the ln weight, for every way to fill a column. */
  function fillColumn(left: readonly number[], column: number, visit: (left: number[], log: number) => void): void {
    const next = [...left];
    const roomAfter = left.map((_, i) => left.slice(i + 1).reduce((a, b) => a + b, 0));
    const place = (i: number, open: number, log: number): void => {
      if (i === left.length) {
        if (++work > workLimit) throw new WorkLimitReached();
        visit(
          [...next].sort((a, b) => a - b),
          log,
        );
        return;
      }
      const room = left[i] as number;
      for (let cell = Math.max(0, open - (roomAfter[i] as number)); cell <= Math.min(room, open); cell++) {
        next[i] = room - cell;
        place(i + 1, open - cell, log - lf(cell));
      }
    };
    place(0, column, lf(column));
  }

  const keyOf = (left: readonly number[]): number => left.reduce((key, count) => key * radix + count, 0);
  const known = columns.map(() => new Map<number, Bounds>());
  function boundsOf(stage: number, left: readonly number[]): Bounds {
    if (stage === columns.length) return { most: 0, least: 0 };
    const key = keyOf(left);
    const memo = known[stage] as Map<number, Bounds>;
    let bounds = memo.get(key);
    if (bounds === undefined) {
      let [most, least] = [-Infinity, Infinity];
      fillColumn(left, columns[stage] as number, (next, log) => {
        const rest = boundsOf(stage + 1, next);
        most = Math.max(most, log + rest.most);
        least = Math.min(least, log + rest.least);
      });
      bounds = { most, least };
      memo.set(key, bounds);
    }
    return bounds;
  }

  let probability = 0;
  function arrive(states: Map<number, State>, stage: number, left: readonly number[], log: number, count: number): void {
    const { most, least } = boundsOf(stage, left);
    if (log + most <= bar) {
      probability += count * Math.exp(log + logAll(left) - logTotal);
      return;
    }
    if (log + least > bar) return;
    const key = keyOf(left);
    let state = states.get(key);
    if (state === undefined) {
      state = { left, partials: new Map() };
      states.set(key, state);
    }
    const logKey = Math.round(log / sameLog);
    const partial = state.partials.get(logKey);
    if (partial) partial.count += count;
    else state.partials.set(logKey, { log, count });
  }

  try {
    let states = new Map<number, State>();
    arrive(
      states,
      0,
      [...rows].sort((a, b) => a - b),
      0,
      1,
    );
    for (const [stage, column] of columns.entries()) {
      const after = new Map<number, State>();
      for (const { left, partials } of states.values()) {
        fillColumn(left, column, (next, log) => {
          work += partials.size;
          for (const partial of partials.values()) arrive(after, stage + 1, next, partial.log + log, partial.count);
        });
      }
      states = after;
    }
  } catch (error) {
    if (error instanceof WorkLimitReached) return undefined;
    throw error;
  }
  return Math.min(1, probability);
}
