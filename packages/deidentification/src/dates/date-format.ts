/**
 * How the dates of one column are written. Numeric dates are never guessed cell by cell: 05/03/2024 is two different days.
 * `serial-1900` and `serial-1904` are the day numbers that spreadsheets store, counted from either of two origins.
 */
export const dateFormats = ['iso', 'day/month/year', 'month/day/year', 'day.month.year', 'serial-1900', 'serial-1904'] as const;
export type DateFormat = (typeof dateFormats)[number];

/** A calendar date as text, `2026-01-15`: such dates compare as text and no time zone can shift them. */
export type IsoDate = string;

export type DateProblem = 'not-a-date' | 'no-such-day' | 'two-digit-year' | 'universal-time' | 'outside-years';

export type ParsedDate = { readonly ok: true; readonly date: IsoDate } | { readonly ok: false; readonly problem: DateProblem };
