import { detectCell } from './cells/detect-cell.ts';
import { columnTraits } from './column-traits.ts';
import type { Hit } from './hit.ts';

/** What a header would be if it stood in a cell: a file without a header row has its first person there. */
export const hitsInHeader = (header: string): Hit[] => detectCell(header, columnTraits('', 'text'));

/** More digits than column names need; a record number has as many. */
const manyDigits = /(?:\d[^\d]{0,3}){4}/;

/** The header, or null when it is empty or could be a person's name, date or number and is better not repeated. */
export function showableHeader(header: string): string | null {
  return header.trim() === '' || manyDigits.test(header.normalize('NFKC')) || hitsInHeader(header).length > 0 ? null : header;
}
