import type { MethodPage } from './method-page.ts';

export const proportionDifferencePage: MethodPage = {
  slug: 'proportion-difference',
  title: 'Difference of two proportions',
  formula:
    'd = p1 - p2. Lower limit: d - sqrt((p1 - l1)^2 + (u2 - p2)^2); upper limit: d + sqrt((u1 - p1)^2 + (p2 - l2)^2), with l and u the Wilson limits of each share.',
  whenUsed: 'Responders in two cohorts.',
  smallN: 'Both groups need at least one person, otherwise "no comparison possible"; marked when the smaller group is below 5.',
  source: 'Newcombe (1998) Stat Med 17:873-890, method 10.',
};
