/**
 * Exact two-sided p of Spearman's S, the sum of squared rank differences, for n ranks without ties: all n! orders are counted by dynamic
 * programming over the set of ranks already given out. Twice the smaller tail, at most 1.
 * Source: Kendall & Gibbons (1990) Rank Correlation Methods, 5th ed., appendix table 2 (values for n up to 13).
 */

export function exactSpearmanProbability(n: number, squares: number): number {
  const largest = (n * (n * n - 1)) / 3;
  const orders = Array.from({ length: 2 ** n }, () => new Float64Array(largest + 1));
  (orders[0] as Float64Array)[0] = 1;
  for (let used = 0; used < orders.length; used++) {
    const counts = orders[used] as Float64Array;
    const place = [...used.toString(2)].filter((bit) => bit === '1').length;
    for (let rank = 0; rank < n; rank++) {
      if (used & (1 << rank)) continue;
      const target = orders[used | (1 << rank)] as Float64Array;
      const step = (rank - place) ** 2;
      for (let sum = 0; sum + step <= largest; sum++) target[sum + step] = (target[sum + step] as number) + (counts[sum] as number);
    }
  }
  const all = orders[orders.length - 1] as Float64Array;
  const total = all.reduce((sum, count) => sum + count, 0);
  const observed = Math.round(squares);
  const share = (from: number, to: number): number => all.subarray(from, to + 1).reduce((sum, count) => sum + count, 0) / total;
  return Math.min(1, 2 * Math.min(share(0, observed), share(observed, largest)));
}
