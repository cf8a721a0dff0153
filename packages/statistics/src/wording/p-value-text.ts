import { fixedDecimals } from './rounding.ts';

/**
 * "p = 0.03", "p = 0.004", "p < 0.001", "p > 0.99": two decimals from 0.10 up, three below, the third left off where it is 0. Never
 * "0.000", "1.00", stars or "NS" (SAMPL guidelines: Lang & Altman 2013).
 */
export function pValueText(p: number): string {
  if (!(p >= 0 && p <= 1)) throw new RangeError('A p-value lies between 0 and 1.');
  if (p < 0.001) return 'p < 0.001';
  if (p > 0.99) return 'p > 0.99';
  if (p >= 0.1) return `p = ${fixedDecimals(p, 2)}`;
  return `p = ${fixedDecimals(p, 3).replace(/0$/, '')}`;
}
