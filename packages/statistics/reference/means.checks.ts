/** Means, t intervals and t tests against R. */

import { meanWithInterval, oneSampleTest, pairedChange, tMultiplier, welchTest } from '../src/index.ts';
import type { NotEstimable, TestedEstimate } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import type { FixtureCase } from './fixture.ts';
import { casesOf } from './fixture.ts';
import fixture from './means.json' with { type: 'json' };

function check(one: FixtureCase, method: string, compute: () => unknown, expected: unknown = one.expected): ReferenceCheck {
  return {
    id: one.id,
    method,
    source: `R 4.2.2, ${method === 'mean-with-interval' ? 'formula with qt' : 't.test'}; ${one.dataset}`,
    compute,
    expected,
    tolerance: one.tolerance,
  };
}

function testMembers(result: (TestedEstimate & { readonly se: number }) | NotEstimable): Record<string, unknown> {
  if (result.kind === 'not-estimable') return {};
  const { estimate, interval, test, se } = result;
  return { t: test.statistic, df: test.df[0], p_two_sided: test.p, ci95: [interval.lower, interval.upper], estimate, se };
}

export const meanChecks: readonly ReferenceCheck[] = [
  ...casesOf(fixture, 'tci.').map((one) =>
    check(one, 'mean-with-interval', () => {
      const result = meanWithInterval(one.inputs.x, one.inputs.level);
      if (result.kind === 'not-estimable') return result;
      const { estimate, se, n, interval } = result;
      return { mean: estimate, se, tcrit: tMultiplier(one.inputs.level, n - 1), ci: [interval.lower, interval.upper] };
    }),
  ),
  ...casesOf(fixture, 'ttest.onesample').map((one) =>
    check(one, 'one-sample-t', () => testMembers(oneSampleTest(one.inputs.x, one.inputs.mu))),
  ),
  ...casesOf(fixture, 'ttest.paired').map((one) =>
    check(one, 'paired-change', () => {
      const changes: number[] = one.inputs.diff;
      return testMembers(
        pairedChange(
          changes.map(() => 0),
          changes,
        ),
      );
    }),
  ),
  ...casesOf(fixture, 'ttest.welch').map((one) => {
    const { t, df, p_two_sided, ci95, estimate, se, mean_diff } = one.expected;
    return check(
      one,
      'welch',
      () => {
        const result = welchTest(one.inputs.x, one.inputs.y);
        if (result.kind === 'not-estimable') return result;
        return { ...testMembers(result), estimate: result.groupMeans, mean_diff: result.estimate };
      },
      { t, df, p_two_sided, ci95, estimate, se, mean_diff },
    );
  }),
];
