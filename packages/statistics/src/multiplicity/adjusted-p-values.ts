/**
 * P-values adjusted for the number of comparisons, in the order they came. A comparison that could not be made is left out by the
 * caller and does not count.
 */

import { requireProbability } from '../distributions/tails.ts';

function ascending(p: readonly number[]): number[] {
  p.forEach(requireProbability);
  return p.map((_, i) => i).sort((a, b) => (p[a] as number) - (p[b] as number));
}

/** Every p times the number of comparisons, at most 1. */
export function bonferroniAdjusted(p: readonly number[]): number[] {
  p.forEach(requireProbability);
  return p.map((value) => Math.min(1, value * p.length));
}

/** Step-down: running maximum of (m - i + 1) p(i). Source: Holm (1979) Scandinavian Journal of Statistics 6:65-70. */
export function holmAdjusted(p: readonly number[]): number[] {
  const adjusted = new Array<number>(p.length);
  let running = 0;
  for (const [place, index] of ascending(p).entries()) {
    running = Math.max(running, Math.min(1, (p.length - place) * (p[index] as number)));
    adjusted[index] = running;
  }
  return adjusted;
}

/** False discovery rate: running minimum of m p(i)/i from the largest down. Source: Benjamini & Hochberg (1995) JRSS B 57:289-300. */
export function falseDiscoveryAdjusted(p: readonly number[]): number[] {
  const adjusted = new Array<number>(p.length);
  let running = 1;
  const order = ascending(p);
  for (let place = order.length; place >= 1; place--) {
    const index = order[place - 1] as number;
    running = Math.min(running, (p.length * (p[index] as number)) / place);
    adjusted[index] = running;
  }
  return adjusted;
}
