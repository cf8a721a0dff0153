/** Repeatable random numbers in [0, 1): linear congruential, constants of Numerical Recipes, 3rd edition, section 7.1. Not for statistics. */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** Milliseconds of several runs, ascending, after one to warm up. */
function timesOf(work: () => unknown, runs: number): number[] {
  work();
  return Array.from({ length: runs }, () => {
    const start = performance.now();
    work();
    return performance.now() - start;
  }).sort((a, b) => a - b);
}

export const medianTime = (work: () => unknown, runs = 7): number => timesOf(work, runs)[runs >> 1] ?? 0;

/** Median and longest of several runs. */
export function timed(work: () => unknown, runs = 7): string {
  const times = timesOf(work, runs);
  return `median ${(times[runs >> 1] ?? 0).toFixed(1)} ms, longest ${(times[runs - 1] ?? 0).toFixed(1)} ms`;
}

/** Counts with a long tail, as injury levels by grade have. */
export const countsWithALongTail = (random: () => number, rows: number, columns: number, mean: number) => ({
  counts: Array.from({ length: rows }, () => Array.from({ length: columns }, () => Math.floor(-mean * Math.log(1 - random() * 0.9999)))),
});
