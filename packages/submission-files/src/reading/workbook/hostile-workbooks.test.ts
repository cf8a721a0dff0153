import { zipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { defaultWorkbookLimits } from '../../limits.ts';
import type { WorkbookLimits } from '../../limits.ts';
import { makeWorkbook, sheetXml, workbookParts } from '../../test-support/make-workbook.ts';
import type { WorkbookDraft } from '../../test-support/make-workbook.ts';
import { makeZip } from '../../test-support/make-zip.ts';
import type { ZipDraft } from '../../test-support/make-zip.ts';
import { readPlaces } from '../../test-support/read-places.ts';
import { readZipDirectory } from '../../zip/zip-directory.ts';
import { scanPieces } from './scan-part.ts';
import { SheetReader } from './sheet-reader.ts';

const encode = (text: string): Uint8Array => new TextEncoder().encode(text);
const good: WorkbookDraft = { sheets: [{ name: 'bouts', rows: [['bout_no'], [1]] }] };

const places = async (bytes: Uint8Array, limits?: WorkbookLimits): Promise<readonly string[]> => (await readPlaces(bytes, limits)).places;
const wording = async (bytes: Uint8Array): Promise<string | undefined> => (await readPlaces(bytes)).findings[0]?.found;

/** The parts of a good workbook with one of them replaced or added. */
const spoiled = (part: ZipDraft, draft = good): Uint8Array =>
  makeZip([...workbookParts(draft).filter(({ name }) => name !== part.name), part]);
const withSheet = (xml: string): Uint8Array => makeWorkbook({ sheets: [{ name: 'bouts', xml }] });
const withRows = (rows: string): Uint8Array => withSheet(`<worksheet><sheetData>${rows}</sheetData></worksheet>`);
const header = '<row r="1"><c r="A1" t="str"><v>bout_no</v></c></row>';

describe('F40 (what is no plain workbook)', () => {
  it('passes a plain one', async () => {
    expect(await places(makeWorkbook(good))).toEqual([]);
  });

  /** The beginning of a compound file and the name of a stream in its directory (MS-CFB, 2.2 and 2.6.1). */
  const compoundFile = (stream: string): Uint8Array =>
    Uint8Array.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, ...Array(1_016).fill(0), ...Buffer.from(stream, 'utf16le'), 0, 0]);

  it.each([
    ['a workbook with a password', compoundFile('EncryptedPackage'), 'The workbook is protected by a password.'],
    [
      'an old workbook',
      compoundFile('Workbook'),
      'The file is a workbook or document in an old binary format, not a workbook in XLSX form.',
    ],
    ['a CSV file', encode('bout_no\n1\n'), 'The file is text or of an unknown kind, not a workbook in XLSX form.'],
    ['a web page', encode('<html></html>'), 'The file is a web page or XML document, not a workbook in XLSX form.'],
    ['an image', Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a), 'The file is an image, not a workbook in XLSX form.'],
    ['an empty file', new Uint8Array(0), 'The file is empty.'],
    ['an archive of images', zipSync({ 'scan-1.png': Uint8Array.of(0x89, 0x50) }), 'The file is a zip archive that holds no workbook.'],
    [
      'a spreadsheet in another form',
      zipSync({ mimetype: encode('application/vnd.oasis'), 'content.xml': encode('<a/>') }),
      'The file is a spreadsheet or document in another form, such as ODS.',
    ],
    [
      'a document',
      spoiled({ name: 'xl/workbook.xml', content: '<document><body/></document>' }),
      'The file is a document or presentation, not a workbook.',
    ],
    ['a macro program', spoiled({ name: 'xl/vbaProject.bin', content: 'x' }), 'The workbook holds macros or is of a kind that may.'],
    [
      'a macro program under another name',
      makeWorkbook({ ...good, contentTypes: '<Override PartName="/xl/a.dat" ContentType="application/vnd.ms-office.vbaProject"/>' }),
      'The workbook holds macros or is of a kind that may.',
    ],
    [
      'a workbook of the kind that may hold macros',
      makeWorkbook({
        ...good,
        contentTypes: '<Override PartName="/xl/workbook.xml" ContentType="application/vnd.ms-excel.sheet.macroEnabled.main+xml"/>',
      }),
      'The workbook holds macros or is of a kind that may.',
    ],
  ])('refuses %s and says what it is', async (_, bytes, found) => {
    expect(await places(bytes)).toEqual(['F40 workbook - -']);
    expect(await wording(bytes)).toBe(found);
  });
});

