import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const welchPage: MethodPage = {
  slug: 'welch',
  title: 'Two groups: Welch t test',
  question: 'two-groups',
  formula: [
    't = (x̄_1 − x̄_2) / √(a + b), a = s_1^2 / n_1, b = s_2^2 / n_2',
    'degrees of freedom (a + b)^2 / (a^2/(n_1 − 1) + b^2/(n_2 − 1)), not rounded; two-sided',
  ],
  whenUsed: 'The means of two independent groups; equal variances are not assumed.',
  smallN: 'Needs two values in each group and some variance in one. Otherwise the difference alone, without interval and p.',
  source: 'Welch (1947) Biometrika 34:28-35; Satterthwaite (1946) Biometrics Bull 2:110-114.',
  computedBy: computations.means,
};
