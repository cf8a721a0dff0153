/**
 * The cells of one row as their own list: as many as the header has, or up to the last one that is filled.
 * @param cells Used again by the reader; only the first `count` are of this row.
 */
export function rowOf(cells: readonly string[], count: number, lastFilled: number, columns: number): string[] {
  const row = cells.slice(0, Math.min(count, Math.max(lastFilled + 1, columns)));
  while (row.length < columns) row.push('');
  return row;
}
