import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const bowkerPage: MethodPage = {
  slug: 'bowker',
  title: 'Bowker’s test of symmetry',
  question: 'grades',
  formula: ['χ^2 = Σ_{i<j} (n_ij − n_ji)^2 / (n_ij + n_ji)', 'pairs without movement are skipped and do not count as degrees of freedom'],
  whenUsed:
    'Whether movements between grades are as frequent in both directions. Where improvement is the rule its p says little: read the row percentages first.',
  smallN: 'Fewer than 10 movements between some pair of grades is marked.',
  source: 'Bowker (1948) J Am Stat Assoc 43:572-574.',
  computedBy: computations.absent,
};
