import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const proportionDifferencePage: MethodPage = {
  slug: 'proportion-difference',
  title: 'Difference of two proportions',
  question: 'shares',
  formula: [
    'd = p_1 − p_2; l and u are the Wilson limits of each share',
    'lower limit d − √((p_1 − l_1)^2 + (u_2 − p_2)^2)',
    'upper limit d + √((u_1 − p_1)^2 + (p_2 − l_2)^2)',
  ],
  whenUsed: 'Responders in two cohorts.',
  smallN: 'Both groups need at least one person, otherwise “no comparison possible”; marked when the smaller group is below 5.',
  source: 'Newcombe (1998) Stat Med 17:873-890, method 10.',
  computedBy: computations.counts,
};
