import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const tukeyKramerPage: MethodPage = {
  slug: 'tukey-kramer',
  title: 'All pairs of means: Tukey-Kramer',
  question: 'several-groups',
  formula: [
    'q = |x̄_i − x̄_j| / √((MSW/2)(1/n_i + 1/n_j))',
    'p = P(studentised range of k means with N − k degrees of freedom > q)',
    'interval x̄_i − x̄_j ± q(0.95, k, N − k) √((MSW/2)(1/n_i + 1/n_j))',
  ],
  whenUsed: 'Pairs after an analysis of variance; the level holds for all pairs together.',
  smallN: 'Needs two residual degrees of freedom; a group with fewer than two values is left out and named.',
  source: 'Tukey (1953); Kramer (1956) Biometrics 12:307-310; Hayter (1984) Ann Stat 12:61-75.',
  computedBy: computations.studentisedRange,
};
