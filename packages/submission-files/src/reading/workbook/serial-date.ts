const millisecondsOfDay = 86_400_000;
const secondsOfDay = 86_400;
/** 31 December 9999, the last day of spreadsheets, counted from 1900. */
const lastSerial = 2_958_465;
/** From 1900 on, days are counted as if 29 February 1900 had existed. */
const dayThatNeverWas = 60;
const from1904 = 1_462;

const twoDigits = (value: number): string => String(value).padStart(2, '0');

function timeOf(seconds: number): string {
  return [seconds / 3_600, (seconds / 60) % 60, seconds % 60].map((part) => twoDigits(Math.floor(part))).join(':');
}

/**
 * The date or time that a spreadsheet shows for a number of days: `2026-03-05`, with a time `2026-03-05T09:30:00`, and
 * `09:30:00` for a part of a day only. Null for a number that stands for no day.
 * @param countsFrom1904 Whether day 0 is 1 January 1904; else day 1 is 1 January 1900 (ECMA-376-1, 18.17.4.1).
 */
export function serialDate(serial: number, countsFrom1904: boolean): string | null {
  let days = Math.floor(serial);
  let seconds = Math.round((serial - days) * secondsOfDay);
  if (seconds === secondsOfDay) {
    days += 1;
    seconds = 0;
  }
  if (!(serial >= 0)) return null;
  if (days === 0 && seconds > 0) return timeOf(seconds);
  const since1900 = countsFrom1904 ? days + from1904 : days;
  if (since1900 < 1 || since1900 > lastSerial || since1900 === dayThatNeverWas) return null;
  const origin = Date.UTC(1899, 11, since1900 < dayThatNeverWas ? 31 : 30);
  const date = new Date(origin + since1900 * millisecondsOfDay).toISOString().slice(0, 10);
  return seconds === 0 ? date : `${date}T${timeOf(seconds)}`;
}
