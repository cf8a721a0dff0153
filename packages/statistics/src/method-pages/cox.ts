import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const coxPage: MethodPage = {
  slug: 'cox',
  title: 'Hazard ratio',
  question: 'time',
  formula: [
    'h(t) = h_0(t) e^{Xb} by partial likelihood, tied events after Efron',
    'hazard ratio e^b, Wald interval e^{b ± z SE}; score and likelihood ratio tests',
  ],
  whenUsed: 'Only if asked for beside the curves and the log-rank test.',
  smallN: 'Fewer than 10 events per covariate is marked. A covariate that orders the events without exception has no estimate.',
  source: 'Cox (1972) J R Stat Soc B 34:187-220; Efron (1977) J Am Stat Assoc 72:557-565.',
  computedBy: computations.absent,
};
