/** The template as a site could send it: below each example row one row of the same month, written as a spreadsheet program would. */
import { exampleRow, tableKeys, tableOf } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { unzipSync, strFromU8, strToU8, zipSync } from 'fflate';
import { writeTemplate } from '../src/index.ts';
import { columnLetters } from '../src/table/header-row.ts';
import { whole } from '../src/test-support/workbook-parts-of.ts';
import { escapeXml } from '../src/writing/workbook/escape-xml.ts';

/** Numbers with zeros in front, a code of the registry, and text that looks like a formula or a date: none may change. */
export const participants = ['S00000000000000000000Z', '0042', '=1+1', '1-2'];

function rowXml(table: TableKey): string {
  const example = exampleRow(table);
  const cells = tableOf(table).variables.map(({ key }, position) => {
    const place = `${columnLetters(position)}3`;
    const value = example[key];
    if (value === undefined) return '';
    if (typeof value === 'number') return `<c r="${place}"><v>${value}</v></c>`;
    return `<c r="${place}" t="inlineStr"><is><t>${escapeXml(value)}</t></is></c>`;
  });
  return `<row r="3">${cells.join('')}</row>`;
}

/** The sheets of the tables follow the first one, in the dictionary's order. */
const partOf = (table: TableKey): string => `xl/worksheets/sheet${tableKeys.indexOf(table) + 2}.xml`;

export async function filledTemplate(): Promise<Uint8Array> {
  const parts = unzipSync(await whole(writeTemplate({ site: 'Harbour Clinic', month: '2026-11', participants })));
  for (const table of tableKeys) {
    const sheet = strFromU8(parts[partOf(table)] ?? new Uint8Array(0));
    parts[partOf(table)] = strToU8(sheet.replace('</sheetData>', `${rowXml(table)}</sheetData>`));
  }
  return zipSync(parts);
}
