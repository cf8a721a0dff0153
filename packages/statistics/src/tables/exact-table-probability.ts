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

/** Steps after which counting is given up; a step is one way to fill one column, or one partial table carried on. About half a second. */
const workLimit = 5_000_000;

/** ln probabilities that agree to this are carried together. */
const sameLog = 2 ** -33;

/** What the remaining columns can still contribute to the ln weight from a state, and the ln weight of all ways to fill them together. */
interface Outlook {
  readonly most: number;
  readonly least: number;
  readonly all: number;
}

interface Partial {
  readonly log: number;
  /** How many partial tables there are with that probability. */
  count: number;
}

/** What is left of the row totals, sorted and packed into one number. */
type State = number;

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
  const observed = transposed ? (table[0] ?? []).map((_, j) => table.map((row) => row[j] as number)) : table;
  const bar = logTableWeight(observed, columns, logFactorial) + Math.log1p(equalProbabilitySlack);

  const width = rows.length;
  const sorted = new Array<number>(width);
  function pack(left: readonly number[]): State {
    for (let i = 0; i < width; i++) {
      const count = left[i] as number;
      let place = i;
      for (; place > 0 && (sorted[place - 1] as number) > count; place--) sorted[place] = sorted[place - 1] as number;
      sorted[place] = count;
    }
    let state = 0;
    for (let i = 0; i < width; i++) state = state * radix + (sorted[i] as number);
    return state;
  }
  function unpack(state: State): number[] {
    const left = new Array<number>(width);
    for (let i = width - 1, rest = state; i >= 0; i--) {
      left[i] = rest % radix;
      rest = Math.floor(rest / radix);
    }
    return left;
  }

  let work = 0;
  /** Calls `visit` with the state after, and the ln weight of, every way to fill a column. */
  function fillColumn(state: State, column: number, visit: (next: State, log: number) => void): void {
    const left = unpack(state);
    const next = [...left];
    const roomAfter = new Array<number>(width).fill(0);
    for (let i = width - 1; i > 0; i--) roomAfter[i - 1] = (roomAfter[i] as number) + (left[i] as number);
    const place = (i: number, open: number, log: number): void => {
      if (i === width) {
        if (++work > workLimit) throw new WorkLimitReached();
        visit(pack(next), log);
        return;
      }
      const room = left[i] as number;
      const most = Math.min(room, open);
      for (let cell = Math.max(0, open - (roomAfter[i] as number)); cell <= most; cell++) {
        next[i] = room - cell;
        place(i + 1, open - cell, log - lf(cell));
      }
    };
    place(0, column, lf(column));
  }

  const known = columns.map(() => new Map<State, Outlook>());
  known.push(new Map([[0, { most: 0, least: 0, all: 0 }]]));
  function outlookFrom(stage: number, state: State): Outlook {
    const memo = known[stage] as Map<State, Outlook>;
    let outlook = memo.get(state);
    if (outlook === undefined) {
      let [most, least] = [-Infinity, Infinity];
      fillColumn(state, columns[stage] as number, (next, log) => {
        const rest = outlookFrom(stage + 1, next);
        most = Math.max(most, log + rest.most);
        least = Math.min(least, log + rest.least);
      });
      const left = unpack(state);
      const all = lf(left.reduce((sum, count) => sum + count, 0)) - left.reduce((sum, count) => sum + lf(count), 0);
      outlook = { most, least, all };
      memo.set(state, outlook);
    }
    return outlook;
  }

  let probability = 0;
  /** Settles a partial table, or carries it on to the next column. */
  function arrive(carried: Map<State, Map<number, Partial>>, stage: number, state: State, log: number, count: number): void {
    const { most, least, all } = outlookFrom(stage, state);
    if (log + most <= bar) {
      probability += count * Math.exp(log + all - logTotal);
      return;
    }
    if (log + least > bar) return;
    let partials = carried.get(state);
    if (partials === undefined) {
      partials = new Map();
      carried.set(state, partials);
    }
    const logKey = Math.round(log / sameLog);
    const partial = partials.get(logKey);
    if (partial) partial.count += count;
    else partials.set(logKey, { log, count });
  }

  let logTotal = 0;
  try {
    const start = pack(rows);
    logTotal = outlookFrom(0, start).all;
    let carried = new Map<State, Map<number, Partial>>();
    arrive(carried, 0, start, 0, 1);
    for (const [stage, column] of columns.entries()) {
      const after = new Map<State, Map<number, Partial>>();
      for (const [state, partials] of carried) {
        fillColumn(state, column, (next, log) => {
          work += partials.size;
          for (const partial of partials.values()) arrive(after, stage + 1, next, partial.log + log, partial.count);
        });
      }
      carried = after;
    }
  } catch (error) {
    if (error instanceof WorkLimitReached) return undefined;
    throw error;
  }
  return Math.min(1, probability);
}
