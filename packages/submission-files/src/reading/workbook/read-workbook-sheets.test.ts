import { describe, expect, it } from 'vitest';
import { makeWorkbook } from '../../test-support/make-workbook.ts';
import { defaultWorkbookLimits } from '../../limits.ts';
import { readWorkbookSheets } from './read-workbook-sheets.ts';

const styles = '<cellXfs><xf numFmtId="0"/><xf numFmtId="14"/></cellXfs>';

async function sheetsOf(...input: Parameters<typeof readWorkbookSheets>) {
  const read = await readWorkbookSheets(...input);
  if (!read.ok) throw new Error(read.found);
  return read.sheets;
}

describe('the workbook of a clinic, as text', () => {
  it('gives every sheet with a header, whatever it is called, with dates as ISO dates and rows with their place', async () => {
    const workbook = makeWorkbook({
      styles,
      sheets: [
        { name: 'Training log', rows: [null, ['MRN', 'Date', 'km'], null, ['0042', { xml: '<c r="@" s="1"><v>45000</v></c>' }, 1.5]] },
        { name: 'Bouts', rows: [['bout_no']] },
        { name: 'Empty' },
        { name: 'Definitions', rows: [['table']] },
      ],
    });
    const [log, bouts, ...others] = await sheetsOf(workbook);
    expect(log).toMatchObject({ name: 'Training log', table: null, headers: ['MRN', 'Date', 'km'], lines: [4] });
    expect(log?.rows).toEqual([['0042', '2023-03-15', '1.5']]);
    expect(bouts).toMatchObject({ name: 'Bouts', table: 'bouts', rows: [] });
    expect(others).toEqual([]);
  });

  it('fills rows that end early with empty cells, and keeps what stands beyond the header', async () => {
    const rows = [['a', 'b', 'c'], [1, 2, 3], [4], [5, 6, 7, 8], [null, ' ', 9, ' ']];
    const [sheet] = await sheetsOf(makeWorkbook({ sheets: [{ name: 'x', rows }] }));
    expect(sheet?.rows).toEqual([
      ['1', '2', '3'],
      ['4', '', ''],
      ['5', '6', '7', '8'],
      ['', ' ', '9'],
    ]);
  });

  it('finds the names of the columns under a title', async () => {
    const [sheet] = await sheetsOf(makeWorkbook({ sheets: [{ name: 'x', rows: [['Training log'], ['MRN', 'km'], ['0042', 1]] }] }));
    expect(sheet).toMatchObject({ headers: ['MRN', 'km'], rowsAbove: 1, rows: [['0042', '1']], lines: [3] });
  });

  it('reads dates that are counted from 1904', async () => {
    const rows = [['Date'], [{ xml: '<c r="@" s="1"><v>45000</v></c>' }]];
    const workbookProperties = '<workbookPr date1904="1"/>';
    const [sheet] = await sheetsOf(makeWorkbook({ styles, workbookProperties, sheets: [{ name: 'x', rows }] }));
    expect(sheet?.rows).toEqual([['2027-03-16']]);
  });

  it('tells what is hidden or merged, and which cells have no value', async () => {
    const [sheet] = await sheetsOf(
      makeWorkbook({
        sheets: [
          {
            name: 'Sessions',
            state: 'hidden',
            before: '<cols><col min="2" max="9" hidden="1"/></cols>',
            rows: [
              ['MRN', 'Surname', 'steps'],
              ['1', 'x', { xml: '<c r="@" t="e"><v>#N/A</v></c>' }],
            ],
            behind: '<mergeCells><mergeCell ref="A2:A3"/></mergeCells>',
          },
        ],
      }),
    );
    expect(sheet).toMatchObject({ isHidden: true, hiddenColumns: [2, 3], hasMergedCells: true, cellsWithoutValue: 1 });
    expect(sheet?.rows).toEqual([['1', 'x', '']]);
  });

  it('refuses what is no workbook, an empty one, and one with more rows than allowed', async () => {
    expect(await readWorkbookSheets(new TextEncoder().encode('a,b'))).toMatchObject({ ok: false, rule: 'F40' });
    expect(await readWorkbookSheets(makeWorkbook({ sheets: [{ name: 'x' }] }))).toMatchObject({ ok: false, rule: 'F05' });
    const three = makeWorkbook({ sheets: [{ name: 'x', rows: [['a'], [1], [2]] }] });
    expect(await readWorkbookSheets(three, { ...defaultWorkbookLimits, rows: 1 })).toMatchObject({ ok: false, rule: 'F03', line: 3 });
  });
});
