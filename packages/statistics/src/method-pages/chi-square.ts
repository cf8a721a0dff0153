import type { MethodPage } from './method-page.ts';

export const chiSquarePage: MethodPage = {
  slug: 'chi-square',
  title: 'Chi-square test of a table',
  formula:
    "X2 = sum (observed - expected)^2 / expected with expected = row total x column total / N, (r - 1)(c - 1) degrees of freedom, no continuity correction. Cramer's V = sqrt(X2 / (N (min(r, c) - 1))).",
  whenUsed: 'Association of two classifications when all expected counts are 5 or more.',
  smallN: 'Empty rows and columns are left out. With an expected count below 5 the answer says that the exact test is the one to report.',
  source: 'Agresti (2002) Categorical Data Analysis, 2nd ed., section 3.2.',
};
