/** Repeatable random numbers in [0, 1): linear congruential, constants of Numerical Recipes, 3rd edition, section 7.1. Not for statistics. */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** Median and longest of several runs, after one to warm up. */
export function timed(work: () => unknown, runs = 7): string {
  work();
  const times = Array.from({ length: runs }, () => {
    const start = performance.now();
    work();
    return performance.now() - start;
  }).sort((a, b) => a - b);
  return `median ${(times[runs >> 1] ?? 0).toFixed(1)} ms, longest ${(times[runs - 1] ?? 0).toFixed(1)} ms`;
}
