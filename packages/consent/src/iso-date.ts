/** Calendar dates as text, "2026-01-15": they compare as text, and no time zone can shift them. */
export type IsoDate = string;

const pattern = /^(\d{4})-(\d{2})-(\d{2})$/;

/**
 * @returns the date as given
 * @throws RangeError when it is no calendar date written year-month-day
 */
export function requireIsoDate(text: string): IsoDate {
  const [, year, month, day] = pattern.exec(text) ?? [];
  if (year === undefined || dateOf(Number(year), Number(month), Number(day)) !== text) {
    throw new RangeError('A date is written year-month-day and exists in the calendar.');
  }
  return text;
}

/** The same day some whole months later, or the last day of a shorter month. */
export function addMonths(date: IsoDate, months: number): IsoDate {
  const [year, month, day] = partsOf(date);
  const lastDay = new Date(Date.UTC(year, month + months, 0)).getUTCDate();
  return dateOf(year, month + months, Math.min(day, lastDay));
}

/** Some whole days later, or earlier if negative. */
export function addDays(date: IsoDate, days: number): IsoDate {
  const [year, month, day] = partsOf(date);
  return dateOf(year, month, day + days);
}

function partsOf(date: IsoDate): [year: number, month: number, day: number] {
  const [year = 0, month = 0, day = 0] = requireIsoDate(date).split('-').map(Number);
  return [year, month, day];
}

/** Months and days beyond their limits run on into the next. */
function dateOf(year: number, month: number, day: number): IsoDate {
  return new Date(Date.UTC(year, month - 1, day)).toISOString().slice(0, 10);
}
