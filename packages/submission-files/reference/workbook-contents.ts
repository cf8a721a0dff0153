/** Everything in a workbook that its users would miss, as text that can be compared. */
import { defaultWorkbookLimits } from '../src/limits.ts';
import { openWorkbook } from '../src/reading/workbook/open-workbook.ts';
import type { SheetPart } from '../src/reading/workbook/open-workbook.ts';
import { relationshipsOf } from '../src/reading/workbook/package-parts.ts';
import { scanPart } from '../src/reading/workbook/scan-part.ts';
import { SheetReader } from '../src/reading/workbook/sheet-reader.ts';
import type { SheetSurroundings } from '../src/reading/workbook/sheet-reader.ts';
import { columnLetters } from '../src/table/header-row.ts';
import { elements } from '../src/test-support/workbook-parts-of.ts';
import { decodeEntities } from '../src/xml/decode-entities.ts';
import { unpack } from '../src/zip/unpack.ts';
import { readZipDirectory } from '../src/zip/zip-directory.ts';
import type { ZipDirectory, ZipEntry } from '../src/zip/zip-directory.ts';

const limits = defaultWorkbookLimits;

export interface SheetContents {
  readonly name: string;
  readonly isHidden: boolean;
  /** `B2 number 0.5` */
  readonly cells: readonly string[];
  /** What each validation allows and says. Its last row is left out: programs cut ranges off behind the rows in use. */
  readonly validations: readonly string[];
  /** Columns whose cells are formatted as text, whether something stands in them or not. */
  readonly textColumns: readonly number[];
  readonly notes: readonly string[];
  readonly links: readonly string[];
}

export function workbookContents(bytes: Uint8Array): readonly SheetContents[] {
  const directory = readZipDirectory(bytes, limits);
  const { sheets, surroundings } = openWorkbook(bytes, limits);
  const main = relationshipsOf(directory, '').find(({ kind }) => kind === 'officeDocument')?.path ?? '';
  const styles = textOf(directory.get(relationshipsOf(directory, main).find(({ kind }) => kind === 'styles')?.path ?? ''));
  return sheets.map((sheet) => {
    const xml = textOf(sheet.entry);
    return {
      name: sheet.name,
      isHidden: sheet.isHidden,
      cells: cellsOf(sheet, surroundings),
      validations: validationsOf(xml),
      textColumns: textColumnsOf(xml, styles),
      notes: notesOf(sheet, directory),
      links: elements(xml, 'hyperlink').map(({ ref, location = '' }) => `${ref} ${location.replaceAll('&apos;', "'")}`),
    };
  });
}

function textOf(entry: ZipEntry | undefined): string {
  const decoder = new TextDecoder();
  const pieces = entry ? [...unpack(entry)].map((piece) => decoder.decode(piece, { stream: true })) : [];
  return pieces.join('');
}

function cellsOf({ entry }: SheetPart, surroundings: SheetSurroundings): string[] {
  const cells: string[] = [];
  const reader = new SheetReader(surroundings, limits, {
    row: (texts, kinds, count, line) =>
      texts.slice(0, count).forEach((text, position) => {
        if (text !== '') cells.push(`${columnLetters(position)}${line} ${kinds[position]} ${text}`);
      }),
    hiddenColumns() {},
    merged() {},
    image() {},
  });
  scanPart(entry, reader);
  return cells;
}

function validationsOf(xml: string): string[] {
  const yes = (value = '0'): boolean => value === '1' || value === 'true';
  const found = [...xml.matchAll(/<dataValidation (.*?)(?:\/>|>(.*?)<\/dataValidation>)/g)].map(([, attributes = '', formulas = '']) => {
    const [given = {}] = elements(`<a ${attributes}>`, 'a');
    const { type = 'none', operator = 'between', sqref = '', promptTitle = '', prompt = '', errorTitle = '', error = '' } = given;
    const [, first = '', second = ''] = /<formula1>(.*?)<\/formula1>(?:<formula2>(.*?)<\/formula2>)?/.exec(formulas) ?? [];
    const limitsOfNumbers = type === 'list' ? first : `${operator} ${first} ${second}`;
    const refuses = yes(given['showErrorMessage']) ? `refuses ${errorTitle} ${error}` : 'refuses nothing';
    const says = yes(given['showInputMessage']) ? `says ${promptTitle} ${prompt}` : 'says nothing';
    return [sqref.split(':')[0], type, ...(type === 'none' ? [] : [limitsOfNumbers, refuses]), says].join(' | ').replaceAll('&apos;', "'");
  });
  return found.sort();
}

function textColumnsOf(xml: string, styles: string): number[] {
  const cellStyles = /<cellXfs.*?<\/cellXfs>/s.exec(styles)?.[0] ?? '';
  const ownText = elements(styles, 'numFmt').flatMap(({ numFmtId, formatCode }) => (formatCode === '@' ? [numFmtId] : []));
  const areText = elements(cellStyles, 'xf').map(({ numFmtId }) => numFmtId === '49' || ownText.includes(numFmtId));
  return elements(xml, 'col').flatMap(({ min, max, style = '0' }) =>
    areText[Number(style)] ? Array.from({ length: Number(max) - Number(min) + 1 }, (_, index) => Number(min) + index) : [],
  );
}

function notesOf({ entry }: SheetPart, directory: ZipDirectory): string[] {
  const notes = relationshipsOf(directory, entry.name).find(({ kind }) => kind === 'comments');
  const xml = textOf(directory.get(notes?.path.toLowerCase() ?? ''));
  return [...xml.matchAll(/<comment [^>]*?ref="(\w+)".*?>(.*?)<\/comment>/gs)].map(
    ([, cell, content = '']) =>
      `${cell} ${[...content.matchAll(/<t(?: [^>]*)?>(.*?)<\/t>/gs)].map(([, text = '']) => decodeEntities(text)).join('')}`,
  );
}
