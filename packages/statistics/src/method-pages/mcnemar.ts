import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const mcnemarPage: MethodPage = {
  slug: 'mcnemar',
  title: 'McNemar test',
  question: 'grades',
  formula: [
    'b and c: those who changed one way and the other',
    'p = min(1, 2 P(X ≤ min(b, c))), X binomial with b + c trials and probability 1/2',
    'beside it, for large numbers: χ^2 = (b − c)^2 / (b + c), 1 degree of freedom',
  ],
  whenUsed: 'A yes/no status of the same people before and after.',
  smallN: 'Nobody changed: “no comparison possible”.',
  source: 'McNemar (1947) Psychometrika 12:153-157.',
  computedBy: computations.counts,
};
