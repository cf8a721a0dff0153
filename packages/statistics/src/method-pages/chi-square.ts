import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const chiSquarePage: MethodPage = {
  slug: 'chi-square',
  title: 'Chi-square test of a table',
  question: 'tables',
  formula: [
    'χ^2 = Σ((observed − expected)^2 / expected), expected = row total × column total / N',
    '(r − 1)(c − 1) degrees of freedom, no continuity correction',
    'Cramér’s V = √(χ^2 / (N(min(r, c) − 1)))',
  ],
  whenUsed: 'Association of two classifications when all expected counts are 5 or more.',
  smallN: 'Empty rows and columns are left out. With an expected count below 5 the answer says that the exact test is the one to report.',
  source: 'Agresti (2002) Categorical Data Analysis, 2nd ed., section 3.2.',
  computedBy: computations.counts,
};
