import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const spearmanPage: MethodPage = {
  slug: 'spearman',
  title: 'Spearman rank correlation',
  question: 'association',
  formula: [
    'ρ = Pearson correlation of the midranks',
    'interval tanh(atanh ρ ± z √((1 + ρ^2/2)/(n − 3)))',
    'p: exact over all orders for n < 10 without ties, else by t with n − 2 degrees of freedom',
  ],
  whenUsed: 'Dose and response, ordinal scales.',
  smallN: 'Needs 4 pairs and both measures varying. Exactly the same order: rho without an interval.',
  source: 'Bonett & Wright (2000) Psychometrika 65:23-28; Kendall & Gibbons (1990) Rank Correlation Methods.',
  computedBy: computations.correlation,
};
