import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { survivalChecks } from '../../reference/survival.checks.ts';
import { siteChecks } from '../../reference/sites.checks.ts';
import { resamplingChecks } from '../../reference/resampling.checks.ts';

describe('x', () => {
  it.each([...survivalChecks, ...siteChecks, ...resamplingChecks].map((check) => [check.id, check] as const))(
    '%s agrees with R',
    (_id, check) => {
      const a = agreement(check);
      console.log(check.method, check.id, a.compared, a.worstRelativeError.toExponential(1));
      expect(a.disagreements).toEqual([]);
    },
  );
});
