import { computations } from './computations.ts';
import type { MethodPage } from './method-page.ts';

export const quantileTypeSevenPage: MethodPage = {
  slug: 'quantile-type-7',
  title: 'Quantiles of type 7',
  question: 'describe',
  formula: ['x_0 ≤ x_1 ≤ … ≤ x_{n−1}, the values in ascending order', 'h = (n − 1)p, i = ⌊h⌋', 'Q(p) = x_i + (h − i)(x_{i+1} − x_i)'],
  whenUsed:
    'Everywhere a median, quartile or percentile is shown. The same type as R, NumPy, percentile_cont of PostgreSQL and the inclusive percentile of spreadsheets; figures of type 6 (SPSS, Minitab) or 2 (SAS) differ in small groups.',
  smallN: 'Quartiles are shown from n = 5 on; the median always.',
  source: 'Hyndman & Fan (1996) Am Stat 50:361-365.',
  computedBy: computations.quantiles,
};
