/**
 * A stored number as a file writes it: shortest digits that read back as the same number, decimal point, no exponent
 * and no marks between thousands.
 * @throws RangeError for a number that is not finite.
 */
export function formatNumber(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError('only finite numbers can be written');
  const text = String(value);
  if (!text.includes('e')) return text;
  // Below 1e-6 and from 1e21 on JavaScript writes exponents; no column of the registry has room for either, unit conversions may.
  return value.toFixed(20).replace(/\.?0+$/, '');
}
