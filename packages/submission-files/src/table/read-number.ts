/**
 * Reads a decimal number from a cell, with the exact factor of its unit applied.
 *
 * Grammar: optional sign, digits, optionally one decimal mark and digits (`12`, `-3.5`, `.5`, `1,25`). No thousands
 * marks, no exponents, no units. Returns the number, or why there is none.
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

/** Powers of ten that a double holds exactly, as far as they are needed. */
const powersOfTen = Array.from({ length: 16 }, (_, exponent) => 10 ** exponent);

export interface ReadNumber {
  value: number;
  /** The decimal mark that was found: 0 for none, else its character code. */
  mark: number;
}

/**
 * @param into Receives the number and the mark; used again from call to call, so that reading a cell allocates nothing.
 * @returns null when a number was read.
 */
export function readNumber(text: string, factor: UnitFactor, into: ReadNumber): NotANumber | null {
  let at = 0;
  const first = text.charCodeAt(0);
  const negative = first === MINUS || first === TRUE_MINUS;
  if (negative || first === PLUS) at = 1;

  // Digits collect in a whole number, so that one correctly rounded division gives the nearest double.
  let digits = 0;
  let significant = 0;
  let decimals = -1;
  let mark = 0;
  let seen = false;
  for (; at < text.length; at += 1) {
    const character = text.charCodeAt(at);
    if (character >= ZERO && character <= NINE) {
      seen = true;
      digits = digits * 10 + (character - ZERO);
      if (digits > 0) significant += 1;
      if (decimals >= 0) decimals += 1;
    } else if ((character === POINT || character === COMMA) && mark === 0) {
      mark = character;
      decimals = 0;
    } else return 'not-a-number';
  }
  if (!seen || decimals === 0) return 'not-a-number';
  if (significant > 15 || decimals > 15) return 'too-many-digits';
  const scale = powersOfTen[Math.max(decimals, 0)] ?? 1;
  const value = (digits * factor.times) / (scale * factor.dividedBy);
  into.value = negative && value !== 0 ? -value : value;
  into.mark = mark;
  return null;
}
