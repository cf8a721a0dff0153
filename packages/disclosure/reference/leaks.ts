/**
 * Figures that look harmless and give a count or a value back. Source, unless named: arithmetic, from the definition in each heading;
 * `feasible` by trying every count.
 */

/** A printed percentage of n people: which counts it can stand for. */
export const percentages = [
  { n: 37, percent: 8.1, decimals: 1, feasible: [3] },
  { n: 37, percent: 8, decimals: 0, feasible: [3] },
  { n: 212, percent: 2.4, decimals: 1, feasible: [5] },
  { n: 212, percent: 2, decimals: 0, feasible: [4, 5] },
  { n: 15, percent: 33.3, decimals: 1, feasible: [5] },
  { n: 1040, percent: 0.7, decimals: 1, feasible: [7] },
  { n: 1040, percent: 1, decimals: 0, feasible: [6, 7, 8, 9, 10, 11, 12, 13, 14, 15] },
];

/** Two refreshes of a group, one person apart: n·mean(n) - (n-1)·mean(n-1), to within (2n-1) half units of the last place. */
export const meansOnePersonApart = [
  { nAfter: 12, meanBefore: 0.43, meanAfter: 0.47, decimals: 2, value: 0.91, low: 0.795, high: 1.025 },
  { nAfter: 12, meanBefore: 0.431, meanAfter: 0.474, decimals: 3, value: 0.947, low: 0.9355, high: 0.9585 },
  { nAfter: 40, meanBefore: 0.44, meanAfter: 0.45, decimals: 2, value: 0.84, low: 0.445, high: 1.235 },
];

/** All sites against all but one: both tables are safe, the difference is not (constructed). */
export const allSites = {
  counts: [
    [40, 25, 31],
    [52, 33, 28],
  ],
};
export const withoutOneSite = {
  counts: [
    [35, 22, 30],
    [47, 29, 26],
  ],
};

/** Fewest people for five beyond a quantile on its nearer side. */
export const fewestForQuantile = [
  { p: 0.25, n: 20 },
  { p: 0.75, n: 20 },
  { p: 0.1, n: 50 },
  { p: 0.9, n: 50 },
  { p: 0.05, n: 100 },
  { p: 0.95, n: 100 },
];

/**
 * Type 7 quantiles: how many people lie strictly below the quantile's position and how many at or above the next one. With n = 11 and
 * p = 0.5, among others, the quantile is one person's own value.
 */
export const peopleBesideQuantile = [
  { n: 11, p: 0.5, below: 5, above: 5 },
  { n: 12, p: 0.5, below: 6, above: 6 },
  { n: 21, p: 0.25, below: 5, above: 15 },
  { n: 20, p: 0.25, below: 5, above: 15 },
  { n: 21, p: 0.05, below: 1, above: 19 },
  { n: 41, p: 0.05, below: 2, above: 38 },
  { n: 101, p: 0.05, below: 5, above: 95 },
  { n: 101, p: 0.95, below: 95, above: 5 },
];

/** Mean and SD of two people are the mean less and plus SD over the root of 2. */
export const twoPeople = { mean: 0.4, sd: 0.0848528137423857, values: [0.34, 0.46] };

/** Dominance. Source of the definitions and of 300/20/10: Handbook on Statistical Disclosure Control (sdcTools), chapter 4; others worked by hand. */
export const shares = [
  { contributions: [300, 20, 10], n: 1, k: 85, share: 0.909090909091, unsafe: true },
  { contributions: [120, 90, 60, 30], n: 2, k: 80, share: 0.7, unsafe: false },
  { contributions: [180, 15, 9, 6], n: 1, k: 75, share: 0.857142857143, unsafe: true },
];
export const estimates = [
  { contributions: [300, 20, 10], p: 10, remainder: 10, limit: 30, unsafe: true },
  { contributions: [120, 90, 60, 30], p: 25, remainder: 90, limit: 30, unsafe: false },
  { contributions: [180, 15, 9, 6], p: 10, remainder: 15, limit: 18, unsafe: true },
];

/** Rounding to the nearest 5: a printed figure stands for two below to two above. */
export const roundedToFive = [
  { count: 0, printed: 0 },
  { count: 1, printed: 0 },
  { count: 2, printed: 0 },
  { count: 3, printed: 5 },
  { count: 7, printed: 5 },
  { count: 8, printed: 10 },
  { count: 12, printed: 10 },
  { count: 13, printed: 15 },
  { count: 98, printed: 100 },
];

/** A row rounded cell by cell adds up to 50, its true total of 47 rounds to 45. */
export const roundedRow = { counts: [13, 8, 4, 22], printed: [15, 10, 5, 20], total: 47, printedTotal: 45 };
