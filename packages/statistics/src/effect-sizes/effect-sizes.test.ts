import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { effectSizeChecks } from '../../reference/effect-sizes.checks.ts';
import { classBalance, numberBalance } from './balance.ts';
import { largestClassImbalance, largestNumberImbalance } from './largest-imbalance.ts';
import { minimalDetectableChange } from './minimal-detectable-change.ts';
import { smallSampleFactor } from './small-sample-factor.ts';
import { standardisedChange } from './standardised-change.ts';
import { standardisedDifference } from './standardised-difference.ts';

const seed = 20240607;
const value = fc.integer({ min: -3000, max: 3000 }).map((whole) => whole / 100);
const sample = fc.array(value, { minLength: 2, maxLength: 20 });

it.each(effectSizeChecks)('agrees with R on $id', (check) => {
  expect(agreement(check).disagreements).toEqual([]);
});

describe('smallSampleFactor', () => {
  it('lies below 1 and rises to it', () => {
    let before = 0;
    for (const df of [1.01, 1.5, 2, 5, 20, 1e3, 1e6, 1e9]) {
      const factor = smallSampleFactor(df);
      expect(factor).toBeGreaterThan(before);
      expect(factor).toBeLessThan(1);
      before = factor;
    }
    expect(smallSampleFactor(1e12)).toBeCloseTo(1, 11);
    expect(smallSampleFactor(Infinity)).toBe(1);
    expect(() => smallSampleFactor(1)).toThrow(RangeError);
  });
});

describe('standardisedDifference', () => {
  it('does not change under shift and scale, turns with the groups, covers its estimate', () => {
    fc.assert(
      fc.property(sample, sample, value, (first, second, shift) => {
        const one = standardisedDifference(first, second);
        const two = standardisedDifference(second, first);
        const moved = standardisedDifference(
          first.map((x) => 4 * x + shift),
          second.map((x) => 4 * x + shift),
        );
        if (one.kind === 'not-estimable' || two.kind === 'not-estimable' || moved.kind === 'not-estimable') return;
        // Values whose spread is rounding only cannot follow a shift.
        if (one.pooledSd < 1e-3) return;
        expect(two.estimate).toBeCloseTo(-one.estimate, 10);
        expect(two.interval.lower).toBeCloseTo(-one.interval.upper, 6);
        expect(moved.estimate / one.estimate || 1).toBeCloseTo(1, 6);
        expect(one.cohenDInterval.lower).toBeLessThan(one.cohenD);
        expect(one.cohenDInterval.upper).toBeGreaterThan(one.cohenD);
        expect(Math.abs(one.estimate)).toBeLessThanOrEqual(Math.abs(one.cohenD));
      }),
      { seed, numRuns: 60 },
    );
  });

  it('says why there is none', () => {
    expect(standardisedDifference([], [1, 2])).toMatchObject({ reason: 'no comparison possible' });
    expect(standardisedDifference([1], [1, 2])).toMatchObject({ reason: 'too few values for a pooled SD' });
    expect(standardisedDifference([1, 1], [2, 2])).toMatchObject({ reason: 'all values equal within each group' });
    expect(standardisedDifference([1, 1e301], [2, 2])).toMatchObject({ reason: 'values too large to compute with' });
    expect(standardisedDifference([1], [2, 3, 5])).toMatchObject({ kind: 'estimate', failedAssumptions: ['very small sample (n = 1)'] });
  });
});

describe('standardisedChange', () => {
  it('is mean over SD of the changes, with the baseline form beside it', () => {
    const result = standardisedChange([1, 2, 3, null], [2, 4, 6, 3], 1);
    expect(result).toMatchObject({
      kind: 'estimate',
      n: 3,
      leftOut: { missing: 1 },
      estimate: 2,
      sdOfChange: 1,
      baselineEffectSize: { kind: 'figure', value: 2 },
    });
  });

  it('says why there is none', () => {
    expect(standardisedChange([], [])).toMatchObject({ reason: 'no data' });
    expect(standardisedChange([1], [2])).toMatchObject({ reason: 'n = 1, SD not defined' });
    expect(standardisedChange([0.4, 0.8], [0.7, 1.1], 0.01)).toMatchObject({ reason: 'all values equal' });
    expect(standardisedChange([1e301, 1], [1, 2])).toMatchObject({ reason: 'values too large to compute with' });
    expect(standardisedChange([1, 1], [2, 3])).toMatchObject({
      kind: 'estimate',
      corrected: { kind: 'no-figure' },
      baselineEffectSize: { kind: 'no-figure', reason: 'all values equal at baseline' },
    });
  });
});

