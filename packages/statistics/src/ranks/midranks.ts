/** Ranks from 1, ties sharing the mean of the ranks they cover. */

export interface Midranks {
  /** In the order of the values given. */
  readonly ranks: Float64Array;
  /** How many values share one rank, for each rank that is shared. */
  readonly tieSizes: readonly number[];
}

/** The values must be finite; equality is that of doubles, so round differences to the instrument's resolution first. */
export function midranks(values: ArrayLike<number>): Midranks {
  const order = Uint32Array.from(values, (_, i) => i).sort((a, b) => (values[a] as number) - (values[b] as number));
  const ranks = new Float64Array(values.length);
  const tieSizes: number[] = [];
  for (let start = 0; start < order.length;) {
    let end = start + 1;
    while (end < order.length && values[order[end] as number] === values[order[start] as number]) end++;
    for (let i = start; i < end; i++) ranks[order[i] as number] = (start + end + 1) / 2;
    if (end - start > 1) tieSizes.push(end - start);
    start = end;
  }
  return { ranks, tieSizes };
}

/** Sum of t³ - t over the ties: what they take from the variance of a rank sum. */
export function tieTerm(tieSizes: readonly number[]): number {
  return tieSizes.reduce((sum, size) => sum + size ** 3 - size, 0);
}
