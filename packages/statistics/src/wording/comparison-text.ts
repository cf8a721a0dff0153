import type { TestedEstimate } from '../result.ts';
import { percentText } from '../test-figures.ts';
import { intervalText, limitText, numberText } from './number-text.ts';

/**
 * A difference in words that neither claim a cause nor the absence of a difference: "groups differ by 0.12 m/s (95% CI 0.03 to 0.21)", or
 * "no difference was shown; the 95% CI runs from −0.05 to 0.21 m/s". Which of the two is said goes by the interval.
 */
export function comparisonText(subject: string, of: Pick<TestedEstimate, 'estimate' | 'interval'>, decimals: number, unit = ''): string {
  const { estimate, interval } = of;
  const measure = unit === '' ? '' : ` ${unit}`;
  if (interval.lower > 0 || interval.upper < 0) {
    return `${subject} differ by ${numberText(estimate, decimals)}${measure} (${intervalText(interval, decimals)})`;
  }
  const [from, to] = [limitText(interval.lower, decimals), limitText(interval.upper, decimals)];
  return `no difference was shown; the ${percentText(interval.level)} CI runs from ${from} to ${to}${measure}`;
}
