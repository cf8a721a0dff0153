import type { MethodPage } from './method-page.ts';

export const pearsonPage: MethodPage = {
  slug: 'pearson',
  title: 'Pearson correlation',
  formula:
    'r = sum (x - mean x)(y - mean y) / sqrt(sum (x - mean x)^2 sum (y - mean y)^2). Interval: tanh(atanh r -/+ z / sqrt(n - 3)). Test: t = r sqrt((n - 2)/(1 - r^2)), n - 2 degrees of freedom.',
  whenUsed: 'Two measurements that go together along a line.',
  smallN: 'Needs 4 pairs and both measures varying. Points exactly on a line: r without an interval.',
  source: 'Fisher (1921) Metron 1:3-32.',
};
