export { pearsonCorrelation } from './pearson-correlation.ts';
export { spearmanCorrelation } from './spearman-correlation.ts';
export { kendallCorrelation } from './kendall-correlation.ts';
