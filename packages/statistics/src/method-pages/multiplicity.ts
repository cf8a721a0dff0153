import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const multiplicityPage: MethodPage = {
  slug: 'multiplicity',
  title: 'Many comparisons: Holm, Benjamini-Hochberg, Bonferroni',
  question: 'every-figure',
  formula: [
    'Holm: p in ascending order; running maximum of (m − i + 1)p_i, at most 1',
    'Benjamini-Hochberg: running minimum, from the largest down, of m p_i / i',
    'Bonferroni: m p, at most 1',
  ],
  whenUsed:
    'Holm for families of subgroups and for pairs; Benjamini-Hochberg, named “false discovery rate”, for screens of more than 20 tests. The number of comparisons is printed.',
  smallN: 'A comparison that could not be made does not count.',
  source: 'Holm (1979) Scand J Stat 6:65-70; Benjamini & Hochberg (1995) J R Stat Soc B 57:289-300.',
  computedBy: computations.absent,
};
