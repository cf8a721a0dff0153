import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const bootstrapPage: MethodPage = {
  slug: 'bootstrap',
  title: 'Bootstrap percentile interval',
  question: 'every-figure',
  formula: [
    'B resamples of participants with return, B = 1999 or 9999',
    'limits: the (B + 1) × 0.025-th and the (B + 1) × 0.975-th smallest value',
    'generator xoshiro128** from a seed that is printed',
  ],
  whenUsed: 'An interval for a statistic without a formula, such as the median of a change.',
  smallN: 'Needs 2 participants; below 20 the interval is likely too narrow, which is marked.',
  source:
    'Davison & Hinkley (1997) Bootstrap Methods and their Application, section 5.3.1; Blackman & Vigna (2021) ACM Trans Math Softw 47(4):36.',
  computedBy: computations.resampling,
};
