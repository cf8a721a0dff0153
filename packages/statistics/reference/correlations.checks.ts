/** Correlations with intervals against R. */

import type { TestedEstimate } from '../src/index.ts';
import { kendallCorrelation, pearsonCorrelation, spearmanCorrelation } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import fixture from './correlations.json' with { type: 'json' };
import { limits, membersOf } from './figures.ts';

const { tolerance } = fixture;

export const correlationChecks: readonly ReferenceCheck[] = fixture.cases.flatMap((one): ReferenceCheck[] => {
  const { id, source, x, y, pearson, spearman, kendall } = one;
  const members = ({ estimate, interval, test }: TestedEstimate) => ({ limits: limits(interval), p: test.p, df: test.df, estimate, test });
  return [
    {
      id: `Pearson ${id}`,
      method: 'pearson',
      source,
      compute: () =>
        membersOf(pearsonCorrelation(x, y), (given) => ({
          ...members(given),
          r: given.estimate,
          t: given.test.statistic,
          limits90: membersOf(pearsonCorrelation(x, y, 0.9), (narrower) => limits(narrower.interval)),
        })),
      expected: pearson,
      tolerance,
    },
    {
      id: `Spearman ${id}`,
      method: 'spearman',
      source,
      compute: () => membersOf(spearmanCorrelation(x, y), (given) => ({ ...members(given), rho: given.estimate })),
      expected: spearman,
      tolerance,
    },
    {
      id: `Kendall ${id}`,
      method: 'kendall',
      source,
      compute: () => membersOf(kendallCorrelation(x, y), (given) => ({ ...members(given), tau: given.estimate, z: given.test.statistic })),
      expected: kendall,
      tolerance,
    },
  ];
});
