import fc from 'fast-check';
import { unzipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { FindingLog, defaultWorkbookLimits, plainWorkbook, readWorkbook, writeTemplate } from '@cairnstep/submission-files';
import { makeWorkbook } from '../../test-support/make-workbook.ts';
import type { DraftCell, WorkbookDraft } from '../../test-support/make-workbook.ts';
import { makeZip } from '../../test-support/make-zip.ts';
import { readPlaces } from '../../test-support/read-places.ts';
import { whole } from '../../test-support/workbook-parts-of.ts';
import { escapeXml } from '../../writing/workbook/escape-xml.ts';
import { readSheets } from './read-sheets.ts';

async function plain(bytes: Uint8Array): Promise<Uint8Array> {
  const result = await plainWorkbook(bytes);
  if (!result.ok) throw new Error(result.found);
  return result.bytes;
}
/** Every row as reading sees it, and what it finds. */
async function cellsOf(bytes: Uint8Array) {
  const rows: unknown[] = [];
  const log = new FindingLog();
  await readSheets(bytes, log, defaultWorkbookLimits, (table) => ({
    header: (cells, _, line) => rows.push([table, line, [...cells]]),
    row: (cells, kinds, count, line) => rows.push([line, cells.slice(0, count), kinds.slice(0, count)]),
  }));
  return { rows, findings: log.byRule() };
}
const textOf = (bytes: Uint8Array): string =>
  Object.entries(unzipSync(bytes))
    .map(([name, content]) => name + new TextDecoder().decode(content))
    .join('\n');

const draft: WorkbookDraft = {
  workbookProperties: '<fileSharing userName="Jane Doe"/><workbookPr date1904="1"/>',
  sheets: [
    { name: 'Start', rows: [['Jane Doe 4711']] },
    {
      name: 'bouts',
      state: 'hidden',
      rows: [['bout_no', 'steps'], null, [1, 'many'], [2, { xml: '<c r="@" s="1"><v>100</v></c>' }]],
      behind: '<drawing r:id="rId1"/>',
    },
    { name: 'Jane Doe', rows: [['x']] },
  ],
  styles: '<cellXfs><xf numFmtId="0"/><xf numFmtId="14"/></cellXfs>',
  sharedStrings: '<si><t>a</t></si>',
  more: [
    { name: 'docProps/core.xml', content: '<creator>Jane Doe</creator>' },
    { name: 'xl/comments1.xml', content: '<comment>Jane Doe</comment>' },
    { name: 'xl/media/image1.png', content: Uint8Array.of(0x89, 0x50) },
  ],
};

describe('a plain workbook', () => {
  it('is read like the one it comes from, with the same places of findings', async () => {
    const [before, after] = [await readPlaces(makeWorkbook(draft)), await readPlaces(await plain(makeWorkbook(draft)))];
    expect(after.findings).toEqual(before.findings);
    expect(after.places).toEqual(['F10 bouts 3 steps', 'F42 workbook - -', 'F47 bouts 4 steps', 'F45 bouts - -']);
    expect(after.tables.bouts?.length).toBe(2);
  });

  it('has the same cells of the same kinds, whatever they are', async () => {
    const text = fc.oneof(
      fc.string({ unit: 'grapheme', maxLength: 12 }),
      fc.constantFrom('_x0007_', '_x005F_x0041_', ' a ', '\t=1', 'a & <b> "c"', ''),
    );
    const cell = fc.oneof(
      text.map((written): DraftCell => ({ xml: `<c r="@" t="inlineStr"><is><t>${escapeXml(written)}</t></is></c>` })),
      fc
        .constantFrom('str', 'e', 'd', 'b')
        .chain((type) => text.map((written): DraftCell => ({ xml: `<c r="@" t="${type}"><v>${escapeXml(written)}</v></c>` }))),
      fc.double({ noNaN: true, noDefaultInfinity: true }).map((value): DraftCell => value),
      fc.integer({ min: 0, max: 60_000 }).map((value): DraftCell => ({ xml: `<c r="@" s="1"><v>${value}</v></c>` })),
      fc.constantFrom<DraftCell>(
        null,
        { xml: '<c r="@" t="str"><f>A1</f></c>' },
        { xml: '<c r="@"><f>A1</f></c>' },
        { xml: '<c r="@" t="s"><v>0</v></c>' },
      ),
    );
    const rows = fc.array(fc.array(cell, { minLength: 2, maxLength: 4 }), { minLength: 1, maxLength: 6 });
    await fc.assert(
      fc.asyncProperty(rows, fc.boolean(), async (cells, countsFrom1904) => {
        const bytes = makeWorkbook({
          ...draft,
          workbookProperties: `<workbookPr date1904="${countsFrom1904 ? 1 : 0}"/>`,
          sheets: [
            {
              name: 'bouts',
              before: '<cols><col min="2" max="3" hidden="1"/></cols>',
              rows: [['bout_no', 'steps'], null, ...cells],
              behind: '<mergeCells><mergeCell ref="A3:B4"/></mergeCells>',
            },
          ],
        });
        expect(await cellsOf(await plain(bytes))).toEqual(await cellsOf(bytes));
      }),
      { seed: 20_261_201, numRuns: 200 },
    );
  });

  it('holds nothing besides the cells of its tables', async () => {
    const bytes = await plain(makeWorkbook(draft));
    expect(textOf(makeWorkbook(draft))).toContain('Jane Doe');
    expect(textOf(bytes)).not.toContain('Jane Doe');
    expect(Object.keys(unzipSync(bytes)).sort()).toEqual([
      '[Content_Types].xml',
      '_rels/.rels',
      'xl/_rels/workbook.xml.rels',
      'xl/workbook.xml',
      'xl/worksheets/sheet1.xml',
      'xl/worksheets/sheet2.xml',
      'xl/worksheets/sheet3.xml',
    ]);
  });

  it('comes of a template as it was issued, which holds no row', async () => {
    const template = await whole(writeTemplate({ site: 'A clinic', month: '2026-01', participants: [] }));
    const log = new FindingLog();
    const tables = await readWorkbook(await plain(template), log);
    expect(log.byRule()).toEqual([]);
    expect(Object.values(tables).map(({ length }) => length)).toEqual([0, 0, 0, 0, 0, 0, 0]);
  });

  it.each([
    ['a file with a password', Uint8Array.from([0xd0, 0xcf, 0x11, 0xe0, ...Buffer.from('EncryptedPackage', 'utf16le')]), 'F40'],
    ['macros', makeWorkbook({ ...draft, more: [{ name: 'xl/vbaProject.bin', content: 'x' }] }), 'F40'],
    ['a part that leads elsewhere', makeWorkbook({ ...draft, more: [{ name: '../../evil.xml', content: 'x' }] }), 'F41'],
    ['a bomb', makeWorkbook({ ...draft, more: [{ name: 'xl/media/a.bin', content: ' '.repeat(3_000_000) }] }), 'F03'],
    ['an archive that is cut off', makeWorkbook(draft).subarray(0, 700), 'F41'],
    ['an archive of something else', makeZip([{ name: 'a.txt', content: 'x' }]), 'F40'],
    ['a sheet that breaks off', makeWorkbook({ sheets: [{ name: 'bouts', xml: '<worksheet><sheetData><row r="1">' }] }), 'F41'],
    ['a row with too many columns', makeWorkbook({ sheets: [{ name: 'bouts', rows: [[{ xml: '<c r="XFD1"><v>1</v></c>' }]] }] }), 'F03'],
  ])('is not made of %s', async (_, bytes, rule) => {
    expect(await plainWorkbook(bytes)).toMatchObject({ ok: false, rule });
  });
});
