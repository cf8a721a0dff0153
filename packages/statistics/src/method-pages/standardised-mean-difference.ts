import type { MethodPage } from './method-page.ts';

export const standardisedMeanDifferencePage: MethodPage = {
  slug: 'standardised-mean-difference',
  title: 'Balance at baseline: standardised mean difference',
  formula:
    'Numbers: (m1 - m2)/sqrt((s1^2 + s2^2)/2). Yes/no: (p1 - p2)/sqrt((p1 q1 + p2 q2)/2). Classes: Mahalanobis distance of the shares, never negative.',
  whenUsed:
    'How alike two groups were at baseline, and how those with and without follow-up differ. No p-value: balance is a matter of this very sample. Beyond 0.10 flagged, beyond 0.25 marked as large.',
  smallN: 'Needs two values in each group (numbers) or one person in each (classes), and some overlap.',
  source: 'Austin (2009) Stat Med 28:3083-3107; Yang & Dalton (2012) SAS Global Forum paper 335.',
};
