/**
 * Distribution functions, quantiles and masses. All are this package's own, held to values computed with mpmath
 * (`reference/distribution-values.json`). What the two packages at hand give, measured on the same values (correct digits, worst case):
 *
 * | function             | jstat 1.9.6                    | simple-statistics 7.12.1        | used here                        |
 * | -------------------- | ------------------------------ | ------------------------------- | -------------------------------- |
 * | normal               | none below -8.3                | printed table, 4 decimals       | own: Chebyshev fit of the tail   |
 * | normal quantile      | 2 for p < 1e-15                | 3                               | own: root on the log tail        |
 * | t, F, beta, binomial | 7 to 10, fails at df 1e7       | none                            | own: continued fraction          |
 * | chi-square           | upper tail as 1 - lower        | yes/no table                    | own: series, continued fraction  |
 * | noncentral t         | 9, wrong for large noncentrality | none                          | own: Gauss-Legendre              |
 * | studentised range    | 7 to 9, 5 at df 3, NaN at df 1 | none                            | own: Gauss-Legendre; jstat as second opinion in the tests |
 * | mean, type 7 quantile, ranks | (percentile is wrong)  | 15                              | simple-statistics                |
 *
 * Tails are given both ways and on the log scale, so no p-value is ever formed as 1 minus something near 1.
 */
export type { Tail, Tails } from './tails.ts';
export { logBeta, logGamma } from './log-gamma.ts';
export * from './normal.ts';
export * from './student-t.ts';
export * from './chi-square.ts';
export * from './f.ts';
export * from './beta.ts';
export * from './gamma.ts';
export { binomialLogMass, binomialMass, binomialQuantile, binomialTails } from './binomial.ts';
export * from './poisson.ts';
export * from './hypergeometric.ts';
export * from './noncentral-t.ts';
export * from './studentised-range.ts';
