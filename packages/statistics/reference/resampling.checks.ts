/** Bootstrap limits and pooled imputations against R. */

import { percentileLimits, rubinsRules } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import { limits, membersOf } from './figures.ts';
import fixture from './resampling.json' with { type: 'json' };

const { bootstrap, rubin } = fixture;

export const resamplingChecks: readonly ReferenceCheck[] = [
  {
    ...bootstrap,
    id: '199 stored resamples of the sleep differences',
    method: 'bootstrap',
    compute: () => {
      const resampled = Float64Array.from(bootstrap.replicates);
      return { limits95: limits(percentileLimits(resampled, 0.95)), limits90: limits(percentileLimits(resampled, 0.9)) };
    },
  },
  {
    ...rubin,
    id: 'five analyses',
    method: 'rubins-rules',
    compute: () =>
      membersOf(
        rubinsRules(
          rubin.estimates.map((estimate, i) => ({ estimate, variance: rubin.variances[i] as number })),
          rubin.completeDf,
        ),
        (pooled) => ({ ...pooled, limits: limits(pooled.interval) }),
      ),
  },
];
