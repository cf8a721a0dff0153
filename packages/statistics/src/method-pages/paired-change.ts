import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const pairedChangePage: MethodPage = {
  slug: 'paired-change',
  title: 'Change from baseline: paired t test',
  question: 'change',
  formula: [
    'd = follow-up − baseline, rounded to the resolution of the instrument',
    't = d̄ / (s_d / √n), n − 1 degrees of freedom, two-sided',
    'interval d̄ ± t(0.975, n − 1) s_d / √n',
  ],
  whenUsed: 'Change within the same people between two assessments. Pairs with a gap are left out and counted.',
  smallN:
    'Needs two complete pairs with different changes. All changes equal: that change alone, no t and no p (never p = 0). With n < 15 and |G1| > 1, or an ordinal scale, the signed rank test takes its place.',
  source: 'Student (1908) Biometrika 6:1-25.',
  computedBy: computations.means,
};
