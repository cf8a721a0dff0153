import { tableKeys } from '@cairnstep/dictionary';
import type { TableKey } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { checkSubmission } from '../../check-submission.ts';
import { FindingLog } from '../../finding-log.ts';
import { readTable } from '../../reading/read-csv.ts';
import { readWorkbook } from '../../reading/workbook/read-workbook.ts';
import { tableFromRows } from '../../table/table-from-rows.ts';
import type { TypedTable } from '../../table/typed-table.ts';
import { bout, consent, event, exam, participant, result, session, someone } from '../../test-support/a-month.ts';
import { encode } from '../../test-support/findings-of.ts';
import { makeWorkbook } from '../../test-support/make-workbook.ts';
import { elements, partsOf, whole } from '../../test-support/workbook-parts-of.ts';
import { writeCsv } from '../write-csv.ts';
import type { SubmittedFile } from './submitted-tables.ts';
import { writeFindingsWorkbook } from './write-findings-workbook.ts';

const csv = (table: TableKey, text: string): SubmittedFile => ({ table, csv: encode(text) });

/** Reads the files for their findings and writes these with the files. */
async function findingsIn(...files: readonly SubmittedFile[]) {
  const log = new FindingLog();
  for (const file of files) {
    if ('csv' in file) await readTable(file.table, file.csv, log);
    else await readWorkbook(file.workbook, log);
  }
  // The short files of these tests leave most columns out.
  const groups = log.byRule().filter(({ id }) => id !== 'F08');
  const bytes = await whole(writeFindingsWorkbook(files, groups));
  const parts = partsOf(bytes);
  const names = elements(parts['xl/workbook.xml'] ?? '', 'sheet').map(({ name = '' }) => name);
  const numberOf = (name: string): number => names.indexOf(name) + 1;
  return {
    bytes,
    names,
    groups,
    sheet: (name: string): string => parts[`xl/worksheets/sheet${numberOf(name)}.xml`] ?? '',
    /** Cells with a note and the rules that it names. */
    notes: (name: string): string[] =>
      [...(parts[`xl/comments${numberOf(name)}.xml`] ?? '').matchAll(/<comment ref="(\w+)"[^>]*><text><t[^>]*>([^<]*)</g)].map(
        ([, cell, text = '']) => `${cell} ${[...text.matchAll(/^[A-Z]\d\d/gm)].join('+')}`,
      ),
    shapes: (name: string): string => parts[`xl/drawings/vmlDrawing${numberOf(name)}.vml`] ?? '',
  };
}

