import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { multiplicityChecks } from '../../reference/multiplicity.checks.ts';
import { bonferroniAdjusted, falseDiscoveryAdjusted, holmAdjusted } from './adjusted-p-values.ts';

it.each(multiplicityChecks)('agrees with R on $id', (check) => {
  expect(agreement(check).disagreements).toEqual([]);
});

describe('the adjusted p-values', () => {
  const list = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { maxLength: 30 });

  it('lie between the plain p-value and Bonferroni, and keep the order', () => {
    fc.assert(
      fc.property(list, (p) => {
        const bonferroni = bonferroniAdjusted(p);
        for (const adjusted of [holmAdjusted(p), falseDiscoveryAdjusted(p)]) {
          p.forEach((plain, i) => {
            expect(adjusted[i]).toBeGreaterThanOrEqual(plain * (1 - 1e-15));
            expect(adjusted[i]).toBeLessThanOrEqual((bonferroni[i] as number) * (1 + 1e-15));
            p.forEach((other, j) => {
              if (plain < other) expect(adjusted[i]).toBeLessThanOrEqual(adjusted[j] as number);
            });
          });
        }
      }),
      { seed: 20240603 },
    );
  });

  it('leave a single p-value alone and an empty list empty', () => {
    for (const adjust of [holmAdjusted, falseDiscoveryAdjusted, bonferroniAdjusted]) {
      expect(adjust([0.03])).toEqual([0.03]);
      expect(adjust([])).toEqual([]);
      expect(() => adjust([0.1, 1.2])).toThrow(RangeError);
      expect(() => adjust([NaN])).toThrow(RangeError);
    }
  });
});
