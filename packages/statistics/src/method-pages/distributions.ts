import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const distributionsPage: MethodPage = {
  slug: 'distributions',
  title: 'Distribution functions',
  question: 'every-figure',
  formula: [
    't, F, beta, binomial: incomplete beta function with the saddle-point prefactor',
    'chi-square, gamma, Poisson: incomplete gamma function with the same prefactor',
    'normal: Chebyshev fit of the tail',
    'noncentral t, studentised range: Gauss-Legendre panels over the chi density, or the normal one where that is the smoother',
    'both tails are computed; none is 1 minus the other',
  ],
  whenUsed: 'Behind every p-value and interval.',
  smallN: 'Exact distributions are counted for rank tests and tables of counts.',
  source:
    'Loader (2000) Fast and Accurate Computation of Binomial Probabilities; NIST Digital Library of Mathematical Functions, chapters 7 and 8; Hill (1970) Commun ACM 13:617.',
  computedBy: computations.distributions,
};
