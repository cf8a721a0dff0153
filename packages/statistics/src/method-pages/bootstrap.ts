import type { MethodPage } from './method-page.ts';

export const bootstrapPage: MethodPage = {
  slug: 'bootstrap',
  title: 'Bootstrap percentile interval',
  formula:
    'B resamples of participants with return; limits are the (B + 1) 0.025-th and (B + 1) 0.975-th smallest values. B = 1999 or 9999; generator xoshiro128** from a seed that is printed.',
  whenUsed: 'An interval for a statistic without a formula, such as the median of a change.',
  smallN: 'Needs 2 participants; below 20 the interval is likely too narrow, which is marked.',
  source:
    'Davison & Hinkley (1997) Bootstrap Methods and their Application, section 5.3.1; Blackman & Vigna (2021) ACM Trans Math Softw 47(4):36.',
};
