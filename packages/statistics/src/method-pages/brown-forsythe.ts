import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const brownForsythePage: MethodPage = {
  slug: 'brown-forsythe',
  title: 'Equal spread: Brown-Forsythe test',
  question: 'several-groups',
  formula: ['one-way analysis of variance of |x − median of the group|'],
  whenUsed: 'To see whether groups differ in spread, before the classic analysis of variance is shown.',
  smallN: 'As the one-way analysis of variance.',
  source: 'Brown & Forsythe (1974) J Am Stat Assoc 69:364-367.',
  computedBy: computations.means,
};
