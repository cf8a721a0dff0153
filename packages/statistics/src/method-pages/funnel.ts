import type { MethodPage } from './method-page.ts';

export const funnelPage: MethodPage = {
  slug: 'funnel',
  title: 'Funnel plot of sites',
  formula:
    'Proportion: r = smallest count with P(X <= r) >= p, limit = (r - (P(X <= r) - p)/P(X = r))/n clipped to 0 and 1, p = 0.001, 0.025, 0.975, 0.999. Mean: T -/+ z SD/sqrt n. Overdispersion phi = mean z^2; above 1 and from 10 sites on the limits are widened by sqrt phi.',
  whenUsed: `A site against the registry's value. Outside 99.8%: "differs from the registry value more than chance explains", never worse, never ranked.`,
  smallN: 'Limits exist from one person on. Fewer than 10 sites: the limits are not widened, and overdispersion is marked.',
  source: 'Spiegelhalter (2005) Stat Med 24:1185-1202.',
};