describe('minimalDetectableChange', () => {
  it('falls to nothing as the reliability rises to 1', () => {
    expect(minimalDetectableChange(0.2, 1)).toMatchObject({ standardErrorOfMeasurement: 0, minimalDetectableChange: 0 });
    expect(minimalDetectableChange(0.2, 0.8).minimalDetectableChange).toBeGreaterThan(
      minimalDetectableChange(0.2, 0.9).minimalDetectableChange,
    );
  });

  it('refuses what is no SD or reliability', () => {
    for (const [sd, icc] of [
      [0, 0.9],
      [-1, 0.9],
      [NaN, 0.9],
      [Infinity, 0.9],
      [1, 1.1],
      [1, NaN],
    ] as const) {
      expect(() => minimalDetectableChange(sd, icc)).toThrow(RangeError);
    }
  });
});

describe('the balance of two groups', () => {
  it('is flagged beyond 0.10 and marked as large beyond 0.25', () => {
    expect(classBalance([50, 50], [50, 50])).toMatchObject({ difference: 0, concern: 'none' });
    expect(classBalance([56, 44], [50, 50])).toMatchObject({ concern: 'flagged' });
    expect(classBalance([70, 30], [50, 50])).toMatchObject({ concern: 'large' });
  });

  it('does not mind the order of three or more classes', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 30 }), { minLength: 3, maxLength: 5 }), fc.nat(), (first, choice) => {
        const second = first.map((count, i) => count + ((choice >> i) & 3));
        const one = classBalance(first, second);
        const turned = classBalance([...first].reverse(), [...second].reverse());
        if (one.kind === 'not-estimable' || turned.kind === 'not-estimable') throw new Error('expected figures');
        expect(turned.difference).toBeCloseTo(one.difference, 9);
        expect(one.difference).toBeGreaterThanOrEqual(0);
      }),
      { seed },
    );
  });

  it('leaves out a class that nobody is in', () => {
    const two = classBalance([7, 3], [4, 6]);
    const three = classBalance([7, 0, 3], [4, 0, 6]);
    expect(three).toEqual(two);
    expect(classBalance([5, 0], [9, 0])).toMatchObject({ difference: 0 });
  });

  it('says why there is none', () => {
    expect(classBalance([0, 0], [3, 4])).toMatchObject({ reason: 'no comparison possible' });
    expect(classBalance([5, 0], [0, 5])).toMatchObject({ reason: 'the groups have no class in common' });
    expect(classBalance([5, 0, 0], [0, 3, 2])).toMatchObject({ reason: 'the groups have too few classes in common' });
    expect(numberBalance([], [1])).toMatchObject({ reason: 'no comparison possible' });
    expect(numberBalance([1], [1, 2])).toMatchObject({ reason: 'a group has fewer than two values' });
    expect(numberBalance([1, 1], [2, 2])).toMatchObject({ reason: 'all values equal within each group' });
    expect(numberBalance([1, 1e301], [2, 2])).toMatchObject({ reason: 'values too large to compute with' });
    expect(() => classBalance([1], [1, 2])).toThrow(RangeError);
    expect(() => classBalance([1.5], [1])).toThrow(RangeError);
  });
});

describe('the balance of three or more groups', () => {
  const groups = [
    { name: 'A', values: [1, 2, 3, 4] },
    { name: 'B', values: [2, 3, 4, 5] },
    { name: 'C', values: [9, 7, 8, null] },
    { name: 'D', values: [5] },
  ];

  it('is that of the pair that differs most', () => {
    const answer = largestNumberImbalance(groups);
    expect(answer).toMatchObject({ kind: 'balance', first: 'A', second: 'C', pairsCompared: 3, concern: 'large', groupSizes: [4, 3] });
    expect(answer).toMatchObject({ difference: (numberBalance([1, 2, 3, 4], [9, 7, 8]) as { difference: number }).difference });
  });

  it('of classes likewise', () => {
    const counts = [
      { name: 'A', counts: [10, 20, 5] },
      { name: 'B', counts: [11, 19, 5] },
      { name: 'C', counts: [3, 9, 20] },
    ];
    expect(largestClassImbalance(counts)).toMatchObject({ first: 'B', second: 'C', pairsCompared: 3 });
  });

  it('is none without a pair that can be compared', () => {
    expect(largestNumberImbalance([])).toMatchObject({ kind: 'not-estimable', reason: 'no comparison possible' });
    expect(largestNumberImbalance(groups.slice(3))).toMatchObject({ kind: 'not-estimable' });
    expect(
      largestClassImbalance([
        { name: 'A', counts: [0, 0] },
        { name: 'B', counts: [1, 2] },
      ]),
    ).toMatchObject({ kind: 'not-estimable' });
  });
});
