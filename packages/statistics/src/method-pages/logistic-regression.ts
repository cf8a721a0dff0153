import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const logisticRegressionPage: MethodPage = {
  slug: 'logistic-regression',
  title: 'Logistic regression',
  question: 'models',
  formula: [
    'ln(p/(1 − p)) = Xb by maximum likelihood (Newton steps by QR)',
    'odds ratio e^b, Wald interval e^{b ± z SE}',
    'all predictors: likelihood ratio, chi-square',
    'area under the curve: chance that somebody with the event has the higher fitted probability',
  ],
  whenUsed: 'Responders adjusted for baseline and other predictors.',
  smallN:
    'Needs 10 people with and 10 without the event per predictor, else counts and Fisher’s test. Separation (steps that never settle) is reported, not hidden behind a huge odds ratio.',
  source: 'Agresti (2002) Categorical Data Analysis, sections 4.6 and 5.5; Albert & Anderson (1984) Biometrika 71:1-10.',
  computedBy: computations.absent,
};
