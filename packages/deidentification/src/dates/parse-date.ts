import type { DateFormat, DateProblem, ParsedDate } from './date-format.ts';
import { isCalendarDate } from './is-calendar-date.ts';

/** Nobody in training was born before, and no clinic's month lies after. */
const firstYear = 1900;
const lastYear = 2100;
const longestDate = 40;

const time = '(?:[ T,]{1,2}\\d{1,2}:\\d{2}(?::\\d{2}(?:[.,]\\d{1,9})?)?(?: ?[ap]\\.?m\\.?)?(Z|[+-]\\d{2}:?\\d{2})?)?';
const iso = new RegExp(`^(\\d{4})-(\\d{1,2})-(\\d{1,2})${time}$`, 'i');
const withSlashes = new RegExp(`^(\\d{1,2})([/-])(\\d{1,2})\\2(\\d{2}|\\d{4})${time}$`, 'i');
const withPoints = new RegExp(`^(\\d{1,2})\\. ?(\\d{1,2})\\. ?(\\d{2}|\\d{4})${time}$`, 'i');
const serial = /^(\d{1,6})(?:[.,]\d{1,15})?$/;

const refuse = (problem: DateProblem): ParsedDate => ({ ok: false, problem });
const pad = (number: number, digits: number): string => String(number).padStart(digits, '0');

function dateOf(year: string, month: string, day: string, zone: string | undefined): ParsedDate {
  if (year.length === 2) return refuse('two-digit-year');
  // A moment in universal time may fall on another day at the clinic. With an offset the day is the clinic's own.
  if (zone?.toUpperCase() === 'Z') return refuse('universal-time');
  const [y, m, d] = [Number(year), Number(month), Number(day)];
  if (!isCalendarDate(y, m, d)) return refuse('no-such-day');
  if (y < firstYear || y > lastYear) return refuse('outside-years');
  return { ok: true, date: `${pad(y, 4)}-${pad(m, 2)}-${pad(d, 2)}` };
}

const millisecondsPerDay = 86_400_000;
/** Day 0 of each count. The older one holds a 29 February 1900 that never was, as its day 60. */
const origins = { 'serial-1900': Date.UTC(1899, 11, 30), 'serial-1904': Date.UTC(1904, 0, 1) } as const;
const dayThatNeverWas = 60;

function dateOfSerial(day: number, format: keyof typeof origins): ParsedDate {
  const shift = format === 'serial-1900' && day < dayThatNeverWas ? 1 : 0;
  if (format === 'serial-1900' && (day === 0 || day === dayThatNeverWas)) return refuse('no-such-day');
  const [year = '', month = '', rest = ''] = new Date(origins[format] + (day + shift) * millisecondsPerDay).toISOString().split('-');
  return dateOf(year, month, rest.slice(0, 2), undefined);
}

/**
 * A date as the clinic wrote it, in the format stated for its column. A time of day beside it is passed over. Two-digit years are refused,
 * because a birth and a session would need different centuries.
 */
export function parseDate(text: string, format: DateFormat): ParsedDate {
  const cell = text.normalize('NFKC').trim();
  if (cell.length > longestDate) return refuse('not-a-date');
  switch (format) {
    case 'iso': {
      const [, year, month, day, zone] = iso.exec(cell) ?? [];
      return year && month && day ? dateOf(year, month, day, zone) : refuse('not-a-date');
    }
    case 'day/month/year':
    case 'month/day/year': {
      const [, one, , other, year, zone] = withSlashes.exec(cell) ?? [];
      if (!one || !other || !year) return refuse('not-a-date');
      return format === 'day/month/year' ? dateOf(year, other, one, zone) : dateOf(year, one, other, zone);
    }
    case 'day.month.year': {
      const [, day, month, year, zone] = withPoints.exec(cell) ?? [];
      return day && month && year ? dateOf(year, month, day, zone) : refuse('not-a-date');
    }
    case 'serial-1900':
    case 'serial-1904': {
      const [, day] = serial.exec(cell) ?? [];
      return day === undefined ? refuse('not-a-date') : dateOfSerial(Number(day), format);
    }
  }
}
