import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const mantelHaenszelPage: MethodPage = {
  slug: 'mantel-haenszel',
  title: 'Common odds ratio over strata',
  question: 'tables',
  formula: [
    'odds ratio = Σ(ad/n) / Σ(bc/n) over the strata',
    'interval by the Robins-Breslow-Greenland variance of its logarithm',
    'χ^2 = (Σ(a − E a))^2 / Σ var a, 1 degree of freedom, no continuity correction',
  ],
  whenUsed: 'Two groups and two outcomes, allowing for a third classification such as site or level of injury.',
  smallN: 'A stratum with an empty margin is passed over. Where a diagonal is empty in every stratum there is no estimate.',
  source: 'Mantel & Haenszel (1959) J Natl Cancer Inst 22:719-748; Robins, Breslow & Greenland (1986) Biometrics 42:311-323.',
  computedBy: computations.counts,
};
