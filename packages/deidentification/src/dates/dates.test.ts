import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { studyDayVectors } from '../../reference/pseudonym-vectors.ts';
import { ageOn, revealsTopAge, topCodedAge } from './age.ts';
import type { DateFormat } from './date-format.ts';
import { fittingFormats } from './fitting-formats.ts';
import { parseDate } from './parse-date.ts';
import { studyDay } from './study-day.ts';

const read = (text: string, format: DateFormat) => {
  const parsed = parseDate(text, format);
  return parsed.ok ? parsed.date : parsed.problem;
};

describe('study days', () => {
  it.each(studyDayVectors)('count from $indexDate to $date: $says', ({ indexDate, date, studyDay: expected }) => {
    expect(studyDay(indexDate, date)).toBe(expected);
  });

  it('add up, whatever the time zone of the machine', () => {
    const day = fc.integer({ min: -20_000, max: 40_000 });
    const dateOn = (days: number) => new Date(days * 86_400_000).toISOString().slice(0, 10);
    fc.assert(
      fc.property(day, day, (from, to) => {
        expect(studyDay(dateOn(from), dateOn(to))).toBe(to - from);
      }),
      { seed: 20261202, numRuns: 300 },
    );
  });

  it.each(['2024-02-30', '2024-2-3', '03/04/2024', '2024-01-01T00:00', ''])('are refused for "%s"', (date) => {
    expect(() => studyDay('2024-01-01', date)).toThrow(RangeError);
  });
});

describe('dates as clinics write them', () => {
  it.each([
    ['2024-03-05', 'iso', '2024-03-05'],
    ['2024-03-05 14:30', 'iso', '2024-03-05'],
    ['2024-03-05T23:30:00+01:00', 'iso', '2024-03-05'],
    ['2024-03-05T23:30:00Z', 'iso', 'universal-time'],
    ['05/03/2024', 'day/month/year', '2024-03-05'],
    ['05/03/2024', 'month/day/year', '2024-05-03'],
    ['5-3-2024 9:05 am', 'day/month/year', '2024-03-05'],
    ['31/12/2024', 'month/day/year', 'no-such-day'],
    ['5.3.2024', 'day.month.year', '2024-03-05'],
    ['05. 03. 2024', 'day.month.year', '2024-03-05'],
    ['5/3/24', 'day/month/year', 'two-digit-year'],
    ['5.3.24', 'day.month.year', 'two-digit-year'],
    ['29/02/2023', 'day/month/year', 'no-such-day'],
    ['2024-03-05', 'day/month/year', 'not-a-date'],
    ['0001-01-01', 'iso', 'outside-years'],
    ['2024-03-05x', 'iso', 'not-a-date'],
    ['９', 'iso', 'not-a-date'],
    [`${' '.repeat(50_000)}1`, 'iso', 'not-a-date'],
    ['1'.repeat(50_000), 'serial-1900', 'not-a-date'],
    // ISO/IEC 29500-1, 18.17.4: 1 January 1900 is day 1 in the 1900 base; day 0 is 1 January 1904 in the 1904 base.
    ['1', 'serial-1900', '1900-01-01'],
    ['59', 'serial-1900', '1900-02-28'],
    ['60', 'serial-1900', 'no-such-day'],
    ['61', 'serial-1900', '1900-03-01'],
    ['45356', 'serial-1900', '2024-03-05'],
    ['45356.604', 'serial-1900', '2024-03-05'],
    ['0', 'serial-1904', '1904-01-01'],
    ['43894', 'serial-1904', '2024-03-05'],
    ['999999', 'serial-1900', 'outside-years'],
  ] as const)('reads "%s" as %s: %s', (text, format, expected) => {
    expect(read(text, format)).toBe(expected);
  });

  it('says which formats a whole column could have', () => {
    expect(fittingFormats(['05/03/2024', '', '13/03/2024'])).toEqual(['day/month/year']);
    expect(fittingFormats(['03/13/2024'])).toEqual(['month/day/year']);
    expect(fittingFormats(['05/03/2024', '06/03/2024'])).toEqual(['day/month/year', 'month/day/year']);
    expect(fittingFormats(['45356', '45358'])).toEqual(['serial-1900', 'serial-1904']);
    expect(fittingFormats(['2024-03-05', '05/03/2024'])).toEqual([]);
    expect(fittingFormats(['', ' '])).toEqual([]);
  });
});

describe('ages', () => {
  it('are whole years, from birthday to birthday', () => {
    expect(ageOn('1950-06-15', '2024-06-14')).toBe(73);
    expect(ageOn('1950-06-15', '2024-06-15')).toBe(74);
    expect(ageOn('2000-02-29', '2023-02-28')).toBe(22);
    expect(ageOn('2000-02-29', '2023-03-01')).toBe(23);
    expect(() => ageOn('2024-06-15', '2024-06-14')).toThrow(RangeError);
  });

  it('of 90 and more become one class', () => {
    expect([89, 90, 101].map(topCodedAge)).toEqual([89, 90, 90]);
  });

  it('are told by a study day as well', () => {
    // 45 CFR 164.514(b)(2)(i)(C) covers every element that indicates such an age.
    expect(revealsTopAge(80, 3_652)).toBe(false);
    expect(revealsTopAge(80, 3_653)).toBe(true);
    expect(revealsTopAge(90, -1)).toBe(false);
    expect(revealsTopAge(90, 0)).toBe(true);
  });
});
