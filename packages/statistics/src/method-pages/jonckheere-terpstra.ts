import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const jonckheerePage: MethodPage = {
  slug: 'jonckheere-terpstra',
  title: 'Trend over ordered groups: Jonckheere-Terpstra test',
  question: 'several-groups',
  formula: [
    'J = pairs of values of two groups in which the later group has the larger, ties counted by half, over all pairs of groups',
    'normal, mean (N^2 − Σn^2)/4, variance corrected for ties, no continuity correction; two-sided',
  ],
  whenUsed: 'Does the outcome rise or fall over ordered classes of dose? Dose was not assigned at random.',
  smallN: 'Groups with fewer than five values are marked. Empty groups are left out and named.',
  source:
    'Jonckheere (1954) Biometrika 41:133-145; Terpstra (1952) Indag Math 14:327-333; Kendall & Gibbons (1990) Rank Correlation Methods.',
  computedBy: computations.ranks,
};
