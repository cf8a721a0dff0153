/**
 * Rounding for display, once, from full precision. Halves go away from zero as the decimal reads: the number is first written with the
 * 15 significant digits a double keeps, so 1.005 rounds to 1.01, where `toFixed` gives 1.00.
 */

/** Most digits after the point that are ever shown. */
const mostDecimals = 15;

function requireDecimals(decimals: number): void {
  if (!(Number.isInteger(decimals) && decimals >= 0 && decimals <= mostDecimals)) {
    throw new RangeError('The number of decimals is a whole number from 0 to 15.');
  }
}

function requireFinite(value: number): void {
  if (!Number.isFinite(value)) throw new RangeError('Only a finite number can be shown.');
}

/** Digits before and after the point of a non-negative number, as its 15-digit decimal reads. */
function decimalDigits(value: number): { readonly whole: string; readonly fraction: string } {
  const [mantissa = '', exponent = '0'] = value.toExponential(14).split('e');
  const digits = mantissa.replace('.', '');
  const point = 1 + Number(exponent);
  if (point <= 0) return { whole: '0', fraction: '0'.repeat(-point) + digits };
  return { whole: digits.slice(0, point).padEnd(point, '0'), fraction: digits.slice(point) };
}

/** Adds one to the last of a run of digits. */
function increment(digits: string): string {
  const nines = /9*$/.exec(digits)?.[0].length ?? 0;
  const kept = digits.slice(0, digits.length - nines);
  if (kept === '') return `1${'0'.repeat(nines)}`;
  return kept.slice(0, -1) + String(Number(kept.at(-1)) + 1) + '0'.repeat(nines);
}

/** "0.50", "12", "-0.05"; never "-0.00". With a plain hyphen, for computing and for files. */
export function fixedDecimals(value: number, decimals: number): string {
  requireFinite(value);
  requireDecimals(decimals);
  const { whole, fraction } = decimalDigits(Math.abs(value));
  const kept = whole + fraction.slice(0, decimals).padEnd(decimals, '0');
  const digits = Number(fraction[decimals] ?? '0') >= 5 ? increment(kept) : kept;
  const text = decimals === 0 ? digits : `${digits.slice(0, -decimals)}.${digits.slice(-decimals)}`;
  return value < 0 && /[1-9]/.test(digits) ? `-${text}` : text;
}

/** The number itself, rounded as it is shown. */
export function roundHalfAwayFromZero(value: number, decimals: number): number {
  return Number(fixedDecimals(value, decimals));
}
