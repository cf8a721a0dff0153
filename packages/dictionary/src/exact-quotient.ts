/**
 * A decimal number written as text, times a fraction of whole numbers, as the nearest number that can be stored.
 * Multiplying in binary would leave traces: 1.2 × 0.44704 gives 0.5364479999999999 instead of 0.536448.
 *
 * @param text digits with an optional minus sign and decimal point, such as `-12.50`
 */
export function exactQuotient(text: string, times: number, dividedBy: number): number {
  const [whole = '', fraction = ''] = text.split('.');
  const numerator = BigInt(whole.replace('-', '') + fraction) * BigInt(times);
  const denominator = 10n ** BigInt(fraction.length) * BigInt(dividedBy);
  const size = Number(numerator) / Number(denominator);
  return text.startsWith('-') && size !== 0 ? -size : size;
}
