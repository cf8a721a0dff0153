import type { MethodPage } from './method-page.ts';

export const intraclassCorrelationPage: MethodPage = {
  slug: 'intraclass-correlation',
  title: 'Intraclass correlation of sites',
  formula: 'One-way analysis of variance: ICC = v/(v + MSW), v = max(0, (MSB - MSW)/n0), n0 = (N - sum n^2/N)/(k - 1).',
  whenUsed: 'How much of all variation lies between sites.',
  smallN: 'Needs 5 sites, some with more than one person. 0 is a result: "no variation between sites detected".',
  source: 'Donner (1986) Int Stat Rev 54:67-82.',
};
