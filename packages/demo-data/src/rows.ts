/** Rows as arrays of cells in the dictionary's order, made from cells by column. */
import { dictionary } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import type { DemoCell, DemoRow } from './types.ts';

/** Cells by column; undefined and null both mean an empty cell. */
export type Cells = Readonly<Record<string, DemoCell | undefined>>;

export interface DatedRow {
  readonly table: TableKey;
  /** Study day that decides in which month the row is submitted. */
  readonly studyDay: number;
  readonly row: DemoRow;
}

const columns = new Map<TableKey, ReadonlyMap<string, number>>(
  dictionary.tables.map((table) => [table.key, new Map(table.variables.map(({ key }, index) => [key, index]))]),
);

/**
 * A row from parts that are laid over each other, the last one on top.
 * @throws Error when a cell has no column in the dictionary.
 */
export function datedRow(table: TableKey, studyDay: number, ...parts: readonly Cells[]): DatedRow {
  const places = columns.get(table);
  const row = Array<DemoCell>(places?.size ?? 0).fill(null);
  for (const part of parts) {
    for (const key of Object.keys(part)) {
      const place = places?.get(key);
      if (place === undefined) throw new Error(`A row of ${table} has a cell for which there is no column.`);
      row[place] = part[key] ?? null;
    }
  }
  return { table, studyDay, row };
}

/** To the given number of decimals, as one would write it. */
export function rounded(value: number, decimals: number): number {
  const scale = 10 ** decimals;
  return Math.round(value * scale) / scale;
}

export function clamp(value: number, min: number, max: number): number {
  return Math.max(min, Math.min(max, value));
}
