import { UnreadableFile } from '../reading/unreadable-file.ts';

/**
 * The workbook cannot be trusted any further.
 * @param detail What is wrong, as a sentence about the workbook.
 */
export function damaged(detail: string, line: number | null = null): UnreadableFile {
  return new UnreadableFile(
    'F41',
    `The workbook is damaged. ${detail}`,
    'Open the workbook in your spreadsheet program, save it again as XLSX and send that file.',
    line,
  );
}
