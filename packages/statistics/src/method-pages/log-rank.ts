import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const logRankPage: MethodPage = {
  slug: 'log-rank',
  title: 'Log-rank test',
  question: 'time',
  formula: [
    'O − E of each group, E = Σ d r_g / r over the event times, with hypergeometric covariance',
    'chi-square with one degree of freedom less than groups',
  ],
  whenUsed: 'Time to an event compared between groups.',
  smallN: 'Needs an event while two groups are at risk, else counts. Fewer than 5 expected events in a group is marked.',
  source: 'Mantel (1966) Cancer Chemother Rep 50:163-170.',
  computedBy: computations.absent,
};
