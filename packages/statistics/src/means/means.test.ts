import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { meanChecks } from '../../reference/means.checks.ts';
import { meanWithInterval, oneSampleTest } from './one-sample.ts';
import { pairedChange } from './paired-change.ts';
import { welchTest } from './welch.ts';

const seed = 20240602;
const value = fc.integer({ min: -5000, max: 5000 }).map((whole) => whole / 100);
const sample = fc.array(value, { minLength: 2, maxLength: 40 });

it.each(meanChecks)('agrees with R on $id', (check) => {
  expect(agreement(check).disagreements).toEqual([]);
});

describe('meanWithInterval', () => {
  it('does not mind the order and follows shift and scale', () => {
    fc.assert(
      fc.property(sample, value, fc.constantFrom(0.25, 2, 1024), (values, shift, scale) => {
        const one = meanWithInterval(values);
        const reversed = meanWithInterval([...values].reverse());
        const moved = meanWithInterval(values.map((x) => x * scale + shift));
        if (one.kind === 'not-estimable' || reversed.kind === 'not-estimable' || moved.kind === 'not-estimable') {
          expect([one.kind, reversed.kind, moved.kind]).toEqual(['not-estimable', 'not-estimable', 'not-estimable']);
          return;
        }
        expect(reversed.estimate).toBeCloseTo(one.estimate, 9);
        expect(reversed.interval.lower).toBeCloseTo(one.interval.lower, 9);
        expect(moved.estimate).toBeCloseTo(one.estimate * scale + shift, 6);
        expect(moved.sd).toBeCloseTo(one.sd * scale, 6);
        expect(moved.interval.upper).toBeCloseTo(one.interval.upper * scale + shift, 6);
        expect(one.interval.lower).toBeLessThanOrEqual(one.estimate);
        expect(one.interval.upper).toBeGreaterThanOrEqual(one.estimate);
      }),
      { seed },
    );
  });

  it('says why there is no interval', () => {
    expect(meanWithInterval([])).toMatchObject({ kind: 'not-estimable', reason: 'no data', n: 0 });
    expect(meanWithInterval([null, NaN, 'unable'])).toMatchObject({ reason: 'no data', leftOut: { missing: 1, nonFinite: 1, unable: 1 } });
    expect(meanWithInterval([0.4])).toMatchObject({ reason: 'n = 1, SD not defined', pointEstimate: 0.4 });
    // 0.1 + 0.1 + 0.1 is not 0.3 in binary: equal values must still have a spread of exactly nothing.
    expect(meanWithInterval([0.1, 0.1, 0.1])).toMatchObject({ reason: 'all values equal', pointEstimate: 0.1 });
    expect(meanWithInterval([1e301, 2])).toMatchObject({ reason: 'values too large to compute with' });
  });

  it('marks a very small sample', () => {
    expect(meanWithInterval([1, 2, 3])).toMatchObject({ failedAssumptions: ['very small sample (n = 3)'] });
    expect(meanWithInterval([1, 2, 3, 4, 6])).toMatchObject({ failedAssumptions: [] });
  });

  it('computes with numbers whose squares leave the range of a double', () => {
    const plain = meanWithInterval([1, 2, 4]);
    const tiny = meanWithInterval([1e-300, 2e-300, 4e-300]);
    const huge = meanWithInterval([1e299, 2e299, 4e299]);
    if (plain.kind !== 'estimate' || tiny.kind !== 'estimate' || huge.kind !== 'estimate') throw new Error('expected estimates');
    expect(tiny.sd / 1e-300).toBeCloseTo(plain.sd, 12);
    expect(huge.sd / 1e299).toBeCloseTo(plain.sd, 12);
    expect(huge.interval.upper / 1e299).toBeCloseTo(plain.interval.upper, 11);
    expect(meanWithInterval([0, 5e-324])).toMatchObject({ kind: 'estimate' });
  });

  it('refuses a level that is none', () => {
    for (const level of [0, 1, NaN, 95]) expect(() => meanWithInterval([1, 2], level)).toThrow(RangeError);
  });
});

