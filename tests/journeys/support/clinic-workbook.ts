/** A clinic's month as one workbook: a sheet a table, dates as spreadsheets keep them, and names in the properties of the document. */
import { tableOf } from '../../../packages/dictionary/src/index.ts';
import { makeWorkbook } from '../../../packages/submission-files/src/test-support/make-workbook.ts';
import type { DraftCell } from '../../../packages/submission-files/src/test-support/make-workbook.ts';
import type { ClinicMonth } from './clinic-month.ts';
import type { ChosenFile } from './preparing.ts';

const dayLength = 86_400_000;
/** Day 1 of spreadsheets is 1 January 1900, and they count a 29 February 1900 (ECMA-376, part 1, 18.17.4.1). */
const dayZero = Date.UTC(1899, 11, 30);
/** The second style; number format 14 is a date (ECMA-376, part 1, 18.8.30). */
const styles = '<cellXfs><xf numFmtId="0"/><xf numFmtId="14"/></cellXfs>';

function cellOf(text: string): DraftCell {
  if (text === '') return null;
  const [, day, month, year] = /^(\d\d)\/(\d\d)\/(\d{4})$/.exec(text) ?? [];
  if (year !== undefined) {
    const serial = (Date.UTC(Number(year), Number(month) - 1, Number(day)) - dayZero) / dayLength;
    return { xml: `<c r="@" s="1"><v>${serial}</v></c>` };
  }
  return /^-?\d+(\.\d+)?$/.test(text) ? Number(text) : text;
}

export const author = 'Ottoline Verrasqua';

export function clinicWorkbook({ files }: ClinicMonth): ChosenFile {
  const bytes = makeWorkbook({
    sheets: files.map(({ table, rows }) => ({ name: tableOf(table).name, rows: rows.map((cells) => cells.map(cellOf)) })),
    styles,
    more: [
      {
        name: 'docProps/core.xml',
        content: `<cp:coreProperties xmlns:cp="http://schemas.openxmlformats.org/package/2006/metadata/core-properties" xmlns:dc="http://purl.org/dc/elements/1.1/"><dc:creator>${author}</dc:creator></cp:coreProperties>`,
      },
    ],
  });
  return {
    name: 'November of our clinic.xlsx',
    mimeType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
    buffer: Buffer.from(bytes),
  };
}
