import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const cochranArmitagePage: MethodPage = {
  slug: 'cochran-armitage',
  title: 'Trend of a proportion over ordered groups',
  question: 'tables',
  formula: [
    'χ^2 = (Σ(x_i − n_i p)(s_i − s̄))^2 / (p(1 − p) Σn_i(s_i − s̄)^2), 1 degree of freedom, no continuity correction',
    'p the share of all, s_i the scores 1, 2, 3, …, s̄ their mean weighted by n_i',
  ],
  whenUsed: 'Responders by ordered dose classes or grades.',
  smallN: 'Needs people with and without the event and at least two groups; fewer than 5 of either is marked.',
  source: 'Armitage (1955) Biometrics 11:375-386.',
  computedBy: computations.counts,
};
