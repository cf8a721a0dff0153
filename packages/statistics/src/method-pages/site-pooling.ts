import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const sitePoolingPage: MethodPage = {
  slug: 'site-pooling',
  title: 'Pooling the sites',
  question: 'sites',
  formula: [
    'w = 1/SE^2, Q = Σw(y − ȳ)^2, ȳ the mean weighted by w',
    'τ^2 = max(0, (Q − (k − 1)) / (Σw − Σw^2/Σw)); weights of the pooled figure u = 1/(SE^2 + τ^2)',
    'Hartung-Knapp: SE(pooled)^2 = Σu(y − pooled)^2 / ((k − 1) Σu), t with k − 1 degrees of freedom',
    'I^2 = max(0, (Q − (k − 1))/Q)',
    'prediction interval: pooled ± t(0.975, k − 2) √(τ^2 + SE(pooled)^2)',
  ],
  whenUsed: 'One figure from estimates of sites that may differ in truth.',
  smallN: 'Fewer than 3 sites are not pooled: list them, or show the total. Fewer than 5 is marked.',
  source:
    'DerSimonian & Laird (1986) Control Clin Trials 7:177-188; Hartung & Knapp (2001) Stat Med 20:3875-3889; Higgins, Thompson & Spiegelhalter (2009) J R Stat Soc A 172:137-159.',
  computedBy: computations.absent,
};
