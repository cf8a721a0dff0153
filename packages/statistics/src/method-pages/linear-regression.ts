import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const linearRegressionPage: MethodPage = {
  slug: 'linear-regression',
  title: 'Linear regression',
  question: 'models',
  formula: [
    'b minimises Σ(y − Xb)^2, by Householder QR on centred columns',
    's^2 = residual sum of squares / (n − coefficients)',
    'SE(b_j) = s √((X′X)^{−1}_jj); t intervals and tests',
    'mean at x_0: SE = s √(x_0′(X′X)^{−1}x_0); for one further person s √(1 + x_0′(X′X)^{−1}x_0)',
  ],
  whenUsed: 'A continuous outcome on dose, baseline, level and grade. Dose was not assigned at random.',
  smallN:
    'Computed from 1 residual degree of freedom on; p from 10 participants per predictor on. A predictor that does not vary, or that the others determine, is named instead of dropped.',
  source: 'Seber & Lee (2003) Linear Regression Analysis, 2nd ed.',
  computedBy: computations.regression,
};
