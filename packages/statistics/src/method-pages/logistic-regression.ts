import type { MethodPage } from './method-page.ts';

export const logisticRegressionPage: MethodPage = {
  slug: 'logistic-regression',
  title: 'Logistic regression',
  formula:
    'log(p/(1 - p)) = X b by maximum likelihood (Newton steps by QR). Odds ratio exp(b), Wald interval exp(b -/+ z SE). All predictors: likelihood ratio, chi-square. Area under the curve: chance that somebody with the event has the higher fitted probability.',
  whenUsed: 'Responders adjusted for baseline and other predictors.',
  smallN:
    "Needs 10 people with and 10 without the event per predictor, else counts and Fisher's test. Separation (steps that never settle) is reported, not hidden behind a huge odds ratio.",
  source: 'Agresti (2002) Categorical Data Analysis, sections 4.6 and 5.5; Albert & Anderson (1984) Biometrika 71:1-10.',
};
