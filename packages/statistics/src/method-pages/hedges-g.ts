import type { MethodPage } from './method-page.ts';

export const hedgesGPage: MethodPage = {
  slug: 'hedges-g',
  title: 'Standardised difference of two groups: Hedges g',
  formula:
    'd = (m1 - m2)/pooled SD; g = J d, J(v) = Gamma(v/2)/(sqrt(v/2) Gamma((v - 1)/2)), v = n1 + n2 - 2. Interval: the noncentralities with P(T <= t) = 0.975 and 0.025, times sqrt(1/n1 + 1/n2) and J.',
  whenUsed: 'How large a difference is, in units of the spread. The number is printed without words such as "large".',
  smallN: 'Needs four values in all and some variance. Marked "very small sample" where a group has fewer than five.',
  source: 'Hedges (1981) J Educ Stat 6:107-128; Steiger & Fouladi (1997) in What If There Were No Significance Tests?',
};
