import type { MethodPage } from './method-page.ts';

export const standardisedResponseMeanPage: MethodPage = {
  slug: 'standardised-response-mean',
  title: 'Standardised change: SRM',
  formula:
    'SRM (dz) = mean change/SD of change, interval from the noncentral t with n - 1 degrees of freedom divided by sqrt n; gz = J(n - 1) dz. Baseline effect size = mean change/SD at baseline.',
  whenUsed:
    'How large a change is, in units of its spread. The SRM grows with the correlation of the two visits and must not be compared with the baseline effect size.',
  smallN: 'Needs two complete pairs with different changes; gz from three on.',
  source: 'Liang, Fossel & Larson (1990) Med Care 28:632-642; Kazis, Anderson & Meenan (1989) Med Care 27:S178-S189.',
};
