import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changes, cleanPairs, cleanSample, roundToResolution } from './samples.ts';
import { roundHalfAwayFromZero } from './wording/rounding.ts';

describe('cleanSample', () => {
  it('keeps finite numbers in order and counts the rest by reason', () => {
    const sample = cleanSample([3, null, 'unable', NaN, 1, undefined, -Infinity, 'unable', 0]);
    expect([...sample.values]).toEqual([3, 1, 0]);
    expect(sample.n).toBe(3);
    expect(sample.leftOut).toEqual({ missing: 2, nonFinite: 2, unable: 2 });
  });

  it('answers an empty list with n = 0', () => {
    expect(cleanSample([])).toMatchObject({ n: 0, leftOut: { missing: 0, nonFinite: 0, unable: 0 } });
  });
});

describe('cleanPairs', () => {
  it('keeps complete pairs and counts a broken pair once, by its worse value', () => {
    const pairs = cleanPairs([1, null, 'unable', 4, NaN, 6], [2, 'unable', 3, Infinity, null, 7]);
    expect([...pairs.first]).toEqual([1, 6]);
    expect([...pairs.second]).toEqual([2, 7]);
    expect(pairs.leftOut).toEqual({ missing: 2, nonFinite: 1, unable: 1 });
  });

  it('refuses lists of different length', () => {
    expect(() => cleanPairs([1], [])).toThrow(RangeError);
  });
});

describe('roundToResolution', () => {
  it('makes equal decimals equal doubles', () => {
    expect(0.7 - 0.4).not.toBe(1.1 - 0.8);
    expect(roundToResolution(0.7 - 0.4, 0.1)).toBe(0.3);
    expect(roundToResolution(1.1 - 0.8, 0.1)).toBe(0.3);
    expect(roundToResolution(0.7 - 0.4, 1e-9)).toBe(roundToResolution(1.1 - 0.8, 1e-9));
  });

  it('takes halves away from zero as the decimal reads', () => {
    expect(roundToResolution(1.005, 0.01)).toBe(1.01);
    expect(roundToResolution(-1.005, 0.01)).toBe(-1.01);
    expect(roundToResolution(0.125, 0.05)).toBe(0.15);
    expect(roundToResolution(7, 5)).toBe(5);
    expect(roundToResolution(7.5, 5)).toBe(10);
  });

  it('agrees with rounding the decimal as it reads', () => {
    fc.assert(
      fc.property(fc.integer({ min: -2_000_000, max: 2_000_000 }), fc.constantFrom(1, 2, 3), (whole, decimals) => {
        // A decimal with one digit more than the resolution keeps, so that halves are common.
        const value = Number(`${whole}e-${decimals + 1}`);
        expect(roundToResolution(value, Number(`1e-${decimals}`))).toBe(roundHalfAwayFromZero(value, decimals) + 0);
      }),
      { seed: 20240609, numRuns: 1000 },
    );
  });

  it('never answers minus zero', () => {
    expect(Object.is(roundToResolution(-0.001, 0.1), 0)).toBe(true);
  });

  it('leaves a value alone that has no digits at the step', () => {
    expect(roundToResolution(1e300, 1e-9)).toBe(1e300);
    expect(roundToResolution(Number.MAX_VALUE, 0.01)).toBe(Number.MAX_VALUE);
  });

  it('refuses a resolution that is not a positive number', () => {
    for (const resolution of [0, -1, NaN, Infinity]) expect(() => roundToResolution(1, resolution)).toThrow(RangeError);
  });
});

describe('changes', () => {
  it('is follow-up minus baseline at the resolution of the instrument', () => {
    expect([...changes(cleanPairs([0.4, 0.8, 0.5], [0.7, 1.1, 0.2]), 0.01)]).toEqual([0.3, 0.3, -0.3]);
  });
});
