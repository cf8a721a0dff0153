import { describe, expect, it } from 'vitest';
import {
  addMonths,
  firstDayOf,
  isWorkingDay,
  lastDayOf,
  monthOf,
  monthsBetween,
  weekdayOf,
  workingDayFrom,
  workingDayUpTo,
  yearOf,
} from './calendar.ts';

describe('the calendar', () => {
  it('counts months across years', () => {
    expect(addMonths('2026-10', -23)).toBe('2024-11');
    expect(addMonths('2024-11', 24)).toBe('2026-11');
    expect(monthsBetween('2024-11', '2026-10')).toBe(23);
  });

  it('knows first and last days, leap years included', () => {
    expect(lastDayOf('2024-02') - firstDayOf('2024-02') + 1).toBe(29);
    expect(lastDayOf('2026-02') - firstDayOf('2026-02') + 1).toBe(28);
    expect(monthOf(lastDayOf('2026-02'))).toBe('2026-02');
    expect(monthOf(lastDayOf('2026-02') + 1)).toBe('2026-03');
    expect(yearOf(firstDayOf('2025-01') - 1)).toBe(2024);
  });

  it('knows weekdays', () => {
    // 1 January 1970 was a Thursday.
    expect(weekdayOf(0)).toBe(3);
    expect(weekdayOf(-4)).toBe(6);
  });

  it('closes the clinics at weekends and over the turn of the year', () => {
    const christmas = firstDayOf('2025-12') + 24;
    expect(isWorkingDay(christmas)).toBe(false);
    expect(isWorkingDay(firstDayOf('2026-01') + 1)).toBe(true);
    expect(monthOf(workingDayFrom(christmas))).toBe('2026-01');
    expect(workingDayUpTo(christmas)).toBe(firstDayOf('2025-12') + 22);
  });

  it('refuses what is not a month', () => {
    for (const text of ['2026-13', '2026-1', '1999-12', '2026-10-01', '']) expect(() => addMonths(text, 0)).toThrow(RangeError);
  });
});
