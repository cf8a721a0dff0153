import { unzipSync } from 'fflate';
import { describe, expect, it } from 'vitest';
import { FindingLog, plainWorkbook, readWorkbook, writeTemplate } from '@cairnstep/submission-files';
import { makeWorkbook } from '../../test-support/make-workbook.ts';
import type { WorkbookDraft } from '../../test-support/make-workbook.ts';
import { makeZip } from '../../test-support/make-zip.ts';
import { readPlaces } from '../../test-support/read-places.ts';
import { whole } from '../../test-support/workbook-parts-of.ts';

function plain(bytes: Uint8Array): Uint8Array {
  const result = plainWorkbook(bytes);
  if (!result.ok) throw new Error(result.found);
  return result.bytes;
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
    const [before, after] = [await readPlaces(makeWorkbook(draft)), await readPlaces(plain(makeWorkbook(draft)))];
    expect(after.findings).toEqual(before.findings);
    expect(after.places).toEqual(['F10 bouts 3 steps', 'F42 workbook - -', 'F47 bouts 4 steps', 'F45 bouts - -']);
    expect(after.tables.bouts?.length).toBe(2);
  });

  it('holds nothing besides the cells of its tables', () => {
    const bytes = plain(makeWorkbook(draft));
    expect(textOf(makeWorkbook(draft))).toContain('Jane Doe');
    expect(textOf(bytes)).not.toContain('Jane Doe');
    expect(Object.keys(unzipSync(bytes)).sort()).toEqual([
      '[Content_Types].xml',
      '_rels/.rels',
      'xl/_rels/workbook.xml.rels',
      'xl/sharedStrings.xml',
      'xl/styles.xml',
      'xl/workbook.xml',
      'xl/worksheets/sheet1.xml',
      'xl/worksheets/sheet2.xml',
      'xl/worksheets/sheet3.xml',
    ]);
  });

  it('comes of a template as it was issued, which holds no row', async () => {
    const template = await whole(writeTemplate({ site: 'A clinic', month: '2026-01', participants: [] }));
    const log = new FindingLog();
    const tables = await readWorkbook(plain(template), log);
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
  ])('is not made of %s', (_, bytes, rule) => {
    expect(plainWorkbook(bytes)).toMatchObject({ ok: false, rule });
  });
});
