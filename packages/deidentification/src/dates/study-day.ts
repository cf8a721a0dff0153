import type { IsoDate } from './date-format.ts';
import { parseDate } from './parse-date.ts';

const millisecondsPerDay = 86_400_000;

function midnight(date: IsoDate): number {
  const parsed = parseDate(date, 'iso');
  if (!parsed.ok || parsed.date !== date) throw new RangeError('a date is written year-month-day and exists in the calendar');
  return Date.parse(`${date}T00:00:00Z`);
}

/**
 * Whole days from one calendar date to another, by their midnights in universal time: a change of the clocks never makes 0 or 2 days of
 * one. The first training day is day 0, earlier days are negative.
 *
 * @throws RangeError when one of the dates is not written `2026-01-15` or does not exist
 */
export function studyDay(indexDate: IsoDate, date: IsoDate): number {
  return (midnight(date) - midnight(indexDate)) / millisecondsPerDay;
}
