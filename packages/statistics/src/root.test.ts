import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findRoot, findRootOfIncreasing } from './root.ts';

describe('findRoot', () => {
  it('finds the root of a cubic to the last digits, whichever way it runs', () => {
    fc.assert(
      fc.property(fc.double({ min: -100, max: 100, noNaN: true }), fc.boolean(), (root, falling) => {
        const sign = falling ? -1 : 1;
        const found = findRoot((x) => sign * ((x - root) ** 3 + (x - root)), root - 37, root + 11);
        expect(Math.abs(found - root)).toBeLessThanOrEqual(1e-14 * Math.max(1, Math.abs(root)));
      }),
      { seed: 20240610 },
    );
  });

  it('answers an end that is itself the root', () => {
    expect(findRoot((x) => x - 2, 2, 5)).toBe(2);
    expect(findRoot((x) => x - 5, 2, 5)).toBe(5);
  });

  it('stops at the tolerance asked for', () => {
    let calls = 0;
    const found = findRoot(
      (x) => {
        calls++;
        return Math.atan(x - 1);
      },
      -40,
      30,
      1e-3,
    );
    expect(Math.abs(found - 1)).toBeLessThan(1e-3);
    expect(calls).toBeLessThan(20);
  });

  it('refuses ends between which the sign does not change', () => {
    expect(() => findRoot((x) => x * x + 1, -1, 1)).toThrow(RangeError);
    expect(() => findRoot(() => NaN, 0, 1)).toThrow(RangeError);
  });
});

describe('findRootOfIncreasing', () => {
  it('finds a root on either side of the start, however far', () => {
    for (const root of [-1e12, -3, 0, 0.5, 1e9]) {
      expect(findRootOfIncreasing((x) => x - root, 1, 0.1)).toBeCloseTo(root, 3);
    }
    expect(findRootOfIncreasing((x) => x - 1, 1, 0.1)).toBe(1);
  });

  it('answers the last number it could try when there is no root', () => {
    expect(findRootOfIncreasing(() => -1, 0, 1)).toBeGreaterThan(1e300);
    expect(findRootOfIncreasing(() => 1, 0, 1)).toBeLessThan(-1e300);
  });
});
