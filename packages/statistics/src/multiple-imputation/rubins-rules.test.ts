import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { resamplingChecks } from '../../reference/resampling.checks.ts';
import { rubinsRules } from './rubins-rules.ts';

describe("Rubin's rules", () => {
  it.each(resamplingChecks.filter((check) => check.method === 'rubins-rules'))('agree with the figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });

  it('leave the single analysis as it is where the imputations agree', () => {
    const pooled = rubinsRules(
      Array.from({ length: 5 }, () => ({ estimate: 2, variance: 0.25 })),
      Infinity,
    );
    expect(pooled).toMatchObject({ estimate: 2, standardError: 0.5, shareFromGaps: 0, missingInformation: 0, df: Infinity });
    const small = rubinsRules(
      Array.from({ length: 5 }, () => ({ estimate: 2, variance: 0.25 })),
      40,
    );
    // Barnard and Rubin: (41/43) 40 without gaps.
    expect(small).toMatchObject({ df: expect.closeTo((41 / 43) * 40, 10) });
  });

  it('never have more degrees of freedom than the complete data', () => {
    for (const spread of [0, 0.01, 0.1, 1, 10]) {
      const pooled = rubinsRules(
        [0, 1, 2, 3].map((i) => ({ estimate: i * spread, variance: 1 })),
        20,
      );
      if (pooled.kind !== 'estimate') throw new Error(pooled.reason);
      expect(pooled.df).toBeLessThan(20);
      expect(pooled.df).toBeGreaterThan(0);
    }
  });

  it('need two analyses with a variance', () => {
    expect(rubinsRules([], 10)).toMatchObject({ reason: 'no data' });
    expect(rubinsRules([{ estimate: 3, variance: 1 }], 10)).toMatchObject({ kind: 'not-estimable', pointEstimate: 3 });
    expect(
      rubinsRules(
        [
          { estimate: 3, variance: 0 },
          { estimate: 4, variance: 0 },
        ],
        10,
      ),
    ).toMatchObject({ kind: 'not-estimable', pointEstimate: 3.5 });
    expect(() => rubinsRules([{ estimate: Number.NaN, variance: 1 }], 10)).toThrow(RangeError);
    expect(() => rubinsRules([{ estimate: 1, variance: -1 }], 10)).toThrow(RangeError);
    expect(() => rubinsRules([], 0)).toThrow(RangeError);
  });
});
