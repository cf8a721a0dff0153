import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const fisherTwoByTwoPage: MethodPage = {
  slug: 'fisher-two-by-two',
  title: 'Fisher’s exact test of a 2 × 2 table',
  question: 'tables',
  formula: [
    'with all margins given, the upper left count is hypergeometric',
    'p = Σ of the probabilities of the tables no more probable than the observed one (relative slack 10^{−7})',
    'odds ratio: the value at which the mean of the noncentral hypergeometric distribution equals the observed count',
    'limits: the values at which a tail is 0.025',
  ],
  whenUsed: 'Two groups, two outcomes, any size.',
  smallN: 'An empty row or column: “no comparison possible”. With an empty cell the odds ratio is bounded on one side only.',
  source: 'Fisher (1935) J R Stat Soc 98:39-82; Agresti (2002), sections 3.5.1 and 3.6.1.',
  computedBy: computations.counts,
};
