import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const raterAgreementPage: MethodPage = {
  slug: 'rater-agreement',
  title: 'Agreement of raters',
  question: 'measurement',
  formula: [
    'mean squares of participants (BMS), raters (JMS) and error (EMS), with F limits',
    'ICC(2,1) = (BMS − EMS) / (BMS + (k − 1)EMS + k(JMS − EMS)/n)',
    'beside it ICC(1,1) and ICC(3,1), and of the mean of k ratings ICC(1,k), ICC(2,k) and ICC(3,k)',
  ],
  whenUsed: 'Reliability of an outcome measure; ICC(2,1) feeds the minimal detectable change.',
  smallN: 'Needs 5 participants rated by all raters and 2 raters; below 30 the limits are wide, which is marked.',
  source: 'Shrout & Fleiss (1979) Psychol Bull 86:420-428.',
  computedBy: computations.absent,
};
