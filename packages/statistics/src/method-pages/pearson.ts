import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const pearsonPage: MethodPage = {
  slug: 'pearson',
  title: 'Pearson correlation',
  question: 'association',
  formula: [
    'r = Σ(x − x̄)(y − ȳ) / √(Σ(x − x̄)^2 Σ(y − ȳ)^2)',
    'interval tanh(atanh r ± z / √(n − 3))',
    't = r √((n − 2)/(1 − r^2)), n − 2 degrees of freedom',
  ],
  whenUsed: 'Two measurements that go together along a line.',
  smallN: 'Needs 4 pairs and both measures varying. Points exactly on a line: r without an interval.',
  source: 'Fisher (1921) Metron 1:3-32.',
  computedBy: computations.correlation,
};
