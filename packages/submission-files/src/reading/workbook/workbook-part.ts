import type { ZipEntry } from '../../zip/zip-directory.ts';
import { UnreadableFile } from '../unreadable-file.ts';
import { isTrue } from './is-true.ts';
import { scanPart } from './scan-part.ts';

export interface ListedSheet {
  readonly name: string;
  /** Id of the relationship that leads to the sheet's part. */
  readonly relationship: string;
  readonly isHidden: boolean;
}

export interface WorkbookPart {
  readonly sheets: readonly ListedSheet[];
  /** Whether days are counted from 1904 instead of 1900. */
  readonly countsFrom1904: boolean;
}

/** The list of sheets, in the order of their tabs (ECMA-376-1, 18.2). */
export function readWorkbookPart(entry: ZipEntry, mostSheets: number): WorkbookPart {
  const sheets: ListedSheet[] = [];
  let countsFrom1904 = false;
  scanPart(entry, {
    open(name, attributes, depth) {
      if (depth === 2 && name === 'workbookPr') countsFrom1904 = isTrue(attributes.get('date1904'));
      if (depth !== 3 || name !== 'sheet') return;
      if (sheets.length === mostSheets) throw tooManySheets(mostSheets);
      sheets.push({
        name: attributes.get('name') ?? '',
        relationship: attributes.getPrefixed('id') ?? '',
        isHidden: (attributes.get('state') ?? 'visible') !== 'visible',
      });
    },
    text() {},
    close() {},
  });
  return { sheets, countsFrom1904 };
}

const tooManySheets = (most: number): UnreadableFile =>
  new UnreadableFile('F03', `The workbook has more than ${most} sheets.`, 'Send a workbook with nothing in it but the tables.', null);
