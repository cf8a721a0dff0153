import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const dunnPage: MethodPage = {
  slug: 'dunn',
  title: 'All pairs by ranks: Dunn',
  question: 'several-groups',
  formula: [
    'z = (R̄_i − R̄_j) / √((N(N + 1)/12 − Σ(t^3 − t)/(12(N − 1)))(1/n_i + 1/n_j))',
    'two-sided normal p, adjusted by the method of Holm',
  ],
  whenUsed: 'Pairs after a Kruskal-Wallis test.',
  smallN: 'As the Kruskal-Wallis test.',
  source: 'Dunn (1964) Technometrics 6:241-252.',
  computedBy: computations.ranks,
};
