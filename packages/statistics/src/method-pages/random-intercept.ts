import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const randomInterceptPage: MethodPage = {
  slug: 'random-intercept',
  title: 'Random intercept model',
  question: 'models',
  formula: [
    'y = Xb + u + e by REML, u one value of each cluster',
    'λ = var u / var e maximises −½[(N − p) ln(2πs^2) + Σ ln(1 + nλ) + ln|X′V^{−1}X| + N − p], λ ≥ 0',
    'effect of a cluster = nλ/(1 + nλ) × its mean residual; ICC = λ/(1 + λ)',
    'degrees of freedom: inner-outer rule',
  ],
  whenUsed: 'Repeated visits (cluster = participant), or sites partly pooled (cluster = site).',
  smallN: 'Needs 5 clusters, some with more than one row. Lambda of 0 is a result: “no variation between clusters detected”.',
  source:
    'Pinheiro & Bates (2000) Mixed-Effects Models in S and S-PLUS; Satterthwaite (1946) Biometrics Bull 2:110-114; Robinson (1991) Stat Sci 6:15-32.',
  computedBy: computations.absent,
};
