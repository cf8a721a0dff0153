/**
 * Reads a decimal number from a cell, with the exact factor of its unit applied.
 *
 * Grammar: optional sign, digits, optionally one decimal mark and digits (`12`, `-3.5`, `.5`, `1,25`). No thousands
 * marks, no exponents, no units. The dictionary's own parser reads one cell at a time into an object and with big
 * integers; this one reads the millions of cells of a month without allocating. `cell-readers.test.ts` holds both
 * against each other.
 */
import type { UnitFactor } from './header-names.ts';

export type NotANumber = 'not-a-number' | 'too-many-digits';

const ZERO = 48;
const NINE = 57;
const PLUS = 43;
const MINUS = 45;
const POINT = 46;
const COMMA = 44;
const TRUE_MINUS = 0x2212;

/** So many digits fit exactly into a double, whatever they are, and so many powers of ten. */
const exactDigits = 15;
const powersOfTen = Array.from({ length: exactDigits + 1 }, (_, exponent) => 10 ** exponent);
/** No measurement has as many; longer ones are not worth the arithmetic. */
const longestNumber = 40;

export interface ReadNumber {
  value: number;
  /** Character code of the decimal mark; 0 for none. */
  mark: number;
}

/**
 * @param into Receives the number and the mark; used again from call to call.
 * @returns null when a number was read, else why there is none.
 */
export function readNumber(text: string, factor: UnitFactor, into: ReadNumber): NotANumber | null {
  const first = text.charCodeAt(0);
  const isNegative = first === MINUS || first === TRUE_MINUS;
  const start = isNegative || first === PLUS ? 1 : 0;

  // Digits collect in a whole number, so that one correctly rounded division gives the nearest double.
  let digits = 0;
  let significant = 0;
  let decimals = -1;
  let mark = 0;
  for (let at = start; at < text.length; at += 1) {
    const character = text.charCodeAt(at);
    if (character >= ZERO && character <= NINE) {
      digits = digits * 10 + (character - ZERO);
      if (digits > 0) significant += 1;
      if (decimals >= 0) decimals += 1;
    } else if ((character === POINT || character === COMMA) && mark === 0) {
      mark = character;
      decimals = 0;
    } else return 'not-a-number';
  }
  const lastCharacter = text.charCodeAt(text.length - 1);
  if (text.length === start || lastCharacter === mark) return 'not-a-number';
  if (text.length > longestNumber) return 'too-many-digits';

  const isExact = significant <= exactDigits && decimals <= exactDigits;
  const size = isExact
    ? (digits * factor.times) / ((powersOfTen[Math.max(decimals, 0)] ?? 1) * factor.dividedBy)
    : (Number(text.slice(start).replace(',', '.')) * factor.times) / factor.dividedBy;
  into.value = isNegative && size !== 0 ? -size : size;
  into.mark = mark;
  return null;
}

/**
 * The same for a number that stands in a larger text of ASCII and has at most 15 digits, of which at least one before a decimal point.
 * @returns whether there is such a number.
 */
export function readPlainNumber(bytes: Uint8Array, from: number, to: number, factor: UnitFactor, into: ReadNumber): boolean {
  const isNegative = bytes[from] === MINUS;
  const start = isNegative ? from + 1 : from;
  if (to === start || to - start > exactDigits) return false;
  let digits = 0;
  let point = -1;
  for (let at = start; at < to; at += 1) {
    const character = bytes[at] ?? 0;
    if (character >= ZERO && character <= NINE) digits = digits * 10 + (character - ZERO);
    else if (character === POINT && point < 0) point = at;
    else return false;
  }
  if (point === start || point === to - 1) return false;
  const decimals = point < 0 ? 0 : to - point - 1;
  const size = (digits * factor.times) / ((powersOfTen[decimals] ?? 1) * factor.dividedBy);
  into.value = isNegative && size !== 0 ? -size : size;
  into.mark = point < 0 ? 0 : POINT;
  return true;
}
