import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { anovaChecks } from '../../reference/analysis-of-variance.checks.ts';
import { welchTest } from '../means/welch.ts';
import { brownForsytheTest } from './brown-forsythe.ts';
import { oneWayAnova } from './one-way.ts';
import { tukeyKramer } from './tukey-kramer.ts';
import { welchAnova } from './welch-anova.ts';

const seed = 20240605;
const value = fc.integer({ min: -3000, max: 3000 }).map((whole) => whole / 100);
const groups = fc
  .array(fc.array(value, { minLength: 2, maxLength: 12 }), { minLength: 2, maxLength: 5 })
  .map((lists) => lists.map((values, i) => ({ name: `group ${i + 1}`, values })));

it.each(anovaChecks)('agrees with the published figures of $id', (check) => {
  expect(agreement(check).disagreements).toEqual([]);
});

describe.each([
  ['oneWayAnova', oneWayAnova],
  ['welchAnova', welchAnova],
  ['brownForsytheTest', brownForsytheTest],
])('%s', (_name, test) => {
  it('does not mind the order of groups and values, nor shift and scale', () => {
    fc.assert(
      fc.property(groups, value, (given, shift) => {
        const one = test(given);
        const turned = test([...given].reverse().map(({ name, values }) => ({ name, values: [...values].reverse() })));
        const moved = test(given.map(({ name, values }) => ({ name, values: values.map((x) => 8 * x + shift) })));
        if (one.kind === 'not-estimable') return;
        expect(turned).toMatchObject({ statistic: expect.closeTo(one.statistic, 8), p: expect.closeTo(one.p, 8) });
        expect(moved).toMatchObject({ p: expect.closeTo(one.p, 6) });
        expect(one.p).toBeGreaterThanOrEqual(0);
        expect(one.p).toBeLessThanOrEqual(1);
      }),
      { seed },
    );
  });

  it('says why there is no comparison', () => {
    expect(test([])).toMatchObject({ reason: 'no comparison possible' });
    expect(test([{ name: 'a', values: [1, 2, 3] }])).toMatchObject({ reason: 'no comparison possible' });
    expect(
      test([
        { name: 'a', values: [1, 2, 3] },
        { name: 'b', values: [5, null] },
      ]),
    ).toMatchObject({ reason: 'no comparison possible' });
    expect(
      test([
        { name: 'a', values: [1, 1] },
        { name: 'b', values: [2, 2] },
      ]).kind,
    ).toBe('not-estimable');
    expect(
      test([
        { name: 'a', values: [1, 1e301] },
        { name: 'b', values: [2, 3] },
      ]),
    ).toMatchObject({ reason: 'values too large to compute with' });
  });

  it('sets a group aside that is too small, and names it', () => {
    const result = test([
      { name: 'C1-C4', values: [1, 4, 2, 8, 3] },
      { name: 'C5-C8', values: [3, null, 'unable'] },
      { name: 'T1-S3', values: [5, 9, 11, 2, 7] },
    ]);
    expect(result).toMatchObject({ kind: 'test', n: 10, leftOut: { missing: 1, unable: 1 } });
    if (result.kind === 'test') expect(result.failedAssumptions).toContain('group left out: C5-C8 (n = 1, fewer than 2 values)');
  });

  it('computes with very small numbers', () => {
    const lists = [
      [1, 2, 4],
      [3, 5, 9],
    ];
    const plain = test(lists.map((values, i) => ({ name: `${i}`, values })));
    const tiny = test(lists.map((values, i) => ({ name: `${i}`, values: values.map((x) => x * 1e-300) })));
    if (plain.kind !== 'test' || tiny.kind !== 'test') throw new Error('expected tests');
    expect(tiny.p).toBeCloseTo(plain.p, 10);
  });
});

describe('oneWayAnova', () => {
  it('marks small groups', () => {
    const result = oneWayAnova([
      { name: 'a', values: [1, 2, 3] },
      { name: 'b', values: [2, 3, 4, 5, 6] },
    ]);
    expect(result).toMatchObject({ failedAssumptions: ['very small group: a (n = 3)'] });
  });
});

describe('welchAnova', () => {
  it('is the square of Welch t for two groups', () => {
    fc.assert(
      fc.property(groups, ([first, second]) => {
        if (!first || !second) return;
        const anova = welchAnova([first, second]);
        const t = welchTest(first.values, second.values);
        if (anova.kind === 'not-estimable' || t.kind === 'not-estimable') return;
        expect(anova.p).toBeCloseTo(t.test.p, 9);
        expect(anova.df[1]).toBeCloseTo(t.test.df[0] as number, 6);
      }),
      { seed },
    );
  });

  it('sets a group without variance aside', () => {
    expect(
      welchAnova([
        { name: 'a', values: [1, 2, 4] },
        { name: 'b', values: [2, 2, 2] },
        { name: 'c', values: [5, 7, 6] },
      ]),
    ).toMatchObject({ kind: 'test', n: 6, setAside: [{ name: 'b', n: 3, reason: 'all values equal' }] });
  });
});

describe('tukeyKramer', () => {
  it('has the difference in its interval, and p below 0.05 exactly when 0 is outside', () => {
    fc.assert(
      fc.property(groups, (given) => {
        const result = tukeyKramer(given);
        if (result.kind === 'not-estimable') return;
        expect(result.pairs).toHaveLength((given.length * (given.length - 1)) / 2);
        for (const { estimate, interval, p } of result.pairs) {
          expect(interval.lower).toBeLessThan(estimate);
          expect(interval.upper).toBeGreaterThan(estimate);
          if (Math.abs(p - 0.05) > 1e-6) expect(p < 0.05).toBe(interval.lower > 0 || interval.upper < 0);
        }
      }),
      { seed, numRuns: 15 },
    );
  });

  it('says why there is no comparison', () => {
    expect(tukeyKramer([{ name: 'a', values: [1, 2] }])).toMatchObject({ reason: 'no comparison possible' });
    expect(
      tukeyKramer([
        { name: 'a', values: [1, 1] },
        { name: 'b', values: [2, 2] },
      ]),
    ).toMatchObject({ reason: 'all values equal within each group' });
    expect(
      tukeyKramer([
        { name: 'a', values: [1, 1e301] },
        { name: 'b', values: [2, 3] },
      ]),
    ).toMatchObject({ kind: 'not-estimable' });
    expect(() => tukeyKramer([], 1)).toThrow(RangeError);
  });
});
