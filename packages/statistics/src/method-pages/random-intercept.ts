import type { MethodPage } from './method-page.ts';

export const randomInterceptPage: MethodPage = {
  slug: 'random-intercept',
  title: 'Random intercept model',
  formula:
    "y = X b + u(cluster) + e by REML. With lambda = var(u)/var(e): maximise -1/2 [(N - p) ln(2 pi s^2) + sum ln(1 + n lambda) + ln|X'V^-1 X| + N - p] over lambda >= 0. Effect of a cluster = n lambda/(1 + n lambda) x its mean residual; ICC = lambda/(1 + lambda). Degrees of freedom: inner-outer rule.",
  whenUsed: 'Repeated visits (cluster = participant), or sites partly pooled (cluster = site).',
  smallN: 'Needs 5 clusters, some with more than one row. Lambda of 0 is a result: "no variation between clusters detected".',
  source:
    'Pinheiro & Bates (2000) Mixed-Effects Models in S and S-PLUS; Satterthwaite (1946) Biometrics Bull 2:110-114; Robinson (1991) Stat Sci 6:15-32.',
};
