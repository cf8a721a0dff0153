import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const kendallPage: MethodPage = {
  slug: 'kendall',
  title: 'Kendall’s tau-b',
  question: 'association',
  formula: [
    'τ_b = (concordant − discordant) / √((pairs − ties in x)(pairs − ties in y))',
    'interval tanh(atanh τ_b ± z √(0.437/(n − 4)))',
    'p: exact for n < 50 without ties, else normal with the variance corrected for ties, no continuity correction',
  ],
  whenUsed: 'Pairs of ordinal scales with many ties.',
  smallN: 'Needs 5 pairs for an interval and both measures varying.',
  source: 'Kendall & Gibbons (1990) Rank Correlation Methods, 5th ed.; Fieller, Hartley & Pearson (1957) Biometrika 44:470-481.',
  computedBy: computations.absent,
};
