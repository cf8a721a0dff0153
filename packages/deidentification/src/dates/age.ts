import type { IsoDate } from './date-format.ts';
import { studyDay } from './study-day.ts';

/** 45 CFR 164.514(b)(2)(i)(C): ages over 89 become one class. The dictionary writes it as 90. */
export const topAge = 90;
const daysPerYear = 365.25;

/**
 * Age in completed years. Somebody born on 29 February comes of age on 1 March of other years.
 *
 * @throws RangeError when a date is malformed, or the birth lies after the date
 */
export function ageOn(birthDate: IsoDate, date: IsoDate): number {
  if (studyDay(birthDate, date) < 0) throw new RangeError('the birth lies after the date');
  const years = Number(date.slice(0, 4)) - Number(birthDate.slice(0, 4));
  return date.slice(5) < birthDate.slice(5) ? years - 1 : years;
}

/** The age as it may leave the site. */
export function topCodedAge(years: number): number {
  return Math.min(years, topAge);
}

/**
 * Whether an age on the first training day, together with a study day, tells that somebody was 90 or more: who is 80 on day 0 is 90 on
 * day 3653. The age on day 0 then has to be 90 as well.
 */
export function revealsTopAge(ageAtIndex: number, day: number): boolean {
  return ageAtIndex + day / daysPerYear >= topAge;
}
