import type { MethodPage } from './method-page.ts';

export const cochranArmitagePage: MethodPage = {
  slug: 'cochran-armitage',
  title: 'Trend of a proportion over ordered groups',
  formula:
    'X2 = (sum (x_i - n_i p) (s_i - s))^2 / (p (1 - p) sum n_i (s_i - s)^2), p the share of all, s_i the scores (1, 2, 3, ...), s their mean weighted by n_i; 1 degree of freedom, no continuity correction.',
  whenUsed: 'Responders by ordered dose classes or grades.',
  smallN: 'Needs people with and without the event and at least two groups; fewer than 5 of either is marked.',
  source: 'Armitage (1955) Biometrics 11:375-386.',
};
