import { describe, expect, it } from 'vitest';
import * as format from './format.ts';

const THIN = '\u202F';
const MINUS = '\u2212';

describe('numbers', () => {
  it('have a true minus sign and narrow spaces between thousands', () => {
    expect(format.formatNumber(-1234567.5, 1)).toBe(`${MINUS}1${THIN}234${THIN}567.5`);
  });

  it('round half away from zero on the decimal a reader would see', () => {
    // 1.005 is stored as 1.00499999999999989…; the SAMPL rounding rule speaks of the decimal.
    expect(format.formatNumber(1.005, 2)).toBe('1.01');
    expect(format.formatNumber(-2.5)).toBe(`${MINUS}3`);
  });

  it('never read minus zero', () => {
    expect(format.formatNumber(-0.04, 1)).toBe('0.0');
    expect(format.formatChange(-0.04, 1)).toBe('0.0');
  });

  it('show the sign of a change both ways', () => {
    expect(format.formatChange(0.12, 2)).toBe('+0.12');
    expect(format.formatChange(-0.12, 2)).toBe(`${MINUS}0.12`);
  });

  it('refuse what is no number instead of showing it', () => {
    expect(() => format.formatNumber(Number.NaN)).toThrow(RangeError);
    expect(() => format.formatNumber(Number.POSITIVE_INFINITY)).toThrow(RangeError);
    expect(format.formatNumber(0)).toBe('0');
  });

  it('stand with their unit on one line', () => {
    expect(format.formatQuantity(0.43, 'm/s', 2)).toBe('0.43\u00A0m/s');
    expect(format.formatQuantity(12, '1')).toBe('12');
  });

  it('name an interval with the decimals of its estimate', () => {
    expect(format.formatInterval({ lower: -0.05, upper: 0.333 }, 2)).toBe(`${MINUS}0.05 to 0.33`);
  });

  it('name a share by both its numbers', () => {
    expect(format.formatShare(1012, 4100)).toBe(`1${THIN}012 of 4${THIN}100`);
  });

  it('agree with the word they count', () => {
    expect(format.formatCount(1, 'row')).toBe('1 row');
    expect(format.formatCount(0, 'row')).toBe('0 rows');
    expect(format.formatCount(2, 'entry', 'entries')).toBe('2 entries');
  });
});

describe('p-values', () => {
  // The forms named in the SAMPL guidelines, Lang and Altman 2013.
  it.each([
    [0.03, 'p = 0.03'],
    [0.004, 'p = 0.004'],
    [0.0004, 'p < 0.001'],
    [0.234, 'p = 0.23'],
    [0.9951, 'p > 0.99'],
    [0.0996, 'p = 0.10'],
  ])('%f reads "%s"', (p, words) => {
    expect(format.formatPValue(p)).toBe(words);
  });

  it('refuse what cannot be one', () => {
    expect(() => format.formatPValue(1.2)).toThrow(RangeError);
    expect(() => format.formatPValue(Number.NaN)).toThrow(RangeError);
    expect(format.formatPValue(1)).toBe('p > 0.99');
  });
});

describe('sizes and times', () => {
  it('count bytes in decimal multiples', () => {
    expect(format.formatBytes(812)).toBe('812 bytes');
    expect(format.formatBytes(1_437_000)).toBe('1.4\u00A0MB');
    expect(format.formatBytes(999_960)).toBe('1.0\u00A0MB');
  });

  it('write months and days in words', () => {
    expect(format.formatMonth('2026-11')).toBe('November 2026');
    expect(format.formatDate('2026-11-03')).toBe('3 November 2026');
  });

  it('write an instant by the clock asked for', () => {
    expect(format.formatInstant('2026-11-03T23:05:00.000Z', 'UTC')).toBe('3 November 2026, 23:05');
    expect(format.formatInstant('2026-11-03T23:05:00.000Z', 'Europe/Oslo')).toBe('4 November 2026, 00:05');
    expect(format.formatInstantWithZone('2026-11-03T23:05:00.000Z', 'UTC')).toBe('3 November 2026, 23:05 UTC');
    expect(format.formatInstantWithZone('2026-11-03T23:05:00.000Z', 'Europe/Oslo')).toBe('4 November 2026, 00:05 CET');
    expect(format.formatTime('2026-11-03T23:05:00.000Z', 'Europe/Oslo')).toBe('00:05');
  });
});
