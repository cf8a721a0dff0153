/**
 * Change from baseline in the same people: follow-up minus baseline of complete pairs, so improvement is positive for speed and
 * distance. Each change is rounded to the instrument's resolution before anything is computed. Paired t test, df = n - 1, two-sided.
 * Source: Student (1908) Biometrika 6:1-25.
 */

import type { NotEstimable } from '../result.ts';
import type { Observation } from '../samples.ts';
import { changes, cleanPairs, defaultResolution } from '../samples.ts';
import { percentText } from '../test-figures.ts';
import type { OneSampleTest } from './one-sample.ts';
import { meanFigures } from './one-sample.ts';

/** `estimate` is the mean change; `sd` and `se` are those of the changes. */
export function pairedChange(
  baseline: ArrayLike<Observation>,
  followUp: ArrayLike<Observation>,
  resolution: number = defaultResolution,
  level = 0.95,
): OneSampleTest | NotEstimable {
  const pairs = cleanPairs(baseline, followUp);
  const figures = meanFigures({ values: changes(pairs, resolution), n: pairs.n, leftOut: pairs.leftOut }, level);
  if (figures.kind === 'not-estimable') return figures;
  return {
    ...figures,
    method: `Mean change (follow-up minus baseline) of complete pairs with ${percentText(level)} t interval and paired t test (two-sided).`,
  };
}
