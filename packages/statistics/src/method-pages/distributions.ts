import type { MethodPage } from './method-page.ts';

export const distributionsPage: MethodPage = {
  slug: 'distributions',
  title: 'Distribution functions',
  formula:
    'Incomplete beta and gamma functions with the saddle-point prefactor (t, F, chi-square, binomial, Poisson, beta, gamma), a Chebyshev fit of the normal tail, Gauss-Legendre panels over the chi density (noncentral t, studentised range). Both tails are computed; none is 1 minus the other.',
  whenUsed: 'Behind every p-value and interval.',
  smallN: 'Exact distributions are counted for rank tests and tables of counts.',
  source:
    'Loader (2000) Fast and Accurate Computation of Binomial Probabilities; NIST Digital Library of Mathematical Functions, chapters 7 and 8; Hill (1970) Commun ACM 13:617.',
};
