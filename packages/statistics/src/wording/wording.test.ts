import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { welchTest } from '../means/welch.ts';
import { comparisonText } from './comparison-text.ts';
import {
  basisText,
  estimateText,
  intervalText,
  meanSdText,
  medianQuartilesText,
  numberText,
  percentOfText,
  rangeText,
  shareText,
  statisticText,
  summaryDecimals,
} from './number-text.ts';
import { pValueText } from './p-value-text.ts';
import { fixedDecimals, roundHalfAwayFromZero } from './rounding.ts';

const seed = 20240608;

describe('fixedDecimals', () => {
  it.each([
    [1.005, 2, '1.01'],
    [-1.005, 2, '-1.01'],
    [0.285, 2, '0.29'],
    [2.5, 0, '3'],
    [-2.5, 0, '-3'],
    [0.5, 0, '1'],
    [0.05, 1, '0.1'],
    [9.995, 2, '10.00'],
    [99.5, 0, '100'],
    [0.1 + 0.2, 2, '0.30'],
    [-0.001, 2, '0.00'],
    [-0, 1, '0.0'],
    [0, 0, '0'],
    [1e-300, 3, '0.000'],
    [5e-324, 15, '0.000000000000000'],
    [1e21, 1, '1000000000000000000000.0'],
    [123456.789, 1, '123456.8'],
    [0.00049999, 3, '0.000'],
    [0.0005, 3, '0.001'],
  ])('writes %d with %d decimals as %s', (value, decimals, text) => {
    expect(fixedDecimals(value, decimals)).toBe(text);
  });

  it('rounds every decimal ending in 5 away from zero', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 10_000_000 }), fc.integer({ min: 0, max: 5 }), fc.boolean(), (whole, decimals, negative) => {
        const digits = String(whole).padStart(decimals + 1, '0');
        const point = digits.length - decimals;
        // The decimal "…d5" with one digit more than asked for, as a double.
        const value = Number(`${negative ? '-' : ''}${digits.slice(0, point)}.${digits.slice(point)}5`);
        const up = String(whole + 1).padStart(decimals + 1, '0');
        const expected = decimals === 0 ? up : `${up.slice(0, -decimals)}.${up.slice(-decimals)}`;
        expect(fixedDecimals(value, decimals)).toBe(negative ? `-${expected}` : expected);
      }),
      { seed },
    );
  });

  it('is within half a unit of the last digit', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.integer({ min: 0, max: 6 }), (value, decimals) => {
        const rounded = roundHalfAwayFromZero(value, decimals);
        expect(Math.abs(rounded - value)).toBeLessThanOrEqual(0.5 * 10 ** -decimals * (1 + 1e-6) + Math.abs(value) * 1e-14);
        expect(fixedDecimals(-value, decimals).replace('-', '')).toBe(fixedDecimals(value, decimals).replace('-', ''));
      }),
      { seed },
    );
  });

  it('refuses what cannot be shown', () => {
    for (const value of [NaN, Infinity, -Infinity]) expect(() => fixedDecimals(value, 2)).toThrow(RangeError);
    for (const decimals of [-1, 1.5, 16, NaN]) expect(() => fixedDecimals(1, decimals)).toThrow(RangeError);
  });
});

describe('pValueText', () => {
  it.each([
    [0.03, 'p = 0.03'],
    [0.004, 'p = 0.004'],
    [0.0345, 'p = 0.035'],
    [0.0499, 'p = 0.05'],
    [0.0996, 'p = 0.10'],
    [0.1, 'p = 0.10'],
    [0.2449, 'p = 0.24'],
    [0.99, 'p = 0.99'],
    [0.991, 'p > 0.99'],
    [1, 'p > 0.99'],
    [0.001, 'p = 0.001'],
    [0.00099, 'p < 0.001'],
    [0, 'p < 0.001'],
    [5e-324, 'p < 0.001'],
  ])('writes %d as %s', (p, text) => {
    expect(pValueText(p)).toBe(text);
  });

  it('refuses what is no probability', () => {
    for (const p of [-0.1, 1.1, NaN]) expect(() => pValueText(p)).toThrow(RangeError);
  });
});

