/** From columns and labels as recorded to rows that can enter a model: a row with any gap is dropped and counted once. */

import type { LeftOut } from './result.ts';
import type { Observation } from './samples.ts';
import { fitness } from './samples.ts';

/** A recorded label of a group, site or person. Absent and empty labels count as missing. */
export type Label = string | number | null | undefined;

export interface LabelColumn {
  /** The labels that occur in complete rows, sorted, so that the answer does not hang on the order of the rows. */
  readonly names: readonly string[];
  /** For each complete row the index of its label in `names`. */
  readonly codes: Int32Array;
}

export interface CompleteRows {
  readonly n: number;
  readonly leftOut: LeftOut;
  readonly columns: readonly Float64Array[];
  readonly labels: readonly LabelColumn[];
}

const byWorst = ['usable', 'nonFinite', 'unable', 'missing'] as const;

/** Sorted as numbers when all of them are whole numbers, else by their characters. */
function sortedNames(names: Iterable<string>): string[] {
  const list = [...names];
  const numeric = list.every((name) => /^-?\d{1,15}$/.test(name));
  return numeric ? list.sort((a, b) => Number(a) - Number(b)) : list.sort();
}

function encode(labels: ArrayLike<Label>, kept: Int32Array): LabelColumn {
  const firstSeen = new Map<string, number>();
  const codes = new Int32Array(kept.length);
  for (let i = 0; i < kept.length; i++) {
    const name = String(labels[kept[i] as number]);
    let code = firstSeen.get(name);
    if (code === undefined) {
      code = firstSeen.size;
      firstSeen.set(name, code);
    }
    codes[i] = code;
  }
  const names = sortedNames(firstSeen.keys());
  const place = new Int32Array(names.length);
  for (const [index, name] of names.entries()) place[firstSeen.get(name) as number] = index;
  return { names, codes: codes.map((code) => place[code] as number) };
}

/** Columns and labels of different length are a mistake of the caller. */
export function completeRows(columns: readonly ArrayLike<Observation>[], labels: readonly ArrayLike<Label>[] = []): CompleteRows {
  const length = columns[0]?.length ?? labels[0]?.length ?? 0;
  if ([...columns, ...labels].some((column) => column.length !== length))
    throw new RangeError('The columns of a model need the same length.');
  const leftOut = { missing: 0, nonFinite: 0, unable: 0 };
  const kept = new Int32Array(length);
  let n = 0;
  for (let i = 0; i < length; i++) {
    let worst = 0;
    for (const column of columns) {
      const state = fitness(column[i]);
      if (state !== 'usable') worst = Math.max(worst, byWorst.indexOf(state));
    }
    for (const column of labels) {
      const label = column[i];
      if (label === null || label === undefined || label === '') worst = 3;
    }
    const state = byWorst[worst] as (typeof byWorst)[number];
    if (state === 'usable') kept[n++] = i;
    else leftOut[state]++;
  }
  const rows = kept.subarray(0, n);
  return {
    n,
    leftOut,
    columns: columns.map((column) => {
      const values = new Float64Array(n);
      for (let i = 0; i < n; i++) values[i] = column[rows[i] as number] as number;
      return values;
    }),
    labels: labels.map((column) => encode(column, rows)),
  };
}
