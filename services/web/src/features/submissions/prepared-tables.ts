/** What the preparing page hands over, looked at once more before it leaves: codes and numbers under headers of the dictionary, no more. */
import { tableOf } from '@cairnstep/dictionary';
import { isCleanCsv } from '../../preparing/messages.ts';
import type { PreparedTable } from '../../preparing/messages.ts';

const lineEnd = '\r\n';
/** Longer than all headers of any table together. */
const longestHeader = 20_000;

function headersOf(csv: ArrayBuffer): readonly string[] {
  const start = new TextDecoder().decode(csv.slice(0, longestHeader));
  return (start.split(lineEnd, 1)[0] ?? '').split(',');
}

/** Why a table must not be sent, without a word of what it holds; `null` when it may. */
export function faultOf({ table, csv }: PreparedTable): string | null {
  const { name, variables } = tableOf(table);
  if (!isClean(csv)) return `The table ${name.toLowerCase()} holds something other than codes and numbers.`;
  const headers = headersOf(csv);
  const known = new Set(variables.map(({ key }) => key));
  if (new Set(headers).size !== headers.length || !headers.every((header) => known.has(header)))
    return `The table ${name.toLowerCase()} has a column that the dictionary does not know.`;
  return null;
}

function isClean(csv: ArrayBuffer): boolean {
  try {
    return isCleanCsv(csv);
  } catch {
    // Bytes that are no UTF-8.
    return false;
  }
}
