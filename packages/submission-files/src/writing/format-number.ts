/**
 * A stored number as a file writes it: shortest digits that read back as the same number, decimal point, no exponent
 * and no marks between thousands.
 * @throws RangeError for a number that is not finite.
 */
export function formatNumber(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError('only finite numbers can be written');
  const text = String(value);
  // Below 1e-6 and from 1e21 on JavaScript writes an exponent.
  if (!text.includes('e')) return text;
  const [, sign = '', whole = '', fraction = '', exponent = ''] = /^(-?)(\d)(?:\.(\d+))?e([+-]\d+)$/.exec(text) ?? [];
  const digits = whole + fraction;
  const shift = Number(exponent);
  return shift < 0 ? `${sign}0.${'0'.repeat(-shift - 1)}${digits}` : `${sign}${digits.padEnd(shift + 1, '0')}`;
}