describe('writeFindingsWorkbook', () => {
  const file = `colour,bout_no,"steps",distance_m,stop_reason\nred,1,many,"12,5",pain\n\nblue,2,10,=1+1,tired\n,3,x,7,pain,more\n`;

  it('puts a note into every cell with findings, in the row that the finding names', async () => {
    const found = await findingsIn(csv('bouts', file));
    expect(found.names).toEqual(['Bouts', 'Findings']);
    expect(found.notes('Bouts')).toEqual(['A1 F06', 'C2 F10', 'D4 F13', 'E4 F11', 'A5 F09', 'C5 F10']);
    expect(found.shapes('Bouts').match(/<x:Row>3<\/x:Row><x:Column>3<\/x:Column>/g)).toHaveLength(1);
  });

  it('shows the cells as they were sent, colours those with findings, and writes no formula', async () => {
    const { sheet } = await findingsIn(csv('bouts', file));
    const row = (line: number): string => new RegExp(`<row r="${line}"[^>]*>(.*?)</row>`).exec(sheet('Bouts'))?.[1] ?? '';
    const texts = (line: number): string[] =>
      [...row(line).matchAll(/<t[^>]*>([^<]*)<\/t>|<v>([^<]*)<\/v>/g)].map(([, text, number]) => text ?? `number ${number}`);
    expect(texts(1)).toEqual(['colour', 'bout_no', 'steps', 'distance_m', 'stop_reason']);
    expect(texts(2)).toEqual(['red', 'number 1', 'many', '12,5', 'pain']);
    expect([row(3), texts(4), texts(5)]).toEqual([
      '',
      ['blue', 'number 2', 'number 10', '=1+1', 'tired'],
      ['number 3', 'x', 'number 7', 'pain', 'more'],
    ]);
    expect(sheet('Bouts')).not.toMatch(/<f\b/);
    const styleOf = (cell: string): string | undefined => new RegExp(`<c r="${cell}" s="(\\d+)"`).exec(sheet('Bouts'))?.[1];
    expect(styleOf('C2')).toBeDefined();
    expect([styleOf('C2'), styleOf('D4')]).toEqual([styleOf('C5'), styleOf('C5')]);
    expect(styleOf('B2')).toBeUndefined();
  });

  it('lists every finding and links it to its cell', async () => {
    const found = await findingsIn(csv('bouts', file));
    const list = found.sheet('Findings');
    const places = [...list.matchAll(/<row r="(\d+)"><c [^>]*><is><t[^>]*>(?:error|warning)<.*?<t[^>]*>([A-Z]\d\d)</g)].map(
      ([, line, rule]) => `${line} ${rule}`,
    );
    expect(places).toEqual(['2 F06', '3 F09', '4 F10', '5 F10', '6 F11', '7 F13']);
    expect(elements(list, 'hyperlink').map(({ ref, location }) => `${ref} ${location}`)).toEqual([
      "D2 'Bouts'!A1",
      "D3 'Bouts'!A5",
      "D4 'Bouts'!C2",
      "D5 'Bouts'!C5",
      "D6 'Bouts'!E4",
      "D7 'Bouts'!D4",
    ]);
  });

  it('takes the sheets of a workbook, with rows that were passed over', async () => {
    const workbook = makeWorkbook({
      sheets: [
        { name: 'Start', rows: [['x']] },
        {
          name: 'bouts',
          rows: [
            null,
            ['bout_no', 'steps', 'participant'],
            [1, 'many', 'EXAMPLE'],
            [2, { xml: '<c r="@" s="1"><v>45000</v></c>' }, null],
            [{ xml: '<c r="@"><f>A1</f></c>' }, 5],
          ],
        },
        { name: 'sessions', rows: [] },
      ],
      styles: '<cellXfs><xf numFmtId="0"/><xf numFmtId="14"/></cellXfs>',
    });
    const found = await findingsIn({ workbook });
    expect(found.names).toEqual(['Bouts', 'Sessions', 'Findings']);
    expect(found.notes('Bouts')).toEqual(['C3 F48', 'B4 F47', 'A5 F46']);
    expect(found.sheet('Bouts')).toMatch(/EXAMPLE.*2023-03-15/);
    expect(found.sheet('Bouts')).toMatch(/<c r="A5" s="\d+"\/><c r="B5"><v>5<\/v>/);
  });

  it('lists what is about a whole file or workbook, without a link', async () => {
    const found = await findingsIn({ workbook: encode('no workbook') });
    expect([found.names, found.groups.map(({ id }) => id)]).toEqual([['Findings'], ['F40']]);
    expect(found.sheet('Findings')).toMatch(/F40/);
    expect(elements(found.sheet('Findings'), 'hyperlink')).toEqual([]);
    const empty = await findingsIn(csv('bouts', ''));
    expect([empty.names, empty.notes('Bouts')]).toEqual([['Bouts', 'Findings'], []]);
  });

  it('shows the rows before the place where a file cannot be read any further', async () => {
    const found = await findingsIn(csv('bouts', 'bout_no,stop_reason\n1,pain\n2,"pain\n3,pain\n'));
    expect(found.sheet('Bouts').match(/<row /g)).toHaveLength(2);
    expect(found.groups.map(({ id }) => id)).toEqual(['F04']);
  });

  it('has no more notes than a program can show, and says so', async () => {
    const rows = Array.from({ length: 2_500 }, (_, index) => `${index},many\n`);
    const found = await findingsIn(csv('bouts', `bout_no,steps\n${rows.join('')}`));
    expect(found.notes('Bouts')).toHaveLength(2_000);
    expect(found.sheet('Bouts').match(/<c r="B\d+" s="/g)).toHaveLength(2_501);
    expect(found.sheet('Findings')).toMatch(/The first 2,000 of each sheet have a note/);
  });

  it('says how many findings of a rule it does not list', async () => {
    const log = new FindingLog({ perRule: 1, inAll: 10 });
    const sent = encode('bout_no,steps\n1,a\n2,b\n3,c\n');
    await readTable('bouts', sent, log);
    const parts = partsOf(await whole(writeFindingsWorkbook([{ table: 'bouts', csv: sent }], log.byRule())));
    expect(parts['xl/worksheets/sheet2.xml']).toMatch(/2 more findings of this rule are not listed one by one/);
  });

  it('can be sent again: a month reads from it as it read from its files, with the findings in the same places', async () => {
    const rows = {
      participants: [participant({ age_at_index: 200 })],
      consents: [consent()],
      exams: [exam()],
      assessments: [result('tmwt_ss', 0.5), result('mas', 1.5)],
      sessions: [session(), session({ session_no: 2, hr_peak: 40, hr_rest: 100 })],
      bouts: [bout({ distance_m: 0.1 + 0.2 }), bout({ bout_no: 2, participant: someone })],
      adverse_events: [event()],
    };
    const files = tableKeys.map((table) => ({ table, csv: encode(writeCsv(tableFromRows(table, rows[table]))) }));
    const context = { held: {}, withdrawn: new Set<string>(), year: 2026 };
    const log = new FindingLog();
    const tables: Partial<Record<TableKey, TypedTable>> = {};
    for (const { table, csv: bytes } of files) tables[table] = await readTable(table, bytes, log);
    checkSubmission(tables, context, log);
    expect(log.counts.errors).toBeGreaterThan(0);

    const again = new FindingLog();
    const read = await readWorkbook(writeFindingsWorkbook(files, log.byRule()), again);
    for (const { table } of files) {
      const rowsOf = (one?: TypedTable) => one && Array.from({ length: one.length }, (_, row) => one.row(row));
      expect(rowsOf(read[table])).toEqual(rowsOf(tables[table]));
      expect(Array.from(read[table]?.lines ?? [])).toEqual(Array.from(tables[table]?.lines ?? []));
    }
    checkSubmission(read, context, again);
    expect(again.byRule()).toEqual(log.byRule());
  });

  it('shows what was mended on screen in place of the cells, and reads it back', async () => {
    const mends = new Map([
      [2, new Map([['steps', '40']])],
      [
        4,
        new Map([
          ['stop_reason', 'pain'],
          ['hr_end', '117'],
        ]),
      ],
    ]);
    const sent = 'bout_no,steps,stop_reason\r\n1,many,pain\r\n2,10,pain\r\n3,11,tired\r\n';
    const found = await findingsIn({ table: 'bouts', csv: encode(sent), mends });
    const { bouts } = await readWorkbook(found.bytes, new FindingLog());
    const cells = (key: string) => [0, 1, 2].map((row) => bouts?.column(key).cell(row));
    expect([cells('steps'), cells('stop_reason'), cells('hr_end')]).toEqual([
      [40, 10, 11],
      ['pain', 'pain', 'pain'],
      [null, null, 117],
    ]);
  });
});
