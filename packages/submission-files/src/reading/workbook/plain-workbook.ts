/**
 * A workbook written again from what is read of it. What nobody reads is gone: the author's name and folder, comments,
 * images, formulas, headers of pages, texts on the template's own sheets and on sheets that are no tables, and whatever else a
 * program puts beside the cells.
 */
import { defaultWorkbookLimits } from '../../limits.ts';
import type { WorkbookLimits } from '../../limits.ts';
import { escapeXml } from '../../writing/workbook/escape-xml.ts';
import { joined } from '../../zip/joined.ts';
import { writeZip } from '../../zip/write-zip.ts';
import type { ZipPart } from '../../zip/write-zip.ts';
import { unreadable } from '../unreadable.ts';
import type { Unreadable } from '../unreadable.ts';
import { CellDetector } from './cell-detector.ts';
import { openWorkbook } from './open-workbook.ts';
import type { OpenWorkbook, SheetPart } from './open-workbook.ts';
import { scanPart, scanPieces } from './scan-part.ts';
import { SheetCopy } from './sheet-copy.ts';
import { meaningOfSheet } from './sheet-names.ts';
import { SheetReader } from './sheet-reader.ts';

export interface PlainWorkbook {
  readonly ok: true;
  readonly bytes: Uint8Array;
}

const head = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n';
const spreadsheet = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const officeDocument = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const packaging = 'http://schemas.openxmlformats.org/package/2006';
const typeOf = (kind: string): string => `application/vnd.openxmlformats-officedocument.spreadsheetml.${kind}+xml`;

/** Stands in for the cells of a sheet that is no table, so that it is still found to be one. */
const something = '<sheetData><row r="1"><c r="A1" t="inlineStr"><is><t>-</t></is></c></row></sheetData>';
const nothing = '<sheetData/>';

/**
 * Reading it gives the same tables and findings, in the same places, as reading the workbook itself. Refuses whatever
 * cannot be read to its end: what is no workbook in XLSX form, is protected, holds macros, is damaged or beyond the limits.
 *
 * @param pause Called every so often, so that others get their turn.
 */
export async function plainWorkbook(
  bytes: Uint8Array,
  limits: WorkbookLimits = defaultWorkbookLimits,
  pause: () => Promise<unknown> = () => Promise.resolve(),
): Promise<PlainWorkbook | Unreadable> {
  try {
    const pieces: Uint8Array[] = [];
    for await (const piece of writeZip(parts(openWorkbook(bytes, limits), limits, pause))) pieces.push(piece);
    return { ok: true, bytes: joined(pieces) };
  } catch (error) {
    return unreadable(error);
  }
}

function* parts({ sheets, surroundings }: OpenWorkbook, limits: WorkbookLimits, pause: () => Promise<unknown>): Generator<ZipPart> {
  const listed = sheets.map(({ name, isHidden }, index) => {
    // The name of a sheet that is no table may be somebody's.
    const shown = meaningOfSheet(name) === null ? `Sheet ${index + 1}` : name;
    return `<sheet name="${escapeXml(shown)}" sheetId="${index + 1}"${isHidden ? ' state="hidden"' : ''} r:id="rId${index + 1}"/>`;
  });
  const numbers = sheets.map((_, index) => index + 1);
  yield { name: '[Content_Types].xml', content: [head, contentTypes(numbers)] };
  yield { name: '_rels/.rels', content: [head, relationships([['officeDocument', 'xl/workbook.xml']])] };
  yield {
    name: 'xl/workbook.xml',
    content: [head, `<workbook xmlns="${spreadsheet}" xmlns:r="${officeDocument}"><sheets>${listed.join('')}</sheets></workbook>`],
  };
  yield {
    name: 'xl/_rels/workbook.xml.rels',
    content: [head, relationships(numbers.map((number) => ['worksheet', `worksheets/sheet${number}.xml`]))],
  };
  for (const [index, sheet] of sheets.entries())
    yield { name: `xl/worksheets/sheet${index + 1}.xml`, content: sheetXml(sheet, surroundings, limits, pause) };
}

async function* sheetXml(
  { name, entry }: SheetPart,
  surroundings: OpenWorkbook['surroundings'],
  limits: WorkbookLimits,
  pause: () => Promise<unknown>,
): AsyncGenerator<string> {
  yield `${head}<worksheet xmlns="${spreadsheet}">`;
  const meaning = meaningOfSheet(name);
  if (meaning === 'other') yield nothing;
  else if (meaning === null) {
    const detector = new CellDetector();
    scanPart(entry, detector);
    yield detector.isDone ? something : nothing;
  } else {
    const copy = new SheetCopy();
    for (const _ of scanPieces(entry, new SheetReader(surroundings, limits, copy))) {
      yield copy.take();
      await pause();
    }
    yield copy.end();
  }
  yield '</worksheet>';
}

function relationships(targets: readonly (readonly [kind: string, target: string])[]): string {
  const listed = targets.map(
    ([kind, target], index) => `<Relationship Id="rId${index + 1}" Type="${officeDocument}/${kind}" Target="${target}"/>`,
  );
  return `<Relationships xmlns="${packaging}/relationships">${listed.join('')}</Relationships>`;
}

function contentTypes(sheets: readonly number[]): string {
  const listed = sheets.map((number) => `<Override PartName="/xl/worksheets/sheet${number}.xml" ContentType="${typeOf('worksheet')}"/>`);
  return `<Types xmlns="${packaging}/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Override PartName="/xl/workbook.xml" ContentType="${typeOf('sheet.main')}"/>${listed.join('')}</Types>`;
}
