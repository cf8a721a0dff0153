import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const oneWayAnovaPage: MethodPage = {
  slug: 'one-way-anova',
  title: 'One-way analysis of variance',
  question: 'several-groups',
  formula: [
    'F = (SSB / (k − 1)) / (SSW / (N − k)), values centred on the overall mean first',
    'η^2 = SSB / SST',
    'ω^2 = (SSB − (k − 1)MSW) / (SST + MSW)',
    'ε^2 = (SSB − (k − 1)MSW) / SST',
  ],
  whenUsed: 'Beside the Welch form where group sizes are near equal and the Brown-Forsythe test gives p > 0.05.',
  smallN: 'A group with fewer than two values is left out and named. Without variance in any group: no test.',
  source: 'Fisher (1925) Statistical Methods for Research Workers; Olejnik & Algina (2003) Psychol Methods 8:434-447.',
  computedBy: computations.means,
};
