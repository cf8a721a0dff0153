import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { defaultWorkbookLimits } from '../../limits.ts';
import { readWorkbookSheets } from '../../reading/workbook/read-workbook-sheets.ts';
import { elements, partsOf, whole } from '../../test-support/workbook-parts-of.ts';
import { XmlScanner } from '../../xml/xml-scanner.ts';
import { readZipDirectory } from '../../zip/zip-directory.ts';
import { escapeXml } from './escape-xml.ts';
import type { PlannedSheet } from './sheet-plan.ts';
import { writeSheets } from './write-sheets.ts';

const bouts = (rows: PlannedSheet['rows'], more: Partial<PlannedSheet> = {}): PlannedSheet => ({
  name: 'bouts',
  columns: [{ width: 10 }],
  rows,
  ...more,
});

const textOf = async (xml: string): Promise<string> => {
  let text = '';
  new XmlScanner({ open() {}, text: (piece) => (text += piece), close() {} }).push(xml, true);
  return text;
};

describe('writeSheets', () => {
  it('writes any text so that reading gives it back, and never as a formula', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.array(fc.string({ unit: 'binary', minLength: 1, maxLength: 30 }), { minLength: 1, maxLength: 20 }),
        async (texts) => {
          const rows = ['header', ...texts].map((text, index) => ({ line: index + 1, cells: ['x', text] }));
          const bytes = await whole(writeSheets([bouts(rows)]));
          const read = await readWorkbookSheets(bytes);
          expect(read.ok && read.sheets[0]?.rows.map(([, text]) => text)).toEqual(texts);
          expect(partsOf(bytes)['xl/worksheets/sheet1.xml']).not.toMatch(/<f\b/);
        },
      ),
      { seed: 20261103, numRuns: 100 },
    );
  });

  it('writes rows where they belong, and gives away the first before the last is asked for', async () => {
    let asked = 0;
    function* rows() {
      for (let line = 2; line <= 60_000; line += 2) {
        asked = line;
        yield { line, cells: [line, `text ${line * 7919}`, line / 4] };
      }
    }
    const pieces = writeSheets([bouts(rows())]);
    await pieces.next();
    for (let piece = 0; piece < 20; piece += 1) await pieces.next();
    expect(asked).toBeLessThan(30_000);
  });

  it('writes every part as XML that ends well, whatever a sheet has', async () => {
    const sheet = bouts([{ line: 1, cells: ['a<b>&"', null, 2.5], style: 'header' }], {
      name: 'A & "B" <C>',
      frozen: { rows: 1, columns: 1 },
      hasFilter: true,
      codeColumns: [0],
      validations: [
        { column: 0, allows: { kind: 'list', range: `'A & B'!$A$1`, isOpen: false }, title: '<t>', prompt: '"p"', refusal: '&' },
      ],
      links: () => [{ cell: 'A1', target: `'A & B'!A1` }],
      notes: () => [{ line: 1, column: 0, text: 'a < b\n"c" & \u0007' }],
    });
    const parts = partsOf(await whole(writeSheets([sheet, bouts([])], 1)));
    for (const [name, xml] of Object.entries(parts)) await expect(textOf(xml), name).resolves.toBeTypeOf('string');
    expect(elements(parts['xl/worksheets/sheet1.xml'] ?? '', 'hyperlink')).toEqual([{ ref: 'A1', location: "'A &amp; B'!A1" }]);
    expect(elements(parts['xl/worksheets/sheet2.xml'] ?? '', 'sheetView')[0]).toMatchObject({ tabSelected: '1' });
  });

  it('lists every part among the content types and relationships, and nothing else', async () => {
    const notes = () => [{ line: 1, column: 0, text: 'a' }];
    const parts = partsOf(await whole(writeSheets([bouts([], { notes }), bouts([], { name: 'Other' })])));
    const types = parts['[Content_Types].xml'] ?? '';
    const overridden = elements(types, 'Override').map(({ PartName = '' }) => PartName.slice(1));
    const byEnding = new Set(elements(types, 'Default').map(({ Extension = '' }) => Extension));
    const others = Object.keys(parts).filter((name) => !overridden.includes(name) && name !== '[Content_Types].xml');
    expect(overridden.every((name) => name in parts)).toBe(true);
    expect(others.every((name) => byEnding.has(name.split('.').at(-1) ?? ''))).toBe(true);
    expect(elements(parts['xl/worksheets/_rels/sheet1.xml.rels'] ?? '', 'Relationship').map(({ Target }) => Target)).toEqual([
      '../drawings/vmlDrawing1.vml',
      '../comments1.xml',
    ]);
  });

  it('writes the same bytes whenever it writes the same sheets, in an archive that passes every check', async () => {
    const write = () => whole(writeSheets([bouts([{ line: 1, cells: ['a', 1] }])]));
    const bytes = await write();
    expect(await write()).toEqual(bytes);
    expect(readZipDirectory(bytes, defaultWorkbookLimits).has('xl/workbook.xml')).toBe(true);
  });

  it('refuses a number that is none', async () => {
    await expect(whole(writeSheets([bouts([{ line: 1, cells: [Number.NaN] }])]))).rejects.toThrow(RangeError);
  });
});

describe('escapeXml', () => {
  it.each([
    ['a & b < c > "d"', 'a &amp; b &lt; c &gt; &quot;d&quot;'],
    ['bell \u0007', 'bell _x0007_'],
    ['_x0007_', '_x005F_x0007_'],
    ['lone \ud800', 'lone _xD800_'],
    ['whole \u{1f6b6}', 'whole \u{1f6b6}'],
    ['line\nbreak', 'line\nbreak'],
  ])('writes %j as %j', (text, written) => {
    expect(escapeXml(text)).toBe(written);
  });
});
