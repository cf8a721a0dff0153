import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const meanWithIntervalPage: MethodPage = {
  slug: 'mean-with-interval',
  title: 'Mean with t interval',
  question: 'describe',
  formula: ['x̄ ± t(0.975, n − 1) s / √n'],
  whenUsed: 'The mean of one group, with how far it may be off.',
  smallN:
    'Needs two values that differ. n = 1: the mean alone; all values equal: the mean alone, no interval. Marked “very small sample” below 5.',
  source: 'Student (1908) Biometrika 6:1-25.',
  computedBy: computations.means,
};
