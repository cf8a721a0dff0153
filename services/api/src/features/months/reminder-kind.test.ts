import { describe, expect, it } from 'vitest';
import { reminderKind } from './reminder-kind.ts';

describe('the reminder that a day calls for', () => {
  // Due on 15 December 2026; the weekly ones by a calendar: 16, 23, 30 December, 6, 13 January.
  it.each([
    ['2026-12-09', null],
    ['2026-12-10', 'due'],
    ['2026-12-15', 'due'],
    ['2026-12-16', 'overdue-0'],
    ['2026-12-22', 'overdue-0'],
    ['2026-12-23', 'overdue-1'],
    ['2026-12-30', 'overdue-2'],
    ['2027-01-06', 'overdue-3'],
    ['2027-01-13', 'overdue-4'],
    ['2027-01-19', 'overdue-4'],
    ['2027-01-20', null],
    ['2028-12-16', null],
  ])('is on %s: %s', (today, kind) => {
    expect(reminderKind('2026-12-15', today)).toBe(kind);
  });
});
