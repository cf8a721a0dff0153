export type { CountTable } from './contingency-table.ts';
export * from './chi-square-test.ts';
export { fisherTwoByTwo } from './fisher-two-by-two.ts';
export type { TwoByTwo } from './fisher-two-by-two.ts';
export * from './fisher-exact-table.ts';
export * from './cochran-armitage-trend.ts';
export * from './mantel-haenszel.ts';