describe('figures in words', () => {
  it('are written as the guidelines have them', () => {
    expect(numberText(-0.05, 2)).toBe('−0.05');
    expect(summaryDecimals(1)).toBe(2);
    expect(meanSdText(0.4312, 0.1249, 2)).toBe('0.43 (SD 0.12)');
    expect(medianQuartilesText(0.21, { lower: 0.098, upper: 0.345 }, 2)).toBe('0.21 (Q1 to Q3: 0.10 to 0.35)');
    expect(rangeText(0.05, 0.33, 2)).toBe('0.05 to 0.33');
    expect(rangeText(1.2, Infinity, 1)).toBe('1.2 to unlimited');
    expect(intervalText({ lower: -0.05, upper: 0.33, level: 0.95 }, 2)).toBe('95% CI −0.05 to 0.33');
    expect(intervalText({ lower: 1, upper: 2, level: 0.998 }, 0)).toBe('99.8% CI 1 to 2');
    expect(estimateText(0.19, { lower: 0.05, upper: 0.33, level: 0.95 }, 2)).toBe('0.19 (95% CI 0.05 to 0.33)');
  });

  it('never give a share without its count', () => {
    expect(shareText(12, 41)).toBe('12 of 41 (29%)');
    expect(shareText(0, 20)).toBe('0 of 20 (0%)');
    expect(shareText(3, 3)).toBe('3 of 3 (100%)');
    expect(shareText(0, 0)).toBe('0 of 0');
    expect(() => shareText(5, 4)).toThrow(RangeError);
    expect(() => shareText(1.5, 4)).toThrow(RangeError);
    expect(() => shareText(-1, 4)).toThrow(RangeError);
  });

  // Kirshblum et al. (2021) J Neurotrauma 38:1267-1284, doi 10.1089/neu.2020.7473, table 6: counts of AIS grades after one year and the
  // percents printed beside them. One row of the same table (Marino 1999, grade C) prints 25.1 for 40 of 159, which is 25.16.
  it.each([
    [[2, 7, 21, 79, 0], 109, ['1.8', '6.4', '19.3', '72.5', '0.0']],
    [[0, 0, 0, 123, 0], 123, ['0.0', '0.0', '0.0', '100.0', '0.0']],
  ] as const)('give the percents of a published conversion table', (counts, total, printed) => {
    expect(counts.map((count) => percentOfText(count, total))).toEqual(printed.map((text) => `${text}%`));
  });

  it('do not repeat a misprint of that table', () => {
    expect(percentOfText(40, 159)).toBe('25.2%');
  });

  it('say what a figure was computed from', () => {
    expect(basisText(41, { missing: 6, nonFinite: 0, unable: 2 })).toBe('n = 41, 6 missing, 2 unable');
    expect(basisText(3, { missing: 0, nonFinite: 1, unable: 0 })).toBe('n = 3, 1 not a number');
    expect(basisText(9, { missing: 0, nonFinite: 0, unable: 0 })).toBe('n = 9');
  });

  it('give test statistics with their degrees of freedom', () => {
    const test = (statisticName: 't' | 'F' | 'V' | 'U' | 'chi-square' | 'z', statistic: number, df: number[] = []) => ({
      statisticName,
      statistic,
      df,
      p: 0.5,
    });
    expect(statisticText(test('t', -1.86081346748685, [17.7764735161785]))).toBe('t(17.8) = −1.86');
    expect(statisticText(test('t', 2.2084, [29]))).toBe('t(29) = 2.21');
    expect(statisticText(test('F', 4.846, [2, 27]))).toBe('F(2, 27) = 4.85');
    expect(statisticText(test('F', 36.0654, [5, 30.0426]))).toBe('F(5, 30.0) = 36.07');
    expect(statisticText(test('chi-square', 29.2666, [4]))).toBe('χ²(4) = 29.27');
    expect(statisticText(test('z', -3.844))).toBe('z = −3.84');
    expect(statisticText(test('V', 40))).toBe('V = 40');
    expect(statisticText(test('U', 127.5))).toBe('U = 127.5');
  });
});

describe('comparisonText', () => {
  it('neither claims a cause nor that there is no difference', () => {
    const apart = welchTest([1.2, 1.4, 1.3, 1.5, 1.1], [0.2, 0.4, 0.3, 0.5, 0.1]);
    const close = welchTest([1.2, 1.4, 1.3, 1.5, 1.1], [1.3, 1.4, 1.2, 1.6, 1.2]);
    if (apart.kind === 'not-estimable' || close.kind === 'not-estimable') throw new Error('expected estimates');
    expect(comparisonText('groups', apart, 2, 'm/s')).toBe('groups differ by 1.00 m/s (95% CI 0.77 to 1.23)');
    expect(comparisonText('groups', close, 2, 'm/s')).toBe('no difference was shown; the 95% CI runs from −0.28 to 0.20 m/s');
    expect(comparisonText('groups', close, 2)).toBe('no difference was shown; the 95% CI runs from −0.28 to 0.20');
  });
});
