import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const funnelPage: MethodPage = {
  slug: 'funnel',
  title: 'Funnel plot of sites',
  question: 'sites',
  formula: [
    'proportion: r = smallest count with P(X ≤ r) ≥ p, limit = (r − (P(X ≤ r) − p)/P(X = r))/n, within 0 and 1, at p = 0.001, 0.025, 0.975, 0.999',
    'mean: T ± z SD/√n',
    'φ = mean of z^2; above 1 and from 10 sites on, the limits are widened by √φ',
  ],
  whenUsed:
    'A site against the registry’s value. Outside 99.8%: “differs from the registry value more than chance explains”, never worse, never ranked.',
  smallN: 'Limits exist from one person on. Fewer than 10 sites: the limits are not widened, and overdispersion is marked.',
  source: 'Spiegelhalter (2005) Stat Med 24:1185-1202.',
  computedBy: computations.absent,
};
