import type { MethodPage } from './method-page.ts';

export const welchPage: MethodPage = {
  slug: 'welch',
  title: 'Two groups: Welch t test',
  formula:
    't = (m1 - m2)/sqrt(a + b), a = s1^2/n1, b = s2^2/n2; degrees of freedom (a + b)^2/(a^2/(n1 - 1) + b^2/(n2 - 1)), not rounded; two-sided.',
  whenUsed: 'The means of two independent groups; equal variances are not assumed.',
  smallN: 'Needs two values in each group and some variance in one. Otherwise the difference alone, without interval and p.',
  source: 'Welch (1947) Biometrika 34:28-35; Satterthwaite (1946) Biometrics Bull 2:110-114.',
};
