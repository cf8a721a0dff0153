/**
 * Numbers and times as the screens write them: a true minus sign, narrow spaces between thousands, intervals as
 * "a to b" with the decimals of their estimate.
 */

const THIN_SPACE = '\u202F';
const MINUS = '\u2212';

/**
 * `decimals` digits after the point, always. Rounds half away from zero on the 15-significant-digit decimal, so that
 * 1.005 with two decimals reads 1.01, and -0.4 with none reads 0.
 */
export function formatNumber(value: number, decimals = 0): string {
  if (!Number.isFinite(value)) throw new RangeError('Only finite numbers can be shown');
  const format = new Intl.NumberFormat('en', {
    minimumFractionDigits: decimals,
    maximumFractionDigits: decimals,
    roundingMode: 'halfExpand',
    signDisplay: 'negative',
  });
  return format
    .formatToParts(value.toPrecision(15) as Intl.StringNumericLiteral)
    .map(({ type, value: text }) => (type === 'group' ? THIN_SPACE : type === 'minusSign' ? MINUS : text))
    .join('');
}

/** A change: its sign is shown both ways, so "no sign" never has to be guessed at. */
export function formatChange(value: number, decimals: number): string {
  const text = formatNumber(value, decimals);
  return text.startsWith(MINUS) || !/[1-9]/.test(text) ? text : `+${text}`;
}

/** "0.05 to 0.33" */
export function formatInterval(interval: { readonly lower: number; readonly upper: number }, decimals: number): string {
  return `${formatNumber(interval.lower, decimals)} to ${formatNumber(interval.upper, decimals)}`;
}

/** "12 of 41"; never a bare percentage. */
export function formatShare(part: number, whole: number): string {
  return `${formatNumber(part)} of ${formatNumber(whole)}`;
}

/** "0.43 m/s"; a unit of '' or '1' has no name to show. */
export function formatQuantity(value: number, unit: string, decimals = 0): string {
  const number = formatNumber(value, decimals);
  return unit === '' || unit === '1' ? number : `${number}\u00A0${unit}`;
}

/** "1 row", "12 rows" */
export function formatCount(count: number, one: string, many = `${one}s`): string {
  return `${formatNumber(count)} ${count === 1 ? one : many}`;
}

/** Three decimals below 0.10 (as few as needed), two from 0.10 up; "p < 0.001", "p > 0.99" at the ends. */
export function formatPValue(p: number): string {
  if (!(p >= 0 && p <= 1)) throw new RangeError('A p-value lies between 0 and 1');
  if (p < 0.001) return 'p < 0.001';
  if (p > 0.99) return 'p > 0.99';
  if (p >= 0.1) return `p = ${formatNumber(p, 2)}`;
  return `p = ${formatNumber(p, 3).replace(/(\.\d\d)0$/, '$1')}`;
}

/** Decimal multiples, as file managers count them: "812 bytes", "1.4 MB". */
export function formatBytes(bytes: number): string {
  if (bytes < 1000) return formatCount(bytes, 'byte');
  const unit = bytes < 999_950 ? { size: 1e3, name: 'kB' } : bytes < 999_950_000 ? { size: 1e6, name: 'MB' } : { size: 1e9, name: 'GB' };
  return formatQuantity(bytes / unit.size, unit.name, 1);
}

/** "2026-11" as "November 2026" */
export function formatMonth(month: string): string {
  return inWords(new Date(`${month}-01T00:00:00Z`), { month: 'long', year: 'numeric' }, 'UTC');
}

/** "2026-11-03" as "3 November 2026" */
export function formatDate(date: string): string {
  return inWords(new Date(`${date.slice(0, 10)}T00:00:00Z`), { day: 'numeric', month: 'long', year: 'numeric' }, 'UTC');
}

/** An instant by the reader's own clock: "3 November 2026, 14:05". */
export function formatInstant(instant: string, timeZone?: string): string {
  const day = inWords(new Date(instant), { day: 'numeric', month: 'long', year: 'numeric' }, timeZone);
  return `${day}, ${formatTime(instant, timeZone)}`;
}

/** For what is printed and kept, where the reader's clock is not at hand: "3 November 2026, 14:05 CET". */
export function formatInstantWithZone(instant: string, timeZone?: string): string {
  const zone = new Intl.DateTimeFormat('en-GB', { timeZoneName: 'short', ...(timeZone !== undefined && { timeZone }) })
    .formatToParts(new Date(instant))
    .find(({ type }) => type === 'timeZoneName');
  return `${formatInstant(instant, timeZone)} ${zone?.value ?? ''}`;
}

/** The time alone: "14:05". */
export function formatTime(instant: string, timeZone?: string): string {
  return inWords(new Date(instant), { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' }, timeZone);
}

function inWords(at: Date, parts: Intl.DateTimeFormatOptions, timeZone: string | undefined): string {
  return new Intl.DateTimeFormat('en-GB', { ...parts, ...(timeZone !== undefined && { timeZone }) }).format(at);
}
