import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const ancovaPage: MethodPage = {
  slug: 'ancova',
  title: 'Analysis of covariance',
  question: 'models',
  formula: [
    'follow-up = a + b × baseline + group',
    'adjusted mean of a group: the model at the overall mean baseline, SE = s √(L′(X′X)^{−1}L)',
    'groups: F from the sum of squares that they add after baseline',
    'pairs: t, adjusted by Holm and by the studentised range',
    'slopes: F of baseline × group',
  ],
  whenUsed: 'Groups compared on follow-up, allowing for baseline; preferred to comparing raw change.',
  smallN:
    'p from 10 participants per predictor on. Where the slopes differ (p < 0.05) the means are given at the quartiles of baseline as well.',
  source: 'Milliken & Johnson (2002) Analysis of Messy Data III; Holm (1979) Scand J Stat 6:65-70; Kramer (1956) Biometrics 12:307-310.',
  computedBy: computations.regression,
};
