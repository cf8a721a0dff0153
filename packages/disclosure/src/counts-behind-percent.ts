/**
 * The counts that a printed percentage of n people can stand for. One possibility gives the count back, so the percentage of a hidden
 * count is hidden too.
 *
 * @param percent as printed @param decimals digits printed after the point
 * @throws RangeError for an n that is no whole number from 1, or a percentage outside 0 to 100
 */
export function countsBehindPercent(n: number, percent: number, decimals: number): number[] {
  if (!Number.isSafeInteger(n) || n < 1) throw new RangeError('A percentage is of a whole number of people from 1.');
  if (!(percent >= 0 && percent <= 100)) throw new RangeError('A percentage lies between 0 and 100.');
  const scale = 10 ** decimals;
  const printed = Math.round(percent * scale);
  // Compared in whole units of the last place: 100 · count · scale / n lies within half a unit of what is printed.
  const rounds = (count: number) => Math.abs(2 * (100 * count * scale - printed * n)) <= n;
  const around = Math.round((percent * n) / 100);
  const reach = Math.ceil(n / (100 * scale)) + 1;
  return Array.from({ length: 2 * reach + 1 }, (_, at) => around - reach + at).filter((count) => count >= 0 && count <= n && rounds(count));
}
