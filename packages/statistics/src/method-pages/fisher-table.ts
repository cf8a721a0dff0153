import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const fisherTablePage: MethodPage = {
  slug: 'fisher-table',
  title: 'Exact test of a table of any size',
  question: 'tables',
  formula: [
    'p = Σ, over all tables with the observed margins, of the probabilities no larger than that of the observed one (relative slack 10^{−7})',
    'counted column by column; partial tables that are settled are counted whole',
    'too many tables: (1 + hits)/(B + 1) from B tables drawn with a seeded generator',
  ],
  whenUsed: 'Grade transitions of several cohorts, or any table with small expected counts.',
  smallN: 'An empty row or column is left out; with fewer than two left: “no comparison possible”. A simulated p names B and the seed.',
  source:
    'Freeman & Halton (1951) Biometrika 38:141-149; Mehta & Patel (1983) J Am Stat Assoc 78:427-434; Patefield (1981) Appl Stat 30:91-97.',
  computedBy: computations.counts,
};
