import { exampleRow, tableOf } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { FindingLog, readTable, readWorkbook } from '@cairnstep/submission-files';
import type { CellWatch } from '@cairnstep/submission-files';
import { encode } from '../test-support/findings-of.ts';
import { makeWorkbook } from '../test-support/make-workbook.ts';

/** Notes down what it sees. */
class Notes implements CellWatch {
  headers: readonly string[] = [];
  shown: readonly string[] = [];
  readonly rows: [line: number, cells: readonly string[]][] = [];
  header(names: readonly string[], shown: readonly string[]): void {
    this.headers = names;
    this.shown = shown;
  }
  row(cells: readonly string[], line: number): void {
    this.rows.push([line, cells]);
  }
  mayShowHeader(header: string): boolean {
    return !header.startsWith('Jane');
  }
}

const keys = tableOf('bouts').variables.map(({ key }) => key);
const example = exampleRow('bouts');
const line = (changes: Readonly<Record<string, string>> = {}): string =>
  keys.map((key) => changes[key] ?? String(example[key] ?? '')).join(',');
const file = (...lines: readonly string[]): Uint8Array => encode([keys.join(','), ...lines].join('\r\n'));

describe('a watch', () => {
  it('sees whole rows in which a cell is not just what the dictionary allows, and no others', async () => {
    const watch = new Notes();
    const rows = [line(), line({ stop_reason: 'Mrs Jones' }), line({ hr_end: '900' }), line({ participant: '943 476 5919' }), line()];
    await readTable('bouts', file(...rows), new FindingLog(), undefined, { watch });
    expect(watch.headers).toEqual(keys);
    expect(watch.rows.map(([at]) => at)).toEqual([3, 4, 5]);
    expect(watch.rows[0]?.[1]).toContain('Mrs Jones');
  });

  it('sees every row of a file with a column that the dictionary does not have, under the name of the file', async () => {
    const watch = new Notes();
    const bytes = encode(`${keys.join(',')},remarks\r\n${line()},all well\r\n${line()},\r\n`);
    await readTable('bouts', bytes, new FindingLog(), undefined, { watch });
    expect(watch.headers.at(-1)).toBe('remarks');
    expect(watch.rows.map(([at]) => at)).toEqual([2, 3]);
  });

  it('sees cells beyond the header, and every result of a measure', async () => {
    const watch = new Notes();
    await readTable('bouts', file(`${line()},Mrs Jones`), new FindingLog(), undefined, { watch });
    expect(watch.rows[0]?.[1].at(-1)).toBe('Mrs Jones');
    const results = new Notes();
    await readTable('assessments', encode('measure,value\r\ntug,9434765919\r\n'), new FindingLog(), undefined, { watch: results });
    expect(results.rows).toEqual([[2, ['tug', '9434765919']]]);
  });

  it('is told keys for headers of another spelling, and decides which other headers findings repeat', async () => {
    const watch = new Notes();
    const log = new FindingLog();
    await readTable('bouts', encode('Bout No,Steps,Jane Doe,colour\r\n1,2,3,4\r\n'), log, undefined, { watch });
    expect(watch.headers).toEqual(['bout_no', 'steps', 'Jane Doe', 'colour']);
    expect(watch.shown).toEqual(['bout_no', 'steps', 'C', 'colour']);
    const undeclared = log
      .byRule()
      .find(({ id }) => id === 'F06')
      ?.kept.map(({ column }) => column);
    expect(undeclared).toEqual(['C', 'colour']);
  });

  it('sees the dates of a workbook', async () => {
    const watch = new Notes();
    const rows = [
      ['bout_no', 'steps'],
      [1, 40],
      [2, { xml: '<c r="@" s="1"><v>45356</v></c>' }],
    ];
    const styles = '<cellXfs><xf numFmtId="0"/><xf numFmtId="14"/></cellXfs>';
    await readWorkbook(makeWorkbook({ sheets: [{ name: 'bouts', rows }], styles }), new FindingLog(), undefined, () => ({ watch }));
    expect(watch.rows).toEqual([[3, ['2', '2024-03-05']]]);
  });
});

describe('mends', () => {
  const mends = (at: number, cells: Readonly<Record<string, string>>) => new Map([[at, new Map(Object.entries(cells))]]);

  it('are read in place of the cells of the file', async () => {
    const log = new FindingLog();
    const wrong = line({ hr_end: 'fast', stop_reason: 'Mrs Jones' });
    const table = await readTable('bouts', file(line(), wrong), log, undefined, {
      mends: mends(3, { hr_end: '117', stop_reason: String(example['stop_reason']) }),
    });
    expect(log.counts.errors).toBe(0);
    expect(table.column('hr_end').number(1)).toBe(117);
    expect(table.column('hr_end').number(0)).toBe(example['hr_end']);
  });

  it('are typed like any cell, and may empty one', async () => {
    const log = new FindingLog();
    const table = await readTable('bouts', file(line(), line()), log, undefined, {
      mends: new Map([
        [2, new Map([['steps', '']])],
        [3, new Map([['steps', 'many']])],
      ]),
    });
    expect(table.column('steps').isEmpty(0)).toBe(true);
    expect(log.byRule().flatMap(({ kept }) => kept)).toMatchObject([{ rule: 'F10', line: 3, column: 'steps' }]);
  });

  it('fill columns that the file lacks, for their row alone', async () => {
    const log = new FindingLog();
    const table = await readTable('bouts', encode('bout_no,steps\r\n1,20\r\n2,30\r\n'), log, undefined, {
      mends: mends(3, { hr_end: '117' }),
    });
    expect([table.column('hr_end').number(0), table.column('hr_end').number(1)]).toEqual([null, 117]);
    expect(log.byRule().map(({ id }) => id)).toEqual(['F08']);
  });

  it('stand for cells of a workbook, whatever kind these were', async () => {
    const log = new FindingLog();
    const rows = [
      ['bout_no', 'steps'],
      [1, { xml: '<c r="@" t="e"><v>#DIV/0!</v></c>' }],
    ];
    const bytes = makeWorkbook({ sheets: [{ name: 'bouts', rows }] });
    const { bouts } = await readWorkbook(bytes, log, undefined, () => ({ mends: mends(2, { steps: '12' }) }));
    expect(bouts?.column('steps').number(0)).toBe(12);
    expect(log.byRule().map(({ id }) => id)).toEqual(['F08']);
  });
});
