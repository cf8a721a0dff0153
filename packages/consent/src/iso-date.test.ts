import { describe, expect, it } from 'vitest';
import { addDays, addMonths, requireIsoDate } from './iso-date.ts';

describe('dates', () => {
  it('adds months, to the last day where the month is shorter', () => {
    expect(addMonths('2026-01-15', 12)).toBe('2027-01-15');
    expect(addMonths('2026-01-31', 1)).toBe('2026-02-28');
    expect(addMonths('2027-12-31', 2)).toBe('2028-02-29');
  });

  it('adds days across months and years', () => {
    expect(addDays('2026-03-01', -1)).toBe('2026-02-28');
    expect(addDays('2025-12-31', 1)).toBe('2026-01-01');
  });

  it('refuses what is no date', () => {
    expect(requireIsoDate('2028-02-29')).toBe('2028-02-29');
    for (const text of ['2026-02-29', '2026-13-01', '26-01-01', '2026-1-1', '']) expect(() => requireIsoDate(text)).toThrow(RangeError);
  });
});
