import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const proportionWilsonPage: MethodPage = {
  slug: 'proportion-wilson',
  title: 'Proportion with Wilson interval',
  question: 'shares',
  formula: [
    'p = x/n, z = 1.959963984540054 for 95%',
    'limits (p + z^2/(2n) ± z √(p(1 − p)/n + z^2/(4n^2))) / (1 + z^2/n)',
    'lower limit 0 at x = 0, upper limit 1 at x = n',
    'with m results missing, beside it: x/(n + m) and (x + m)/(n + m), if none and if all of them had the event',
  ],
  whenUsed: 'Every share of people with an outcome: responders, grade conversions, adverse events.',
  smallN: 'Given from n = 1 on; marked “very small sample” below 5. Without anybody: “no data”.',
  source: 'Wilson (1927) J Am Stat Assoc 22:209-212; Newcombe (1998) Stat Med 17:857-872, method 3.',
  computedBy: computations.counts,
};
