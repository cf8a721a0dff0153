import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const kaplanMeierPage: MethodPage = {
  slug: 'kaplan-meier',
  title: 'Kaplan-Meier curve',
  question: 'time',
  formula: [
    'S(t) = Π(1 − d/r) over the event times up to t',
    'SE = S √(Σ d/(r(r − d)))',
    'interval S^{exp(∓z SE/(S |ln S|))}',
    'median: first time with S ≤ 1/2; the middle of the stretch where S is exactly 1/2',
  ],
  whenUsed: 'Time to an event, such as independent walking, when some are still waiting.',
  smallN: 'Median “not reached” where the curve stays above 1/2. At S = 0 there is no standard error.',
  source: 'Kaplan & Meier (1958) J Am Stat Assoc 53:457-481; Brookmeyer & Crowley (1982) Biometrics 38:29-41.',
  computedBy: computations.absent,
};
