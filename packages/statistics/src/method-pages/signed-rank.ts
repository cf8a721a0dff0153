import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const signedRankPage: MethodPage = {
  slug: 'signed-rank',
  title: 'Wilcoxon signed rank test with Hodges-Lehmann estimate',
  question: 'change',
  formula: [
    'V = sum of the midranks of |d| with d > 0; differences of 0 are dropped',
    'p = 2 min(P(V ≤ v), P(V ≥ v)) over all 2^n sign patterns, up to n = 200, also with ties',
    'beyond: normal, mean n(n + 1)/4, variance n(n + 1)(2n + 1)/24 − Σ(t^3 − t)/48, continuity correction 1/2',
    'estimate: median of the n(n + 1)/2 averages of two differences (Walsh averages), zeroes kept',
    'interval: their k-th smallest and k-th largest',
  ],
  whenUsed: 'Change within the same people on an ordinal scale, or with n < 15 and |G1| > 1.',
  smallN:
    'One non-zero difference is enough; p below 0.05 is impossible below 6. The smallest possible p (2 in 2ⁿ) and the level the interval really reaches are given. No difference at all: no test.',
  source:
    'Wilcoxon (1945) Biometrics Bull 1:80-83; Hodges & Lehmann (1963) Ann Math Stat 34:598-611; Hollander & Wolfe (1973) chapter 3; Streitberg & Roehmel (1986) Stat Softw Newsl 12:10-17.',
  computedBy: computations.ranks,
};
