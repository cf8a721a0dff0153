import fc from 'fast-check';
import { describe as group, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { descriptionChecks } from '../../reference/description.checks.ts';
import { describe } from './describe.ts';
import { prefersRanks } from './prefers-ranks.ts';
import { quantile } from './quantile.ts';

const seed = 20240604;
const value = fc.integer({ min: -5000, max: 5000 }).map((whole) => whole / 100);
const sample = fc.array(value, { minLength: 1, maxLength: 60 });

it.each(descriptionChecks)('agrees with the published figures of $id', (check) => {
  expect(agreement(check).disagreements).toEqual([]);
});

group('describe', () => {
  it('does not mind the order', () => {
    fc.assert(
      fc.property(sample, (values) => {
        const one = describe(values);
        const reversed = describe([...values].reverse());
        if (one.kind !== 'description' || reversed.kind !== 'description') throw new Error('expected descriptions');
        expect(reversed.median).toBe(one.median);
        expect(reversed.quartiles).toEqual(one.quartiles);
        expect(reversed.mean).toBeCloseTo(one.mean, 10);
      }),
      { seed },
    );
  });

  it('keeps least, quartiles, median and greatest in order', () => {
    fc.assert(
      fc.property(sample, (values) => {
        const of = describe(values);
        if (of.kind !== 'description') throw new Error('expected a description');
        expect(of.least).toBeLessThanOrEqual(of.median);
        expect(of.median).toBeLessThanOrEqual(of.greatest);
        expect(of.mean).toBeGreaterThanOrEqual(of.least - 1e-12);
        expect(of.mean).toBeLessThanOrEqual(of.greatest + 1e-12);
        if (of.quartiles.kind === 'no-figure') return;
        expect(of.quartiles.value.lower).toBeLessThanOrEqual(of.median);
        expect(of.quartiles.value.upper).toBeGreaterThanOrEqual(of.median);
      }),
      { seed },
    );
  });

  it('does not change the skewness under shift and scale, and turns its sign with the data', () => {
    fc.assert(
      fc.property(fc.array(value, { minLength: 3, maxLength: 30 }), value, (values, shift) => {
        const one = describe(values);
        const moved = describe(values.map((x) => 4 * x + shift));
        const turned = describe(values.map((x) => -x));
        if (one.kind !== 'description' || moved.kind !== 'description' || turned.kind !== 'description')
          throw new Error('expected descriptions');
        if (one.skewness.kind === 'no-figure') return;
        expect(moved.skewness).toMatchObject({ value: expect.closeTo(one.skewness.value, 6) });
        expect(turned.skewness).toMatchObject({ value: expect.closeTo(-one.skewness.value, 10) });
      }),
      { seed },
    );
  });

  it('prints only what n allows', () => {
    expect(describe([])).toMatchObject({ kind: 'not-estimable', reason: 'no data' });
    expect(describe([0.4])).toMatchObject({
      n: 1,
      mean: 0.4,
      median: 0.4,
      sd: { kind: 'no-figure', reason: 'n = 1, SD not defined' },
      quartiles: { kind: 'no-figure' },
      skewness: { kind: 'no-figure' },
    });
    expect(describe([1, 2, 3, 4])).toMatchObject({ quartiles: { kind: 'no-figure' }, skewness: { kind: 'figure' } });
    expect(describe([1, 2, 3, 4, 5])).toMatchObject({
      quartiles: { kind: 'figure', value: { lower: 2, upper: 4 } },
      failedAssumptions: [],
    });
    expect(describe([0.1, 0.1, 0.1])).toMatchObject({
      mean: 0.1,
      sd: { kind: 'figure', value: 0 },
      skewness: { kind: 'no-figure', reason: 'all values equal' },
    });
    expect(describe([1, 1e301])).toMatchObject({ reason: 'values too large to compute with' });
  });

  it('counts what was not a number, with inability apart', () => {
    expect(describe([0.3, null, 'unable', 0.5, Infinity, 'unable', undefined])).toMatchObject({
      n: 2,
      mean: 0.4,
      leftOut: { missing: 2, nonFinite: 1, unable: 2 },
    });
  });

  it('leads with the median for ordered classes and for skewed values', () => {
    expect(describe([1, 2, 3, 4, 5])).toMatchObject({ leadWith: 'mean' });
    expect(describe([1, 2, 3, 4, 5], { ordinal: true })).toMatchObject({ leadWith: 'median' });
    expect(describe([1, 1, 1, 2, 50])).toMatchObject({ leadWith: 'median' });
  });

  it('describes numbers near the ends of what a double holds', () => {
    const tiny = describe([1e-300, 2e-300, 4e-300]);
    const plain = describe([1, 2, 4]);
    if (tiny.kind !== 'description' || plain.kind !== 'description') throw new Error('expected descriptions');
    if (tiny.skewness.kind !== 'figure' || plain.skewness.kind !== 'figure') throw new Error('expected skewness');
    expect(tiny.skewness.value).toBeCloseTo(plain.skewness.value, 12);
  });
});

group('describe on published tables', () => {
  // Edwards et al. (2022) Spinal Cord 60:522-532, PMC9209325, table 3 (the 15 rows that are printed in full): AIS grade, walking
  // speed (m/s), lower extremity motor score, WISCI II. Expected: worked out from the printed rows, sample SD.
  const rows: readonly (readonly [string, number | null, number, number])[] = [
    ['C', 0.18, 14, 12],
    ['C', 0.34, 19, 12],
    ['C', 0.41, 23, 19],
    ['D', 0.22, 37, 16],
    ['D', 0.43, 40, 19],
    ['D', 0.38, 28, 6],
    ['C', 0.16, 20, 9],
    ['D', 0.34, 22, 13],
    ['D', 0.26, 45, 12],
    ['C', 0.42, 26, 13],
    ['C', 0.09, 17, 6],
    ['D', null, 36, 8],
    ['C', 0.24, 7, 16],
    ['D', 0.3, 42, 19],
    ['C', 0.09, 11, 6],
  ];
  const column = (index: 1 | 2 | 3, grade?: string): (number | null)[] =>
    rows.filter((row) => grade === undefined || row[0] === grade).map((row) => row[index]);

  it.each([
    ['speed, AIS C', column(1, 'C'), 8, 0.2412, 0.1343, 0.21],
    ['speed, AIS D', column(1, 'D'), 6, 0.3217, 0.0776, 0.32],
    ['speed, all', column(1), 14, 0.2757, 0.1172, 0.28],
    ['lower extremity motor score, AIS C', column(2, 'C'), 8, 17.125, 6.266, 18],
    ['lower extremity motor score, AIS D', column(2, 'D'), 7, 35.714, 8.098, 37],
    ['WISCI II, AIS C', column(3, 'C'), 8, 11.625, 4.565, 12],
    ['WISCI II, AIS D', column(3, 'D'), 7, 13.286, 5.09, 13],
  ] as const)('gives %s of a trial of overground training', (_name, values, n, mean, sd, median) => {
    const of = describe(values);
    if (of.kind !== 'description' || of.sd.kind !== 'figure') throw new Error('expected a description');
    expect(of.n).toBe(n);
    // Half a unit of the last digit printed, and the mean of 0.2412(5) is printed cut, not rounded.
    expect(Math.abs(of.mean - mean)).toBeLessThan(0.00051);
    expect(Math.abs(of.sd.value - sd)).toBeLessThan(0.00051);
    expect(of.median).toBeCloseTo(median, 12);
  });

  it('counts the person without a speed as missing, not as 0', () => {
    expect(describe(column(1, 'D'))).toMatchObject({ n: 6, leftOut: { missing: 1 } });
  });

  // Gagnon et al. (2018) J Neuroeng Rehabil, doi 10.1186/s12984-018-0354-2: sessions attended by 13 completers, printed 17.6 (1.1).
  it('gives the attendance of a feasibility study, the drop-out left out', () => {
    const of = describe([18, 18, 18, 17, 14, 18, 18, 18, 18, 18, 18, 18, 18]);
    if (of.kind !== 'description' || of.sd.kind !== 'figure') throw new Error('expected a description');
    expect(of.mean).toBeCloseTo(17.615, 3);
    expect(of.sd.value).toBeCloseTo(1.121, 3);
  });

  // Clin Neurophysiol 2012;123:558-568, PMC3270316, table 1: months since injury printed 24.1 (15.2), age 31.1 (8.2). A population SD
  // would print 14.1 and 7.6.
  it('uses the sample SD, as a published table of seven people does', () => {
    for (const [values, mean, sd] of [
      [[38, 15, 21, 3, 18, 49, 25], 24.143, 15.214],
      [[30, 26, 27, 21, 45, 30, 39], 31.143, 8.194],
    ] as const) {
      const of = describe(values);
      if (of.kind !== 'description' || of.sd.kind !== 'figure') throw new Error('expected a description');
      expect(of.mean).toBeCloseTo(mean, 3);
      expect(of.sd.value).toBeCloseTo(sd, 3);
    }
  });
});

group('quantile', () => {
  it('lies between the values and leaves them as they were', () => {
    fc.assert(
      fc.property(sample, fc.double({ min: 0, max: 1, noNaN: true }), (values, p) => {
        const list = Float64Array.from(values);
        const found = quantile(list, p);
        expect(found).toBeGreaterThanOrEqual(Math.min(...values));
        expect(found).toBeLessThanOrEqual(Math.max(...values));
        expect([...list]).toEqual(values);
      }),
      { seed },
    );
  });

  it('refuses an empty list and a share that is none', () => {
    expect(() => quantile(new Float64Array(), 0.5)).toThrow(RangeError);
    expect(() => quantile(Float64Array.of(1), 50)).toThrow(RangeError);
    expect(() => quantile(Float64Array.of(1), NaN)).toThrow(RangeError);
  });
});

group('prefersRanks', () => {
  it('goes by the scale, or by few and skewed values', () => {
    expect(prefersRanks({ ordinal: true, n: 100, skewness: 0 })).toBe(true);
    expect(prefersRanks({ ordinal: false, n: 14, skewness: -1.2 })).toBe(true);
    expect(prefersRanks({ ordinal: false, n: 15, skewness: -1.2 })).toBe(false);
    expect(prefersRanks({ ordinal: false, n: 14, skewness: 0.9 })).toBe(false);
    expect(prefersRanks({ ordinal: false, n: 2 })).toBe(false);
  });
});
