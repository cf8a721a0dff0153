import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const intraclassCorrelationPage: MethodPage = {
  slug: 'intraclass-correlation',
  title: 'Intraclass correlation of sites',
  question: 'sites',
  formula: [
    'one-way analysis of variance of the sites: MSB between, MSW within',
    'ICC = v/(v + MSW), v = max(0, (MSB − MSW)/n_0), n_0 = (N − Σn^2/N)/(k − 1)',
  ],
  whenUsed: 'How much of all variation lies between sites.',
  smallN: 'Needs 5 sites, some with more than one person. 0 is a result: “no variation between sites detected”.',
  source: 'Donner (1986) Int Stat Rev 54:67-82.',
  computedBy: computations.absent,
};