describe('F41 (what is damaged or put together to do harm)', () => {
  const tag = (text: string): string => `<row r="2"><c r="A2" t="str"><v>${text}</v></c></row>`;

  it.each([
    ['a document type', withSheet(`<!DOCTYPE worksheet><worksheet><sheetData>${header}</sheetData></worksheet>`)],
    [
      'entities that grow',
      withSheet(`<!DOCTYPE lolz [<!ENTITY a "lol"><!ENTITY b "&a;&a;&a;&a;">]><worksheet><sheetData>${tag('&b;')}</sheetData></worksheet>`),
    ],
    ['a sheet that ends in its middle', withSheet(`<worksheet><sheetData>${header}`)],
    ['a byte that is no UTF-8', spoiled({ name: 'xl/worksheets/sheet1.xml', content: Uint8Array.of(0x3c, 0x61, 0x3e, 0xff) })],
    ['an entity nobody declared', withRows(header + tag('&copyright;'))],
    ['rows in the wrong order', withRows('<row r="5"/><row r="4"/>')],
    ['a row below the last', withRows('<row r="1048577"/>')],
    ['a cell in no column', withRows('<row r="1"><c r="1"><v>1</v></c></row>')],
    ['two cells in one place', withRows('<row r="1"><c r="A1"><v>1</v></c><c r="A1"><v>2</v></c></row>')],
    ['a number that is none', withRows('<row r="1"><c r="A1"><v>0x10</v></c></row>')],
    ['a number without end', withRows('<row r="1"><c r="A1"><v>1e999</v></c></row>')],
    ['a text that is not there', withRows('<row r="1"><c r="A1" t="s"><v>0</v></c></row>')],
    [
      'a text whose number is a name',
      makeWorkbook({ sheets: [{ name: 'bouts', rows: [[{ xml: '<c r="@" t="s"><v>length</v></c>' }]] }], sharedStrings: '<si/>' }),
    ],
    ['a cell of an unknown kind', withRows('<row r="1"><c r="A1" t="x"><v>1</v></c></row>')],
    [
      'columns in the wrong order',
      withSheet('<worksheet><cols><col min="2" max="2"/><col min="1" max="3" hidden="1"/></cols><sheetData/></worksheet>'),
    ],
    [
      'merged cells without a place',
      withSheet(`<worksheet><sheetData>${header}</sheetData><mergeCells><mergeCell ref="all"/></mergeCells></worksheet>`),
    ],
  ])('refuses %s', async (_, bytes) => {
    expect((await places(bytes)).map((place) => place.split(' ').slice(0, 2).join(' '))).toEqual(['F41 bouts']);
  });

  it('says in which row a sheet breaks off', async () => {
    const found = await readPlaces(withRows(`${header}<row r="2"><c r="A2"><v>1</v></c></row><row r="3"><c r="A3"><v>1</b></row>`));
    expect([found.places, found.tables.bouts?.length]).toEqual([['F41 bouts 3 -'], 1]);
  });

  const relationships = (...targets: readonly string[]): ZipDraft => ({
    name: 'xl/_rels/workbook.xml.rels',
    content: `<Relationships>${targets.map((target, index) => `<Relationship Id="rId${index + 1}" Type="x/worksheet" ${target}/>`).join('')}</Relationships>`,
  });

  it.each([
    ['a sheet whose part is missing', spoiled(relationships('Target="worksheets/sheet7.xml"'))],
    ['a sheet that is elsewhere', spoiled(relationships('Target="http://clinic.example/sheet1.xml" TargetMode="External"'))],
    ['a sheet that leads out of the archive', spoiled(relationships('Target="../../../etc/passwd"'))],
    [
      'one sheet under two names',
      spoiled(relationships('Target="worksheets/sheet1.xml"', 'Target="worksheets/sheet1.xml"'), {
        sheets: [{ name: 'bouts' }, { name: 'sessions' }],
      }),
    ],
    ['a part with a name that leads elsewhere', spoiled({ name: '../../evil.xml', content: 'x' })],
    [
      'a document type in the list of sheets',
      spoiled({ name: 'xl/workbook.xml', content: '<!DOCTYPE a SYSTEM "file:///etc/passwd"><workbook/>' }),
    ],
    ['a document type in the shared texts', makeWorkbook({ ...good, sharedStrings: '<!DOCTYPE a>' })],
    ['more styles than there can be', makeWorkbook({ ...good, styles: `<cellXfs>${'<xf/>'.repeat(100_001)}</cellXfs>` })],
    ['an end that is cut off', makeWorkbook(good).subarray(0, 700)],
  ])('refuses %s as a whole', async (_, bytes) => {
    expect(await places(bytes)).toEqual(['F41 workbook - -']);
  });
});

