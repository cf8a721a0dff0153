import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const stuartMaxwellPage: MethodPage = {
  slug: 'stuart-maxwell',
  title: 'Stuart-Maxwell test',
  question: 'grades',
  formula: [
    'χ^2 = d′ S^{−1} d, d_i = row total − column total',
    'S_ii = row total + column total − 2n_ii, S_ij = −(n_ij + n_ji)',
    'one category of each connected group is left out',
  ],
  whenUsed: 'Whether the grades are as frequent at follow-up as at baseline.',
  smallN: 'Nobody changed: “no comparison possible”. Fewer than 10 movements out of or into some grade is marked.',
  source: 'Stuart (1955) Biometrika 42:412-416; Maxwell (1970) Br J Psychiatry 116:651-655.',
  computedBy: computations.absent,
};
