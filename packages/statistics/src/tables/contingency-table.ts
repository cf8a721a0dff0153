/** A table of counts as input, with its margins. Rows of different length or counts that are not whole are a mistake of the caller. */

export type CountTable = readonly (readonly number[])[];

export interface Margins {
  readonly rows: readonly number[];
  readonly columns: readonly number[];
  readonly total: number;
}

export function requireCountTable(table: CountTable): void {
  const width = table[0]?.length ?? 0;
  const sound = table.every((row) => row.length === width && row.every((count) => Number.isSafeInteger(count) && count >= 0));
  if (!sound) throw new RangeError('A table of counts has rows of one length and whole numbers from 0 up.');
}

export function marginsOf(table: CountTable): Margins {
  const rows = table.map((row) => row.reduce((sum, count) => sum + count, 0));
  const columns = (table[0] ?? []).map((_, j) => table.reduce((sum, row) => sum + (row[j] as number), 0));
  return { rows, columns, total: rows.reduce((sum, count) => sum + count, 0) };
}

/** The table without its empty rows and columns, which say nothing about association. */
export function withoutEmptyLines(table: CountTable): CountTable {
  const { rows, columns } = marginsOf(table);
  return table.filter((_, i) => rows[i] !== 0).map((row) => row.filter((_, j) => columns[j] !== 0));
}

/** A table with as many columns as rows: the same categories at two occasions or by two observers. */
export function requireSquareTable(table: CountTable): void {
  requireCountTable(table);
  if (table.some((row) => row.length !== table.length)) throw new RangeError('The same categories are needed in rows and columns.');
}
