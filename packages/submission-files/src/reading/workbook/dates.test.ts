import { describe, expect, it } from 'vitest';
import { makeZip } from '../../test-support/make-zip.ts';
import { defaultWorkbookLimits } from '../../limits.ts';
import { readZipDirectory } from '../../zip/zip-directory.ts';
import { isDateFormat, readDateStyles } from './date-styles.ts';
import { serialDate } from './serial-date.ts';

describe('serialDate', () => {
  // ECMA-376-1, 18.17.4.1 and 18.17.4.3: dates and times in both systems.
  it.each([
    [1, false, '1900-01-01'],
    [59, false, '1900-02-28'],
    [61, false, '1900-03-01'],
    [3687.4207639, false, '1910-02-03T10:05:54'],
    [1.5, false, '1900-01-01T12:00:00'],
    [2_958_465.9999884, false, '9999-12-31T23:59:59'],
    [0, true, '1904-01-01'],
    [2225.4207639, true, '1910-02-03T10:05:54'],
    [2_957_003, true, '9999-12-31'],
    [0.5, false, '12:00:00'],
    [0.99999999, false, '1900-01-01'],
  ])('reads %d (from 1904: %s) as %s', (serial, countsFrom1904, date) => {
    expect(serialDate(serial, countsFrom1904)).toBe(date);
  });

  it.each([
    ['the 29th of February 1900, which never was', 60, false],
    ['a day before the first', -1, false],
    ['day 0 of 1900', 0, false],
    ['a day behind the last', 2_958_466, false],
    ['a day behind the last', 2_957_004, true],
    ['no number', Number.NaN, false],
  ])('takes %s for no day', (_, serial, countsFrom1904) => {
    expect(serialDate(serial, countsFrom1904)).toBeNull();
  });
});

describe('isDateFormat', () => {
  it.each(['yyyy\\-mm\\-dd', 'dd.mm.yy', '[$-407]d. mmmm yyyy', 'h:mm:ss AM/PM', '[h]:mm', '[mm]:ss', 'm/d/yy;@', '[Red]d', 'ss.000'])(
    'takes %s for a date or time',
    (code) => expect(isDateFormat(code)).toBe(true),
  );

  it.each(['General', '0.00', '#,##0.00 "days"', '0\\d', '[Red]0.0', '0.00E+00', '@', '_-* #,##0_-', '0" months"', '[>100]0', ''])(
    'takes %s for a number',
    (code) => expect(isDateFormat(code)).toBe(false),
  );

  it('answers a long hostile code at once', () => {
    expect(isDateFormat('['.repeat(100_000))).toBe(false);
    expect(isDateFormat('"'.repeat(99_999))).toBe(false);
  });
});

describe('readDateStyles', () => {
  it('knows built-in and own formats of cell styles, and leaves other styles out', () => {
    const styles = `<styleSheet><numFmts count="2"><numFmt numFmtId="164" formatCode="yyyy"/><numFmt numFmtId="165" formatCode="0.0"/></numFmts>
      <cellStyleXfs><xf numFmtId="14"/></cellStyleXfs>
      <cellXfs><xf numFmtId="0"/><xf numFmtId="14"/><xf numFmtId="164"/><xf numFmtId="165"/><xf/><xf numFmtId="49"/></cellXfs></styleSheet>`;
    const entry = readZipDirectory(makeZip([{ name: 's', content: styles }]), defaultWorkbookLimits).get('s');
    expect(readDateStyles(entry!)).toEqual([false, true, true, false, false, false]);
  });
});
