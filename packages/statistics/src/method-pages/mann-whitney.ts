import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const mannWhitneyPage: MethodPage = {
  slug: 'mann-whitney',
  title: 'Mann-Whitney test with Hodges-Lehmann shift',
  question: 'two-groups',
  formula: [
    'U = rank sum of the first group − m(m + 1)/2',
    'p = 2 min(P(U ≤ u), P(U ≥ u)) over all ways to form the groups, up to m + n = 100, also with ties',
    'beyond: normal, mean mn/2, variance (mn/12)((N + 1) − Σ(t^3 − t)/(N(N − 1))), continuity correction 1/2',
    'shift: median of all x − y; interval: their k-th smallest and k-th largest',
    'probability of superiority U/(mn); rank-biserial correlation 2U/(mn) − 1',
  ],
  whenUsed: 'Two independent groups on an ordinal scale, or small and skewed ones.',
  smallN:
    'One value in each group is enough; p below 0.05 is impossible for 3 + 3, possible from 4 + 4 or 3 + 5. The smallest possible p and the level the interval really reaches are given.',
  source:
    'Mann & Whitney (1947) Ann Math Stat 18:50-60; Hollander & Wolfe (1973) chapter 4; Streitberg & Roehmel (1986) Stat Softw Newsl 12:10-17.',
  computedBy: computations.ranks,
};
