/**
 * CSV files as text, for the preparation of a month at the site: whose headers are the clinic's own, so that the separator cannot be found
 * by the names of columns.
 */
import { defaultLimits } from '../limits.ts';
import type { ReadLimits } from '../limits.ts';
import { TextRows } from '../table/text-rows.ts';
import { ByteDecoder } from './byte-decoder.ts';
import type { Encoding } from './byte-decoder.ts';
import type { ByteSource } from './byte-source.ts';
import { countLineBreaks } from './count-line-breaks.ts';
import { fittingDelimiters } from './fitting-delimiters.ts';
import type { Delimiter } from './detect-delimiter.ts';
import { gatherBytes } from './gather-bytes.ts';
import { RecordScanner } from './record-scanner.ts';
import { unreadable } from './unreadable.ts';
import type { Unreadable } from './unreadable.ts';
import { UnreadableFile } from './unreadable-file.ts';

export interface CsvText {
  readonly ok: true;
  readonly headers: readonly string[];
  readonly rows: readonly (readonly string[])[];
  /** Line of the file on which each row begins. */
  readonly lines: readonly number[];
  /** Rows above the column names, which were passed over. */
  readonly rowsAbove: number;
  readonly encoding: Encoding;
  readonly delimiter: Delimiter;
  /** Separators under which the file is a table too, the likeliest first; with more than one somebody should look. */
  readonly fittingDelimiters: readonly Delimiter[];
}

/** @param delimiter Where somebody said what separates the cells; else it is found from the beginning of the file. */
export async function readCsvText(
  source: ByteSource,
  delimiter?: Delimiter,
  limits: ReadLimits = defaultLimits,
): Promise<CsvText | Unreadable> {
  const decoder = new ByteDecoder();
  const table = new TextRows(limits.rows, 'file');
  let fitting: readonly Delimiter[] = [];
  let chosen: Delimiter = ',';
  let scanner: RecordScanner | null = null;

  function take(cells: readonly string[], count: number, line: number, strayQuote: boolean): void {
    if (strayQuote)
      throw new UnreadableFile('F04', 'Text follows a closing quotation mark.', 'Write two marks where a cell itself contains one.', line);
    table.add(cells, count, line);
  }

  try {
    for await (const { bytes, last } of gatherBytes(source, limits)) {
      const text = decoder.decode(bytes, last, (before) => scanner?.lineAfter(before) ?? 1 + countLineBreaks(before));
      if (scanner === null) {
        fitting = fittingDelimiters(text);
        chosen = delimiter ?? fitting[0] ?? ',';
        scanner = new RecordScanner(chosen, limits, take);
      }
      scanner.push(text, last);
    }
    table.end();
    if (table.headers.length === 0) throw new UnreadableFile('F05', 'The file is empty.', 'Begin with a row of column names.', null);
  } catch (error) {
    return unreadable(error);
  }
  const { headers, rows, lines, rowsAbove } = table;
  return { ok: true, headers, rows, lines, rowsAbove, encoding: decoder.encoding, delimiter: chosen, fittingDelimiters: fitting };
}
