import type { TableKey } from '@cairnstep/dictionary';
import type { ReadLimits } from '../limits.ts';
import { HeaderNames } from '../table/header-names.ts';
import type { AsciiText } from './ascii-text.ts';
import { ByteDecoder } from './byte-decoder.ts';
import type { ByteSource } from './byte-source.ts';
import { countLineBreaks } from './count-line-breaks.ts';
import { detectDelimiter } from './detect-delimiter.ts';
import { gatherBytes } from './gather-bytes.ts';
import { RecordScanner } from './record-scanner.ts';
import type { OnRecord } from './record-scanner.ts';

/** Receives one record, as `OnRecord` does, and whether commas separate the cells of the file. */
export type OnCsvRecord = (...record: [...Parameters<OnRecord>, commaSeparated: boolean]) => void;

/**
 * Decodes a CSV file, finds its separator and gives each record to `onRecord`; stops behind each piece of the file.
 * @throws UnreadableFile where the file cannot be read any further.
 */
export async function* scanCsv(
  table: TableKey,
  source: ByteSource,
  limits: ReadLimits,
  onRecord: OnCsvRecord,
  readPlain: ((text: AsciiText, start: number, separator: number, line: number) => number) | null = null,
): AsyncGenerator<void> {
  const decoder = new ByteDecoder();
  let scanner: RecordScanner | null = null;
  for await (const { bytes, last } of gatherBytes(source, limits)) {
    const text = decoder.decode(bytes, last, (before) => scanner?.lineAfter(before) ?? 1 + countLineBreaks(before));
    if (!scanner) {
      const delimiter = detectDelimiter(text, new HeaderNames(table));
      const separator = delimiter.charCodeAt(0);
      scanner = new RecordScanner(
        delimiter,
        limits,
        (cells, count, line, strayQuote) => onRecord(cells, count, line, strayQuote, delimiter === ','),
        readPlain && ((whole, start, line) => readPlain(whole, start, separator, line)),
      );
    }
    scanner.push(text, last);
    yield;
  }
}
