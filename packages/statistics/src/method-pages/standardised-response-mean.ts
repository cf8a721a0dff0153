import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const standardisedResponseMeanPage: MethodPage = {
  slug: 'standardised-response-mean',
  title: 'Standardised change: SRM',
  question: 'change',
  formula: [
    'SRM (d_z) = d̄ / s_d',
    'interval: the noncentralities δ with P(T ≤ t; n − 1, δ) = 0.975 and 0.025, divided by √n',
    'g_z = J(n − 1) d_z, J as for Hedges g',
    'baseline effect size = d̄ / SD at baseline',
  ],
  whenUsed:
    'How large a change is, in units of its spread. The SRM grows with the correlation of the two visits and must not be compared with the baseline effect size.',
  smallN: 'Needs two complete pairs with different changes; gz from three on.',
  source: 'Liang, Fossel & Larson (1990) Med Care 28:632-642; Kazis, Anderson & Meenan (1989) Med Care 27:S178-S189.',
  computedBy: computations.means,
};
