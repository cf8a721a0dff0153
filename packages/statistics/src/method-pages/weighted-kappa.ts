import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const weightedKappaPage: MethodPage = {
  slug: 'weighted-kappa',
  title: 'Weighted kappa',
  question: 'measurement',
  formula: [
    'κ = (Σw p_ij − Σw p_{i+} p_{+j}) / (1 − Σw p_{i+} p_{+j})',
    'w = 1 − ((i − j)/(k − 1))^2 (quadratic; linear and unweighted can be asked for)',
    'standard errors of Fleiss, Cohen and Everitt; the test uses the one without agreement',
  ],
  whenUsed: 'Agreement of two classifications in ordered categories, such as a clinic’s own grade and the computed one.',
  smallN: 'Everybody in one category: no figure. Marked below n = 30, where the standard error is rough.',
  source: 'Cohen (1968) Psychol Bull 70:213-220; Fleiss, Cohen & Everitt (1969) Psychol Bull 72:323-327.',
  computedBy: computations.absent,
};
