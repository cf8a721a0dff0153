import type { CleanTable } from './month.ts';

const lineEnd = '\r\n';

/**
 * The text that is sent: comma separated, CRLF line ends, to be encoded as UTF-8. No cell needs quotation marks, because codes and numbers
 * of the dictionary hold neither commas nor marks.
 *
 * @throws RangeError when a cell would need them, which no prepared table has
 */
export function cleanCsv({ headers, rows }: Pick<CleanTable, 'headers' | 'rows'>): string {
  const line = (cells: readonly string[]): string => {
    if (cells.some((cell) => /[",\r\n]/.test(cell))) throw new RangeError('a cell holds a separator or a quotation mark');
    return cells.join(',') + lineEnd;
  };
  return line(headers) + rows.map(line).join('');
}
