/** From a file that was dropped to tables of text. */
import { readCsvText, readWorkbookSheets } from '@cairnstep/submission-files';
import type { CsvText, Delimiter, TextSheet, Unreadable } from '@cairnstep/submission-files';
import { bytesOfFile } from '../../lib/bytes-of-file.ts';
import type { Watch } from './serve.ts';

export type ReadFile =
  | { readonly ok: true; readonly kind: 'csv'; readonly csv: CsvText }
  | { readonly ok: true; readonly kind: 'workbook'; readonly sheets: readonly TextSheet[] }
  | Unreadable;

/** First bytes of a zip archive, and of the older form in which protected workbooks are kept too. */
const workbookMarks = [
  [0x50, 0x4b],
  [0xd0, 0xcf],
] as const;

/** The content decides what a file is, not its name. */
export async function readFile(file: File, watch: Watch, delimiter?: Delimiter): Promise<ReadFile> {
  try {
    const [first, second] = new Uint8Array(await file.slice(0, 2).arrayBuffer());
    const bytes = bytesOf(file, watch);
    if (workbookMarks.some((mark) => mark[0] === first && mark[1] === second)) {
      const read = await readWorkbookSheets(bytes);
      return read.ok ? { ok: true, kind: 'workbook', sheets: read.sheets } : read;
    }
    const csv = await readCsvText(bytes, delimiter);
    return csv.ok ? { ok: true, kind: 'csv', csv } : csv;
  } catch (error) {
    if (!(error instanceof DOMException)) throw error;
    const found = 'The browser could not read the file. It may have been changed, moved or deleted since it was chosen.';
    return { ok: false, rule: 'F01', found, mend: 'Choose the file again.', line: null };
  }
}

async function* bytesOf(file: File, watch: Watch): AsyncGenerator<Uint8Array> {
  let read = 0;
  for await (const piece of bytesOfFile(file)) {
    yield piece;
    read += piece.length;
    watch.tell({ what: `Reading ${file.name}`, bytes: { done: read, of: file.size } });
    await watch.pause();
  }
  watch.tell({ what: `Reading ${file.name}`, bytes: null });
}
