const daysInMonth = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/** Whether the day exists in the Gregorian calendar. Months count from 1. */
export function isCalendarDate(year: number, month: number, day: number): boolean {
  const isLeapYear = (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
  const last = month === 2 && isLeapYear ? 29 : (daysInMonth[month - 1] ?? 0);
  return day >= 1 && day <= last;
}
