import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const descriptionPage: MethodPage = {
  slug: 'description',
  title: 'Description of a group',
  question: 'describe',
  formula: [
    'mean x̄ = Σx / n',
    'SD s = √(Σ(x − x̄)^2 / (n − 1)), in two passes',
    'skewness G_1 = g_1 √(n(n − 1)) / (n − 2), g_1 = m_3 / m_2^1.5, m_k = Σ(x − x̄)^k / n',
    'median and quartiles of type 7',
  ],
  whenUsed:
    'Every group of numbers, before anything is compared. Values that are missing, not numbers, or “unable” are counted and named, never taken as 0. The median leads for ordinal scales and where |G1| > 1.',
  smallN:
    'n = 1: mean and median only (“n = 1, SD not defined”). Quartiles from n = 5, skewness from n = 3. All values equal: SD 0, no skewness. Marked “very small sample” below 5.',
  source:
    'Hyndman & Fan (1996) Am Stat 50:361-365; Joanes & Gill (1998) The Statistician 47:183-189; Chan, Golub & LeVeque (1983) Am Stat 37:242-247.',
  computedBy: computations.describing,
};
