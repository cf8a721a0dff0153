import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const oneSampleTPage: MethodPage = {
  slug: 'one-sample-t',
  title: 'One-sample t test',
  question: 'describe',
  formula: ['t = (x̄ − value) / (s / √n), n − 1 degrees of freedom, two-sided'],
  whenUsed: 'A group against a fixed value, such as a published norm.',
  smallN: 'As the mean with t interval: no t and no p for a single value or equal values.',
  source: 'Student (1908) Biometrika 6:1-25.',
  computedBy: computations.means,
};
