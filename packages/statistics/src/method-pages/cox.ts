import type { MethodPage } from './method-page.ts';

export const coxPage: MethodPage = {
  slug: 'cox',
  title: 'Hazard ratio',
  formula:
    'h(t) = h0(t) exp(X b) by partial likelihood, tied events after Efron. Hazard ratio exp(b), Wald interval exp(b -/+ z SE); score and likelihood ratio tests.',
  whenUsed: 'Only if asked for beside the curves and the log-rank test.',
  smallN: 'Fewer than 10 events per covariate is marked. A covariate that orders the events without exception has no estimate.',
  source: 'Cox (1972) J R Stat Soc B 34:187-220; Efron (1977) J Am Stat Assoc 72:557-565.',
};
