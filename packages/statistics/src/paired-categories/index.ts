export * from './mcnemar-test.ts';
export * from './bowker-symmetry.ts';
export * from './stuart-maxwell.ts';
export * from './weighted-kappa.ts';
export * from './transition-summary.ts';
