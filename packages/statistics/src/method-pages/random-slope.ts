import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const randomSlopePage: MethodPage = {
  slug: 'random-slope',
  title: 'Random slope model',
  question: 'models',
  formula: [
    'y = Xb + u_0 + u_1 t + e, (u_0, u_1) of each participant with any covariance',
    'by REML profiled over the residual variance and b',
    'degrees of freedom: inner-outer rule',
  ],
  whenUsed: 'Trajectories that differ in pace from participant to participant.',
  smallN: 'Needs 5 participants and more rows than two per participant. Variation on the edge of what is possible is marked.',
  source: 'Laird & Ware (1982) Biometrics 38:963-974; Bates et al. (2015) J Stat Softw 67(1).',
  computedBy: computations.absent,
};
