import type { MethodPage } from './method-page.ts';

export const linearRegressionPage: MethodPage = {
  slug: 'linear-regression',
  title: 'Linear regression',
  formula:
    "b minimises sum (y - X b)^2, by Householder QR on centred columns. s^2 = residual sum of squares / (n - coefficients); SE(b_j) = s sqrt((X'X)^-1_jj); t intervals and tests. Mean at x0: SE = s sqrt(x0'(X'X)^-1 x0), for one further person s sqrt(1 + that).",
  whenUsed: 'A continuous outcome on dose, baseline, level and grade. Dose was not assigned at random.',
  smallN:
    'Computed from 1 residual degree of freedom on; p from 10 participants per predictor on. A predictor that does not vary, or that the others determine, is named instead of dropped.',
  source: 'Seber & Lee (2003) Linear Regression Analysis, 2nd ed.',
};
