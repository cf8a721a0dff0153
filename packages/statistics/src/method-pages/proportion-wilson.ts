import type { MethodPage } from './method-page.ts';

export const proportionWilsonPage: MethodPage = {
  slug: 'proportion-wilson',
  title: 'Proportion with Wilson interval',
  formula:
    'p = x/n. Limits: (p + z^2/(2n) -/+ z sqrt(p(1 - p)/n + z^2/(4n^2))) / (1 + z^2/n), z = 1.959963984540054 for 95%. At x = 0 the lower limit is 0, at x = n the upper limit is 1.',
  whenUsed: 'Every share of people with an outcome: responders, grade conversions, adverse events.',
  smallN: 'Given from n = 1 on; marked "very small sample" below 5. Without anybody: "no data".',
  source: 'Wilson (1927) J Am Stat Assoc 22:209-212; Newcombe (1998) Stat Med 17:857-872, method 3.',
};