describe('F03 (what is too large)', () => {
  it('refuses more bytes than allowed, and asks for no more', async () => {
    let sent = 0;
    async function* endless(): AsyncGenerator<Uint8Array> {
      for (;;) {
        sent += 1;
        yield new Uint8Array(65_536);
      }
    }
    const found = await readPlaces(endless(), { ...defaultWorkbookLimits, bytes: 1_000_000 });
    expect([found.places, found.findings[0]?.found]).toEqual([['F03 workbook - -'], 'The file is larger than 1 MB.']);
    expect(sent).toBeLessThan(20);
    expect(defaultWorkbookLimits.bytes).toBe(50_000_000);
  });

  it('refuses a part that unpacks to too many times its size, and one that hides its size', async () => {
    const blank = ' '.repeat(3_000_000);
    const bomb = { name: 'xl/worksheets/sheet1.xml', content: sheetXml({ before: blank }) };
    expect(await places(spoiled(bomb))).toEqual(['F03 workbook - -']);
    expect(await places(spoiled({ ...bomb, claims: { size: 900_000 } }))).toEqual(['F41 bouts - -']);
  });

  it('refuses 200,000 columns, given one by one or by one cell far out, with its row', async () => {
    const cells = Array.from({ length: 200_000 }, (_, index) => `<c><v>${index}</v></c>`).join('');
    expect(await places(withRows(`<row r="3">${cells}</row>`))).toEqual(['F03 bouts 3 -']);
    expect(await places(withRows(`${header}<row r="2"><c r="XFD2"><v>1</v></c></row>`))).toEqual(['F03 bouts 2 -']);
    expect(await places(withRows(`${header}<row r="2"><c r="ABCDEFG2"><v>1</v></c></row>`))).toEqual(['F03 bouts 2 -']);
  });

  it('refuses shared texts without number or without end', async () => {
    const many = makeWorkbook({ ...good, sharedStrings: Array.from({ length: 2_000 }, (_, index) => `<si><t>${index}</t></si>`).join('') });
    expect(await places(many, { ...defaultWorkbookLimits, sharedTexts: 1_999 })).toEqual(['F03 workbook - -']);
    expect(await places(many, { ...defaultWorkbookLimits, sharedTextLength: 5_000 })).toEqual(['F03 workbook - -']);
    expect(await places(many, { ...defaultWorkbookLimits, sharedTexts: 2_000 })).toEqual([]);
  });

  it('refuses a long text only where a cell of a table has it', async () => {
    const sharedStrings = `<si><t>${'a b '.repeat(5_000)}</t></si>`;
    const cell = { xml: '<c r="@" t="s"><v>0</v></c>' };
    expect(await places(makeWorkbook({ ...good, sharedStrings }))).toEqual([]);
    expect(
      await places(
        makeWorkbook({
          sheets: [
            {
              name: 'bouts',
              rows: [
                ['bout_no', 'stop_reason'],
                [1, cell],
              ],
            },
          ],
          sharedStrings,
        }),
      ),
    ).toEqual(['F03 bouts 2 -']);
    expect(await places(withRows(`${header}<row r="2"><c r="A2" t="inlineStr"><is><t>${'1'.repeat(20_000)}</t></is></c></row>`))).toEqual([
      'F03 bouts 2 -',
    ]);
    expect(await places(withRows(`${header}<row r="2"><c r="A2"><v>${'1'.repeat(20_000)}</v></c></row>`))).toEqual(['F03 bouts 2 -']);
  });

  it('refuses more sheets than allowed', async () => {
    const sheets = Array.from({ length: 4 }, (_, index) => ({ name: `Sheet${index}` }));
    expect(await places(makeWorkbook({ sheets: [...good.sheets, ...sheets] }), { ...defaultWorkbookLimits, sheets: 4 })).toEqual([
      'F03 workbook - -',
    ]);
    expect(await places(makeWorkbook({ sheets: [...good.sheets, ...sheets] }), { ...defaultWorkbookLimits, sheets: 5 })).toEqual([]);
  });
});

describe('F05 (a workbook without a table)', () => {
  it.each([
    ['empty sheets', { sheets: [{ name: 'bouts' }, { name: 'sessions' }] }, 'No sheet of the workbook holds a table.'],
    [
      'images only',
      { sheets: [{ name: 'bouts', behind: '<drawing r:id="rId1"/>' }] },
      'The sheets of the workbook hold images and no table.',
    ],
  ])('refuses %s', async (_, draft, found) => {
    expect(await places(makeWorkbook(draft))).toEqual(['F05 workbook - -']);
    expect(await wording(makeWorkbook(draft))).toBe(found);
  });

  it('passes a table beside an image and an empty sheet', async () => {
    expect(await places(makeWorkbook({ sheets: [...good.sheets, { name: 'sessions', behind: '<drawing r:id="rId1"/>' }] }))).toEqual([]);
  });
});

describe('scanPieces', () => {
  it('tells of rows while the rest of the sheet is still packed', () => {
    const rows = Array.from({ length: 20_000 }, (_, index) => [index, index * 7, index % 11]);
    const entry = readZipDirectory(makeWorkbook({ sheets: [{ name: 'bouts', rows }] }), defaultWorkbookLimits).get(
      'xl/worksheets/sheet1.xml',
    );
    let told = 0;
    let before = 0;
    const events = { row: () => (told += 1), hiddenColumns() {}, merged() {}, image() {} };
    const reader = new SheetReader({ sharedTexts: [], dateStyles: [], countsFrom1904: false }, defaultWorkbookLimits, events);
    let most = 0;
    for (const _ of scanPieces(entry!, reader)) {
      most = Math.max(most, told - before);
      before = told;
    }
    expect(told).toBe(20_000);
    expect(most).toBeLessThan(5_000);
  });
});
