/** Rows by a number that names their group, in the order of the rows. Kept as linked lists: no array per group. */
export class RowGroups {
  private readonly first = new Map<number, number>();
  private readonly next: Int32Array;

  /** @param groups Per row its group; a negative number for a row that belongs to none. */
  constructor(groups: ArrayLike<number>) {
    this.next = new Int32Array(groups.length).fill(-1);
    for (let row = groups.length - 1; row >= 0; row -= 1) {
      const group = groups[row] ?? -1;
      if (group < 0) continue;
      this.next[row] = this.first.get(group) ?? -1;
      this.first.set(group, row);
    }
  }

  has(group: number): boolean {
    return this.first.has(group);
  }

  /** The first row of a group, or -1. */
  firstOf(group: number): number {
    return this.first.get(group) ?? -1;
  }

  rowsOf(group: number): number[] {
    return this.chain(this.firstOf(group));
  }

  /** Every group's rows. */
  *[Symbol.iterator](): Generator<number[]> {
    for (const first of this.first.values()) yield this.chain(first);
  }

  private chain(first: number): number[] {
    const rows: number[] = [];
    for (let row = first; row >= 0; row = this.next[row] ?? -1) rows.push(row);
    return rows;
  }
}
