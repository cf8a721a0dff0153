/**
 * Exact two-sided p of the number of inversions in an order of n things, all n! orders alike: twice the smaller tail, at most 1. The
 * distribution is built by inserting one thing after the other, kept as shares so that nothing overflows.
 * Source: Kendall & Gibbons (1990) Rank Correlation Methods, 5th ed., section 5.3.
 */

export function inversionProbability(n: number, inversions: number): number {
  const most = (n * (n - 1)) / 2;
  let shares = new Float64Array(most + 1);
  shares[0] = 1;
  for (let size = 2; size <= n; size++) {
    const next = new Float64Array(most + 1);
    for (let k = 0; k <= (size * (size - 1)) / 2; k++) {
      let sum = 0;
      for (let j = Math.max(0, k - size + 1); j <= k; j++) sum += shares[j] as number;
      next[k] = sum / size;
    }
    shares = next;
  }
  // The distribution is symmetric, so the smaller tail is the one that starts at 0.
  const tail = Math.min(inversions, most - inversions);
  return Math.min(1, 2 * shares.subarray(0, tail + 1).reduce((sum, share) => sum + share, 0));
}
