import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const roundingPage: MethodPage = {
  slug: 'rounding',
  title: 'Rounding and wording',
  question: 'every-figure',
  formula: [
    'computed in full precision, rounded once for display: halves away from zero on the 15-digit decimal',
    'p: two decimals from 0.10 up, three below; p < 0.001 and p > 0.99 at the ends',
    'shares: “12 of 41 (29%)”, no decimals below n = 100, one from there on',
  ],
  whenUsed: 'Every figure on a screen, in a report or in an export.',
  smallN: 'A percent never stands without its count.',
  source: 'Lang & Altman (2013) SAMPL guidelines, in Science Editors’ Handbook.',
  computedBy: computations.rounding,
};
