import type { MethodPage } from './method-page.ts';

export const quantileTypeSevenPage: MethodPage = {
  slug: 'quantile-type-7',
  title: 'Quantiles of type 7',
  formula: 'x ascending from x[0]; h = (n - 1)p; i = floor h; Q = x[i] + (h - i)(x[i + 1] - x[i]).',
  whenUsed:
    'Everywhere a median, quartile or percentile is shown. The same type as R, NumPy, percentile_cont of PostgreSQL and the inclusive percentile of spreadsheets; figures of type 6 (SPSS, Minitab) or 2 (SAS) differ in small groups.',
  smallN: 'Quartiles are shown from n = 5 on; the median always.',
  source: 'Hyndman & Fan (1996) Am Stat 50:361-365.',
};
