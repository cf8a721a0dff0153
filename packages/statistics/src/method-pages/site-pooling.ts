import type { MethodPage } from './method-page.ts';

export const sitePoolingPage: MethodPage = {
  slug: 'site-pooling',
  title: 'Pooling the sites',
  formula:
    'w = 1/SE^2; Q = sum w (y - mean)^2; tau2 = max(0, (Q - (k - 1)) / (sum w - sum w^2/sum w)); pooled with weights 1/(SE^2 + tau2). Hartung-Knapp: SE^2 = sum w* (y - pooled)^2 / ((k - 1) sum w*), t with k - 1. I2 = max(0, (Q - df)/Q). Prediction: pooled -/+ t(k - 2) sqrt(tau2 + SE^2).',
  whenUsed: 'One figure from estimates of sites that may differ in truth.',
  smallN: 'Fewer than 3 sites are not pooled: list them, or show the total. Fewer than 5 is marked.',
  source:
    'DerSimonian & Laird (1986) Control Clin Trials 7:177-188; Hartung & Knapp (2001) Stat Med 20:3875-3889; Higgins, Thompson & Spiegelhalter (2009) J R Stat Soc A 172:137-159.',
};
