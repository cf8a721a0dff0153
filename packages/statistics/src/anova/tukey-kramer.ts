/**
 * All pairs of group means with one simultaneous level: |difference| = q/sqrt 2 × sqrt(MSW (1/n_i + 1/n_j)), q the studentised range.
 * Source: Tukey (1953), unequal n after Kramer (1956) Biometrics 12:307-310; conservative as shown by Hayter (1984) Annals of
 * Statistics 12:61-75.
 */

import { studentisedRangeQuantile, studentisedRangeTails } from '../distributions/studentised-range.ts';
import { centredMoments, comparableGroups, groupCautions } from '../groups/groups.ts';
import type { Group, GroupSetAside } from '../groups/groups.ts';
import type { Interval, NotEstimable, Provenance } from '../result.ts';
import { notEstimable, reasons, requireLevel } from '../result.ts';
import { percentText } from '../test-figures.ts';
import { sumsOfSquares } from './one-way.ts';

/** `estimate` is the mean of `second` minus the mean of `first`; interval and p hold for all pairs together. */
export interface TukeyPair {
  readonly first: string;
  readonly second: string;
  readonly estimate: number;
  readonly interval: Interval;
  readonly q: number;
  readonly p: number;
}

export interface TukeyComparison extends Provenance {
  readonly kind: 'pairs';
  readonly pairs: readonly TukeyPair[];
  readonly residualDf: number;
  readonly setAside: readonly GroupSetAside[];
}

/** Needs two residual degrees of freedom and some variance; groups without two values are set aside and named. */
export function tukeyKramer(given: readonly Group[], level = 0.95): TukeyComparison | NotEstimable {
  requireLevel(level);
  const compared = comparableGroups(given, 2);
  const { groups, setAside, basis } = compared;
  const k = groups.length;
  if (k < 2) return notEstimable(reasons.noComparison, basis);
  const centred = centredMoments(groups);
  if (centred === 'too large') return notEstimable(reasons.tooLarge, basis);
  const { of, factor } = centred;
  const { within, dfWithin } = sumsOfSquares(of);
  if (within === 0) return notEstimable('all values equal within each group', basis);
  const critical = studentisedRangeQuantile(level, k, dfWithin);
  const pairs: TukeyPair[] = [];
  of.forEach((one, i) => {
    of.slice(i + 1).forEach((two, offset) => {
      const se = Math.sqrt((within / dfWithin / 2) * (1 / one.n + 1 / two.n));
      const difference = two.mean - one.mean;
      const q = Math.abs(difference) / se;
      const estimate = difference * factor;
      const reach = critical * se * factor;
      pairs.push({
        first: (groups[i] as { name: string }).name,
        second: (groups[i + 1 + offset] as { name: string }).name,
        estimate,
        interval: { lower: estimate - reach, upper: estimate + reach, level },
        q,
        p: studentisedRangeTails(q, k, dfWithin).upper,
      });
    });
  });
  return {
    kind: 'pairs',
    ...basis,
    pairs,
    residualDf: dfWithin,
    setAside,
    method: `Tukey-Kramer comparison of all ${pairs.length} pairs of means (simultaneous ${percentText(level)} intervals, equal variances assumed).`,
    failedAssumptions: groupCautions(compared),
  };
}
