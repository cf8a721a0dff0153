import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const hedgesGPage: MethodPage = {
  slug: 'hedges-g',
  title: 'Standardised difference of two groups: Hedges g',
  question: 'two-groups',
  formula: [
    'd = (x̄_1 − x̄_2) / s, s the pooled SD',
    'g = J(v)d, J(v) = Γ(v/2) / (√(v/2) Γ((v − 1)/2)), v = n_1 + n_2 − 2',
    'interval: the noncentralities δ with P(T ≤ t; v, δ) = 0.975 and 0.025, times √(1/n_1 + 1/n_2) and J(v)',
  ],
  whenUsed: 'How large a difference is, in units of the spread. The number is printed without words such as “large”.',
  smallN: 'Needs four values in all and some variance. Marked “very small sample” where a group has fewer than five.',
  source: 'Hedges (1981) J Educ Stat 6:107-128; Steiger & Fouladi (1997) in What If There Were No Significance Tests?',
  computedBy: computations.means,
};
