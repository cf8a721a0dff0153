import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const welchAnovaPage: MethodPage = {
  slug: 'welch-anova',
  title: 'Three or more groups: Welch analysis of variance',
  question: 'several-groups',
  formula: [
    'w = n/s^2 of each group, W = Σw, m = Σw x̄ / W',
    'A = Σw(x̄ − m)^2 / (k − 1), L = Σ((1 − w/W)^2 / (n − 1))',
    'F = A / (1 + 2(k − 2)L / (k^2 − 1)), degrees of freedom k − 1 and (k^2 − 1)/(3L)',
  ],
  whenUsed: 'The means of three or more groups; equal variances are not assumed.',
  smallN: 'A group with fewer than two values, or without variance, is left out and named.',
  source: 'Welch (1951) Biometrika 38:330-336.',
  computedBy: computations.means,
};
