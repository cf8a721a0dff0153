import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const friedmanPage: MethodPage = {
  slug: 'friedman',
  title: 'Repeated visits by ranks: Friedman test',
  question: 'change',
  formula: [
    'ranks within each person, R_j their sum at visit j',
    'χ^2 = 12 Σ(R_j − n(k + 1)/2)^2 / (nk(k + 1) − Σ(t^3 − t)/(k − 1)), k − 1 degrees of freedom',
    'Kendall’s W = χ^2 / (n(k − 1))',
  ],
  whenUsed: 'Three or more visits of the same people on an ordinal scale. Only people with every visit take part.',
  smallN: 'Marked “very small sample” below 5 people.',
  source: 'Friedman (1937) J Am Stat Assoc 32:675-701; Hollander & Wolfe (1973) chapter 7.',
  computedBy: computations.ranks,
};