describe('oneSampleTest', () => {
  it('has p below 0.05 exactly when the 95% interval leaves the value out', () => {
    fc.assert(
      fc.property(sample, value, (values, expected) => {
        const result = oneSampleTest(values, expected);
        if (result.kind === 'not-estimable' || Math.abs(result.test.p - 0.05) < 1e-9) return;
        const { lower, upper } = result.interval;
        expect(result.test.p < 0.05).toBe(expected < lower || expected > upper);
      }),
      { seed },
    );
  });

  it('refuses to test against what is no number', () => {
    expect(() => oneSampleTest([1, 2], NaN)).toThrow(RangeError);
  });
});

describe('pairedChange', () => {
  it('uses complete pairs and counts the others', () => {
    const result = pairedChange([0.4, null, 0.8, 0.5, 'unable'], [0.7, 0.9, 1.1, 0.9, 0.2], 0.01);
    expect(result).toMatchObject({ kind: 'estimate', n: 3, leftOut: { missing: 1, nonFinite: 0, unable: 1 } });
    if (result.kind === 'estimate') expect(result.estimate).toBeCloseTo(1 / 3, 14);
  });

  it('takes changes that are equal as decimals for equal', () => {
    expect(0.7 - 0.4).not.toBe(1.1 - 0.8);
    expect(pairedChange([0.4, 0.8], [0.7, 1.1], 0.01)).toMatchObject({ reason: 'all values equal', pointEstimate: 0.3 });
  });

  it('changes its sign when the visits are exchanged', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(value, value), { minLength: 3, maxLength: 30 }), (pairs) => {
        const before = pairs.map(([first]) => first);
        const after = pairs.map(([, second]) => second);
        const forth = pairedChange(before, after);
        const back = pairedChange(after, before);
        if (forth.kind === 'not-estimable' || back.kind === 'not-estimable') return expect(back.kind).toBe(forth.kind);
        expect(back.estimate).toBeCloseTo(-forth.estimate, 12);
        expect(back.test.p).toBeCloseTo(forth.test.p, 12);
      }),
      { seed },
    );
  });

  // Gagnon et al. (2018) J Neuroeng Rehabil, doi 10.1186/s12984-018-0354-2, table 2: in-device speed in the first and last session
  // of the nine people with both; mean change 0.1056 (SD 0.0475) worked out from the printed rows.
  it('gives the change in speed of a published feasibility study', () => {
    const first = [0.16, 0.19, 0.12, 0.16, 0.2, 0.16, 0.13, 0.13, 0.17, 0.16];
    const last = [0.29, 0.3, 0.24, 0.23, null, 0.27, 0.3, 0.24, 0.17, 0.29];
    const result = pairedChange(first, last, 0.01);
    expect(result).toMatchObject({ kind: 'estimate', n: 9, leftOut: { missing: 1 } });
    if (result.kind !== 'estimate') return;
    expect(result.estimate).toBeCloseTo(0.1056, 4);
    expect(result.sd).toBeCloseTo(0.0475, 4);
  });
});

describe('welchTest', () => {
  it('changes its sign when the groups are exchanged and covers its estimate', () => {
    fc.assert(
      fc.property(sample, sample, (first, second) => {
        const one = welchTest(first, second);
        const two = welchTest(second, first);
        if (one.kind === 'not-estimable' || two.kind === 'not-estimable') return expect(two.kind).toBe(one.kind);
        expect(two.estimate).toBe(-one.estimate);
        expect(two.test.p).toBeCloseTo(one.test.p, 12);
        expect(one.interval.lower).toBeLessThanOrEqual(one.estimate);
        expect(one.interval.upper).toBeGreaterThanOrEqual(one.estimate);
        const smallest = Math.min(first.length, second.length) - 1;
        expect(one.test.df[0]).toBeGreaterThanOrEqual(smallest - 1e-9);
        expect(one.test.df[0]).toBeLessThanOrEqual(first.length + second.length - 2 + 1e-9);
      }),
      { seed },
    );
  });

  it('says why there is no comparison', () => {
    expect(welchTest([], [1, 2])).toMatchObject({ reason: 'no comparison possible' });
    expect(welchTest([1], [1, 2])).toMatchObject({ reason: 'a group has fewer than two values', pointEstimate: -0.5 });
    expect(welchTest([1, 1], [2, 2])).toMatchObject({ reason: 'all values equal within each group', pointEstimate: -1 });
    // Variance in one group is enough.
    expect(welchTest([1, 1, 1], [2, 3, 5])).toMatchObject({ kind: 'estimate', test: { df: [2] } });
  });
});
