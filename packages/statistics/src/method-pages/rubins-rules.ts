import type { MethodPage } from './method-page.ts';

export const rubinsRulesPage: MethodPage = {
  slug: 'rubins-rules',
  title: "Rubin's rules",
  formula:
    'T = mean of the variances + (1 + 1/m) variance of the estimates. Degrees of freedom of Barnard and Rubin: 1/df = 1/((m - 1)/lambda^2) + 1/((v + 1)/(v + 3) v (1 - lambda)), lambda = (1 + 1/m) B/T, v the degrees of freedom of the complete data.',
  whenUsed: 'Checking the results of an analyst who filled the gaps of an export several times. The registry itself fills no gaps.',
  smallN: 'Needs 2 analyses; fewer than 5 is marked.',
  source: 'Rubin (1987) Multiple Imputation for Nonresponse in Surveys; Barnard & Rubin (1999) Biometrika 86:948-955.',
};
