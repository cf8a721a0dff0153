import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const standardisedMeanDifferencePage: MethodPage = {
  slug: 'standardised-mean-difference',
  title: 'Balance at baseline: standardised mean difference',
  question: 'two-groups',
  formula: [
    'numbers: (x̄_1 − x̄_2) / √((s_1^2 + s_2^2)/2)',
    'yes/no: (p_1 − p_2) / √((p_1(1 − p_1) + p_2(1 − p_2))/2)',
    'classes: Mahalanobis distance of the shares, never negative',
    'three or more groups: the pair that differs most',
  ],
  whenUsed:
    'How alike two groups were at baseline, and how those with and without follow-up differ. No p-value: balance is a matter of this very sample. Beyond 0.10 flagged, beyond 0.25 marked as large.',
  smallN: 'Needs two values in each group (numbers) or one person in each (classes), and some overlap.',
  source: 'Austin (2009) Stat Med 28:3083-3107; Yang & Dalton (2012) SAS Global Forum paper 335.',
  computedBy: computations.means,
};
