import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const kruskalWallisPage: MethodPage = {
  slug: 'kruskal-wallis',
  title: 'Three or more groups by ranks: Kruskal-Wallis test',
  question: 'several-groups',
  formula: [
    'H = 12/(N(N + 1)) Σn_i(R̄_i − (N + 1)/2)^2 / (1 − Σ(t^3 − t)/(N^3 − N)), chi-square with k − 1 degrees of freedom',
    'ε^2 = H/(N − 1), η^2 = (H − k + 1)/(N − k)',
  ],
  whenUsed: 'Three or more groups on an ordinal scale, or skewed ones.',
  smallN: 'The chi-square approximation is marked where a group has fewer than five values. Empty groups are left out and named.',
  source: 'Kruskal & Wallis (1952) J Am Stat Assoc 47:583-621; Tomczak & Tomczak (2014) Trends Sport Sci 1:19-25.',
  computedBy: computations.ranks,
};
