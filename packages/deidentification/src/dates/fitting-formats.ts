import { dateFormats } from './date-format.ts';
import type { DateFormat } from './date-format.ts';
import { parseDate } from './parse-date.ts';

/**
 * The formats in which every filled cell of a column is a date. With more than one somebody has to say which it is; a column of day
 * numbers always has both origins.
 */
export function fittingFormats(cells: readonly string[]): DateFormat[] {
  const filled = cells.filter((cell) => cell.trim() !== '');
  if (filled.length === 0) return [];
  return dateFormats.filter((format) => filled.every((cell) => parseDate(cell, format).ok));
}
