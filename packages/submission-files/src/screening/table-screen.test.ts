import { exampleRow } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { FindingLog } from '../finding-log.ts';
import { readTable } from '../reading/read-csv.ts';
import { readWorkbook } from '../reading/workbook/read-workbook.ts';
import { makeWorkbook } from '../test-support/make-workbook.ts';
import { countUnscreened } from './count-unscreened.ts';
import { TableScreen } from './table-screen.ts';

const example = (table: TableKey) => Object.entries(exampleRow(table)).map(([key, value]) => [key, String(value)] as const);

/** The example row of the table with further columns. */
async function screened(table: TableKey, more: Readonly<Record<string, string>>, safeHeaders: readonly string[] = []) {
  const columns = [...example(table), ...Object.entries(more)];
  const text = `${columns.map(([header]) => header).join(',')}\r\n${columns.map(([, cell]) => cell).join(',')}\r\n`;
  const log = new FindingLog();
  const screen = new TableScreen(table, new Set(safeHeaders));
  await readTable(table, new TextEncoder().encode(text), log, undefined, { watch: screen });
  const identifies = screen.report(log);
  const places = log.byRule().flatMap(({ id, kept }) => kept.map(({ line, column }) => `${id} ${line} ${column}`));
  return { identifies, log, places };
}

describe('the screen of a table', () => {
  it('finds nothing in the example row of the dictionary', async () => {
    expect(await screened('participants', {})).toMatchObject({ identifies: false, places: [] });
  });

  it('names line, column and class of what identifies somebody, and never the thing itself', async () => {
    const { identifies, log, places } = await screened('participants', { note: 'jane.doe@record.example' });
    expect(identifies).toBe(true);
    expect(places).toContain('F50 2 note');
    expect(JSON.stringify(log.byRule())).not.toContain('jane.doe');
    expect(log.byRule().find(({ id }) => id === 'F50')?.kept[0]?.found).toContain('an e-mail address');
  });

  it('lets a header pass that a steward has marked as safe, and still judges its cells', async () => {
    const header = 'date of birth';
    expect((await screened('participants', { [header]: '' })).identifies).toBe(true);
    expect((await screened('participants', { [header]: '' }, [header])).identifies).toBe(false);
    expect((await screened('participants', { [header]: '12/05/1961' }, [header])).identifies).toBe(true);
  });

  it('finds the date in a cell of a workbook that a spreadsheet program has made one of', async () => {
    const workbook = makeWorkbook({
      sheets: [
        {
          name: 'bouts',
          rows: [
            ['bout_no', 'steps'],
            [2, { xml: '<c r="@" s="1"><v>45000</v></c>' }],
          ],
        },
      ],
      styles: '<cellXfs><xf numFmtId="0"/><xf numFmtId="14"/></cellXfs>',
    });
    const log = new FindingLog();
    const screen = new TableScreen('bouts', new Set());
    await readWorkbook(workbook, log, undefined, () => ({ watch: screen }));
    expect(screen.report(log)).toBe(true);
    expect(log.byRule().find(({ id }) => id === 'F50')?.kept).toMatchObject([{ line: 2, column: 'steps' }]);
  });
});

describe('what nobody has looked at', () => {
  const unscreenedOf = async (text: string): Promise<number> => {
    const log = new FindingLog();
    await readTable('participants', new TextEncoder().encode(text), log);
    return countUnscreened(log);
  };

  it('is nothing of a file that was read to its end, and something of one that was not', async () => {
    const columns = example('participants');
    const whole = `${columns.map(([header]) => header).join(',')}\r\n${columns.map(([, cell]) => cell).join(',')}\r\n`;
    expect(await unscreenedOf(whole)).toBe(0);
    expect(await unscreenedOf('colour,shape\r\nred,round\r\n')).toBeGreaterThan(0);
    expect(await unscreenedOf(`${whole}"never closed`)).toBeGreaterThan(0);
  });
});
