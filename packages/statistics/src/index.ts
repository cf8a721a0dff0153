/** Estimates, intervals and tests for the registry. Every function is pure and answers with n, what was left out and the method used. */
export * from './result.ts';
export * from './samples.ts';
export * from './root.ts';
export * from './distributions/index.ts';
export * from './description/quantile.ts';
export * from './multiplicity/adjusted-p-values.ts';
export * from './means/one-sample.ts';
export * from './means/paired-change.ts';
export * from './means/welch.ts';
export * from './method-pages/index.ts';
export * from './proportions/index.ts';
export * from './tables/index.ts';
export * from './paired-categories/index.ts';
export * from './association/index.ts';
export * from './models/index.ts';
export * from './resampling/index.ts';
export type { Label } from './complete-rows.ts';
