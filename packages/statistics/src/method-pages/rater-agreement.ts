import type { MethodPage } from './method-page.ts';

export const raterAgreementPage: MethodPage = {
  slug: 'rater-agreement',
  title: 'Agreement of raters',
  formula:
    'From the mean squares of participants, raters and error: ICC(1,1), (2,1), (3,1) and of the mean of k ratings (1,k), (2,k), (3,k), with F limits. ICC(2,1) = (BMS - EMS)/(BMS + (k - 1) EMS + k (JMS - EMS)/n).',
  whenUsed: 'Reliability of an outcome measure; ICC(2,1) feeds the minimal detectable change.',
  smallN: 'Needs 5 participants rated by all raters and 2 raters; below 30 the limits are wide, which is marked.',
  source: 'Shrout & Fleiss (1979) Psychol Bull 86:420-428.',
};
