/** Calendar days as whole numbers (days since 1 January 1970, UTC) and months as text such as `2026-10`. */

const dayLength = 86_400_000;
const monthPattern = /^(20\d{2})-(0[1-9]|1[0-2])$/;

/** Months since January of the year 0. */
function monthNumber(month: string): number {
  const [, year, number] = monthPattern.exec(month) ?? [];
  if (year === undefined) throw new RangeError('a month is written as in 2026-10, in the years 2000 to 2099');
  return Number(year) * 12 + Number(number) - 1;
}

function monthText(number: number): string {
  return `${Math.floor(number / 12)}-${String((number % 12) + 1).padStart(2, '0')}`;
}

/** @throws RangeError when the text is not a month of the years 2000 to 2099. */
export function addMonths(month: string, count: number): string {
  return monthText(monthNumber(month) + count);
}

/** Whole months from one to the other. */
export function monthsBetween(from: string, to: string): number {
  return monthNumber(to) - monthNumber(from);
}

export function firstDayOf(month: string): number {
  const number = monthNumber(month);
  return Date.UTC(Math.floor(number / 12), number % 12, 1) / dayLength;
}

export function lastDayOf(month: string): number {
  return firstDayOf(addMonths(month, 1)) - 1;
}

export function monthOf(day: number): string {
  return new Date(day * dayLength).toISOString().slice(0, 7);
}

export function yearOf(day: number): number {
  return new Date(day * dayLength).getUTCFullYear();
}

/** 0 for Monday to 6 for Sunday. */
export function weekdayOf(day: number): number {
  return (((day + 3) % 7) + 7) % 7;
}

/** Whether the clinics are open: Monday to Friday, closed from 24 December to 1 January. */
export function isWorkingDay(day: number): boolean {
  if (weekdayOf(day) > 4) return false;
  const date = new Date(day * dayLength).toISOString().slice(5, 10);
  return date < '12-24' && date !== '01-01';
}

/** The day itself when the clinics are open, else the nearest open day before it. */
export function workingDayUpTo(day: number): number {
  let candidate = day;
  while (!isWorkingDay(candidate)) candidate -= 1;
  return candidate;
}

/** The day itself when the clinics are open, else the nearest open day after it. */
export function workingDayFrom(day: number): number {
  let candidate = day;
  while (!isWorkingDay(candidate)) candidate += 1;
  return candidate;
}
