import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const rubinsRulesPage: MethodPage = {
  slug: 'rubins-rules',
  title: 'Rubin’s rules',
  question: 'every-figure',
  formula: [
    'T = Ū + (1 + 1/m)B, Ū the mean of the variances, B the variance of the estimates',
    '1/df = λ^2/(m − 1) + 1/((v + 1)/(v + 3) v(1 − λ)), λ = (1 + 1/m)B/T',
    'v the degrees of freedom of the complete data',
  ],
  whenUsed: 'Checking the results of an analyst who filled the gaps of an export several times. The registry itself fills no gaps.',
  smallN: 'Needs 2 analyses; fewer than 5 is marked.',
  source: 'Rubin (1987) Multiple Imputation for Nonresponse in Surveys; Barnard & Rubin (1999) Biometrika 86:948-955.',
  computedBy: computations.absent,
};
