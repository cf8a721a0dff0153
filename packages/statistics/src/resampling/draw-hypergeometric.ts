/**
 * Draws a hypergeometric count by inversion from the mode outwards, so that the work grows with the spread and not with the counts.
 * Source: Kachitvichyanukul & Schmeiser (1985) J Stat Comput Simul 22:127-145 (inversion); the mode as in Johnson, Kemp & Kotz (2005),
 * section 6.2.
 */

import { hypergeometricMass } from '../distributions/hypergeometric.ts';
import type { SeededGenerator } from './seeded-generator.ts';

/** How many marked ones are among `draws` taken without return from `marked` + `unmarked`. */
export function drawHypergeometric(generator: SeededGenerator, marked: number, unmarked: number, draws: number): number {
  const least = Math.max(0, draws - unmarked);
  const most = Math.min(marked, draws);
  if (least === most) return least;
  const mode = Math.min(most, Math.max(least, Math.floor(((draws + 1) * (marked + 1)) / (marked + unmarked + 2))));
  const peak = hypergeometricMass(mode, marked, unmarked, draws);
  let rest = generator.nextFraction() - peak;
  let [above, below] = [peak, peak];
  for (let step = 1; rest >= 0 && (mode + step <= most || mode - step >= least); step++) {
    const up = mode + step;
    if (up <= most) {
      above *= ((marked - up + 1) * (draws - up + 1)) / (up * (unmarked - draws + up));
      rest -= above;
      if (rest < 0) return up;
    }
    const down = mode - step;
    if (down >= least) {
      below *= ((down + 1) * (unmarked - draws + down + 1)) / ((marked - down) * (draws - down));
      rest -= below;
      if (rest < 0) return down;
    }
  }
  return mode;
}
