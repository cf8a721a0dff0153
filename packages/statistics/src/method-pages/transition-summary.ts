import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const transitionSummaryPage: MethodPage = {
  slug: 'transition-summary',
  title: 'Grade transitions',
  question: 'grades',
  formula: [
    'of each baseline grade: counts and shares unchanged, improved (later grade), improved by two or more, worsened, with Wilson intervals',
    'net movement: exact sign test, p = min(1, 2 P(X ≤ min(up, down))), X binomial with up + down trials and probability 1/2',
  ],
  whenUsed: 'Conversion of AIS grades from baseline to follow-up.',
  smallN: 'A baseline grade without anybody: “no data”. Nobody moved: no sign test.',
  source: 'Agresti (2002) Categorical Data Analysis, section 10.4; Conover (1999) Practical Nonparametric Statistics, section 3.4.',
  computedBy: computations.counts,
};
