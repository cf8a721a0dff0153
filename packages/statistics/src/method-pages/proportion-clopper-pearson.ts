import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const proportionClopperPearsonPage: MethodPage = {
  slug: 'proportion-clopper-pearson',
  title: 'Proportion with exact interval',
  question: 'shares',
  formula: ['lower limit: beta quantile (0.025; x, n − x + 1), 0 at x = 0', 'upper limit: beta quantile (0.975; x + 1, n − x), 1 at x = n'],
  whenUsed: 'Where an interval is asked for that holds its level whatever the true share is; it is wider than Wilson’s.',
  smallN: 'As for the Wilson interval.',
  source: 'Clopper & Pearson (1934) Biometrika 26:404-413.',
  computedBy: computations.counts,
};
