/** What may happen to the cells of a table while they are read, besides being typed. */

/**
 * Sees the cells as the file has them. Rows in which every cell is just what the dictionary allows in its column are left
 * out: a code of its list, a participant code or a number within the hard limits says nothing beyond what the dictionary
 * has weighed. The others come whole.
 */
export interface CellWatch {
  /**
   * @param names Keys of the columns that the dictionary has, under whatever header; the header itself of all others.
   * @param shown The names by which findings call the columns.
   */
  header(names: readonly string[], shown: readonly string[]): void;
  row(cells: readonly string[], line: number): void;
  /** Whether findings may repeat the header of a column that the dictionary does not have. */
  mayShowHeader(header: string): boolean;
}

/** Cells typed in place of those in the file: text by column key, by line. */
export type Mends = ReadonlyMap<number, ReadonlyMap<string, string>>;

export interface TableOptions {
  readonly watch?: CellWatch;
  readonly mends?: Mends;
}
