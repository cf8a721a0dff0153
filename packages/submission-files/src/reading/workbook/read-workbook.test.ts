import { exampleRow, tableKeys, tableOf } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { defaultWorkbookLimits } from '../../limits.ts';
import { makeWorkbook, sheetXml, workbookParts } from '../../test-support/make-workbook.ts';
import type { DraftCell, SheetDraft } from '../../test-support/make-workbook.ts';
import { makeZip } from '../../test-support/make-zip.ts';
import { readPlaces } from '../../test-support/read-places.ts';
import type { WorkbookRead } from '../../test-support/read-places.ts';

const code = 'S00000000000000000000Z';

const read = (...sheets: readonly SheetDraft[]): Promise<WorkbookRead> => readPlaces(makeWorkbook({ sheets }));
const bouts = (...rows: readonly (readonly DraftCell[] | null)[]): SheetDraft => ({ name: 'bouts', rows });

function column({ tables: { bouts: table } }: WorkbookRead, key: string) {
  return table && Array.from({ length: table.length }, (_, row) => table.column(key).cell(row));
}

/** What readers make of single cells in a column of numbers. */
async function distances(...cells: readonly string[]): Promise<WorkbookRead> {
  return readPlaces(
    makeWorkbook({
      sheets: [bouts(['bout_no', 'distance_m', 'steps'], ...cells.map((xml, index) => [index + 1, { xml }]))],
      sharedStrings: '<si><t>12.5</t></si><si><r><t>1</t></r><r><rPr><b/></rPr><t>3</t></r><rPh sb="0" eb="1"><t>9</t></rPh></si>',
      styles: '<cellXfs><xf numFmtId="0"/><xf numFmtId="14"/><xf numFmtId="20"/></cellXfs>',
    }),
  );
}

describe('readWorkbook', () => {
  it('reads one table from each sheet that is named after it, by key or name, however it is written', async () => {
    const found = await read(
      { name: 'Adverse Events', rows: [['event_no'], [1]] },
      { name: 'BOUTS', rows: [['bout_no'], [1], [2]] },
      { name: 'neurological-exams', rows: [['exam_day'], [3]] },
    );
    expect(Object.fromEntries(Object.entries(found.tables).map(([key, table]) => [key, table.length]))).toEqual({
      adverse_events: 1,
      bouts: 2,
      exams: 1,
    });
    expect(found.places).toEqual([]);
  });

  it('reads columns in any order, by name and with a unit, and says in which row each stood', async () => {
    const found = await read(
      bouts(null, ['Distance (ft)', 'PARTICIPANT', 'Bout number'], null, [100, code, 1], [], ['', ' ', null], [200, code, 2]),
    );
    expect(found.places).toEqual([]);
    expect([column(found, 'distance_m'), column(found, 'participant'), column(found, 'bout_no')]).toEqual([
      [30.48, 60.96],
      [code, code],
      [1, 2],
    ]);
    expect(Array.from(found.tables.bouts?.lines ?? [])).toEqual([4, 7]);
  });

  it('reads the example row of every table as its CSV file is read', async () => {
    const sheets = tableKeys.map((name) => {
      const { variables } = tableOf(name);
      const example = exampleRow(name);
      return { name, rows: [variables.map(({ key }) => key), variables.map(({ key }) => example[key] ?? null)] };
    });
    const { tables, findings } = await read(...sheets);
    expect(findings).toEqual([]);
    for (const key of tableKeys) {
      const example = exampleRow(key);
      expect(tables[key]?.row(0)).toEqual(tableOf(key).variables.map((variable) => example[variable.key] ?? null));
    }
  });

  it('reads cells of every kind: shared, inline and formatted texts, numbers, results of formulas', async () => {
    const found = await distances(
      '<c r="@" t="s"><v>0</v></c>',
      '<c r="@" t="s"><v>1</v></c>',
      '<c r="@" t="inlineStr"><is><r><t>1</t></r><r><t xml:space="preserve">4 </t></r></is></c>',
      '<c r="@"><v>12.25</v></c>',
      '<c r="@" t="n"><f>SUM(1,2)</f><v>3</v></c>',
      '<c r="@" t="str"><f>"1"&amp;"6"</f><v>16</v></c>',
      '<c r="@" t="str"><f>""</f><v></v></c>',
      '<c r="@"><v>1.7E1</v></c>',
      '<c r="@" s="1"/>',
    );
    expect(found.places).toEqual([]);
    expect(column(found, 'distance_m')).toEqual([12.5, 13, 14, 12.25, 3, 16, null, 17, null]);
  });

  it('reads the 15 digits that the screen shows, not what binary arithmetic made of them', async () => {
    // What IEEE 754 gives for 1.1, for 3 * 0.1 and for 0.1 / 3 with 17 digits.
    const found = await distances(
      '<c r="@"><v>1.1000000000000001</v></c>',
      '<c r="@"><v>0.30000000000000004</v></c>',
      '<c r="@"><v>3.3333333333333335E-2</v></c>',
    );
    expect(column(found, 'distance_m')).toEqual([1.1, 0.3, 0.0333333333333333]);
    const whole = await read(bouts(['bout_no', 'steps'], [1, { xml: '<c r="@"><v>28.999999999999996</v></c>' }]));
    expect([whole.places, column(whole, 'steps')]).toEqual([[], [29]]);
  });

  it('reads true and false as yes and no, and codes typed as numbers or as text', async () => {
    const found = await readPlaces(
      makeWorkbook({
        sheets: [
          bouts(['stim_on', 'stop_reason'], [true, 'Fatigue '], [false, 'pain'], ['Y', null]),
          { name: 'adverse_events', rows: [['severity'], [1], ['2']] },
        ],
      }),
    );
    expect(column(found, 'stim_on')).toEqual(['yes', 'no', 'yes']);
    expect(column(found, 'stop_reason')).toEqual(['fatigue', 'pain', null]);
    expect([0, 1].map((row) => found.tables.adverse_events?.column('severity').cell(row))).toEqual(['1', '2']);
  });

  it('reads rows and cells that do not say where they stand', async () => {
    const xml = `<worksheet><sheetData><row><c t="inlineStr"><is><t>bout_no</t></is></c><c t="inlineStr"><is><t>steps</t></is></c></row>
      <row><c><v>1</v></c><c/><c/></row><row r="9"><c r="B9"><v>7</v></c></row><row><c/><c><v>8</v></c></row></sheetData></worksheet>`;
    const found = await read({ name: 'bouts', xml });
    expect(found.places).toEqual([]);
    expect([column(found, 'bout_no'), column(found, 'steps')]).toEqual([
      [1, null, null],
      [null, 7, 8],
    ]);
    expect(Array.from(found.tables.bouts?.lines ?? [])).toEqual([2, 9, 10]);
  });

  it('takes other namespace prefixes, UTF-16 and absolute targets', async () => {
    const parts = workbookParts({
      sheets: [
        {
          name: 'bouts',
          xml: `<x:worksheet xmlns:x="http://purl.oclc.org/ooxml/spreadsheetml/main"><x:sheetData><x:row r="1"><x:c r="A1" t="str"><x:v>steps</x:v></x:c></x:row><x:row r="2"><x:c r="A2"><x:v>5</x:v></x:c></x:row></x:sheetData></x:worksheet>`,
        },
      ],
    });
    const changed = parts.map((part) => {
      if (part.name === 'xl/_rels/workbook.xml.rels')
        return { ...part, content: String(part.content).replace('"worksheets/', '"/xl/./charts/../worksheets/') };
      if (!part.name.startsWith('xl/worksheets')) return part;
      return { ...part, content: Uint8Array.from(Buffer.from(`\ufeff${String(part.content)}`, 'utf16le')) };
    });
    const found = await readPlaces(makeZip(changed));
    expect([found.places, column(found, 'steps')]).toEqual([[], [5]]);
  });

  it('decodes characters that XML cannot hold', async () => {
    const found = await read(bouts(['stop_reason', 'bout_no'], ['pain_x000D__x000A_', 1]));
    expect([found.places, column(found, 'stop_reason')]).toEqual([[], ['pain']]);
  });

  it('passes over empty rows and cells that are only formatted, however far out', async () => {
    const styled = Array.from(
      { length: 2_000 },
      (_, index) => `<row r="${index + 3}" s="4" customFormat="1"><c r="A${index + 3}" s="4"/><c r="XFD${index + 3}" s="4"/></row>`,
    );
    const sheet = bouts(['bout_no'], [1]);
    const xml = sheetXml(sheet).replace('</sheetData>', `${styled.join('')}</sheetData>`);
    const found = await read({ name: 'bouts', xml });
    expect([found.places, found.tables.bouts?.length]).toEqual([[], 1]);
  });

  it('gives a table without rows for a header alone, and none for an empty sheet', async () => {
    const found = await read(bouts(['bout_no']), { name: 'sessions', rows: [] });
    expect([found.places, found.tables.bouts?.length, found.tables.sessions]).toEqual([[], 0, undefined]);
  });

  it('reads what arrives in single bytes', async () => {
    const whole = makeWorkbook({ sheets: [bouts(['bout_no'], [1], [2])] });
    async function* bytes(): AsyncGenerator<Uint8Array> {
      for (const byte of whole) yield Uint8Array.of(byte);
    }
    expect(column(await readPlaces(bytes()), 'bout_no')).toEqual([1, 2]);
  });

  it('passes on what goes wrong with the source itself', async () => {
    async function* broken(): AsyncGenerator<Uint8Array> {
      yield Uint8Array.of(0x50);
      throw new Error('connection lost');
    }
    await expect(readPlaces(broken())).rejects.toThrow('connection lost');
  });

  it('keeps reading the other sheets when one cannot be read', async () => {
    const found = await read({ name: 'sessions', rows: [['colour'], ['red']] }, bouts(['bout_no'], [1]));
    expect(found.places).toEqual(['F05 sessions 1 -']);
    expect(column(found, 'bout_no')).toEqual([1]);
  });

  it('takes a decimal comma typed as text beside numbers, and refuses one that could mark thousands', async () => {
    const found = await distances(
      '<c r="@"><v>12.5</v></c>',
      '<c r="@" t="inlineStr"><is><t>12,5</t></is></c>',
      '<c r="@" t="inlineStr"><is><t>1,234</t></is></c>',
    );
    expect(column(found, 'distance_m')).toEqual([12.5, 12.5, null]);
    expect(found.places).toEqual(['F14 bouts 4 distance_m']);
  });

  it('keeps at most as many rows as allowed', async () => {
    const { places } = await readPlaces(makeWorkbook({ sheets: [bouts(['bout_no'], [1], [2], [3])] }), {
      ...defaultWorkbookLimits,
      rows: 2,
    });
    expect(places).toEqual(['F03 bouts 4 -']);
  });
});

describe('F42 (sheets nobody declared)', () => {
  it('finds a sheet with cells that is none of the tables, by its position and not by its name', async () => {
    const { places, findings } = await read(bouts(['bout_no'], [1]), { name: 'Erika Mustermann', rows: [['x']] });
    expect(places).toEqual(['F42 workbook - -']);
    expect(findings.find(({ rule }) => rule === 'F42')?.found).toBe('The sheet in position 2 of the workbook is none of the tables.');
    expect(JSON.stringify(findings)).not.toMatch(/Mustermann/);
  });

  it('passes empty sheets, formatted ones, and those that the template brings', async () => {
    const { places } = await read(
      bouts(['bout_no'], [1]),
      { name: 'Sheet1', rows: [] },
      { name: 'Sheet2', rows: [[{ xml: '<c r="@" s="3"/>' }]] },
      { name: 'Definitions', rows: [['x']] },
      { name: 'Lists', rows: [['x']], state: 'hidden' },
    );
    expect(places).toEqual([]);
  });
});

describe('F43 (two sheets for a table)', () => {
  it('finds the second sheet and reads the first', async () => {
    const found = await read(bouts(['bout_no'], [1]), { name: 'Bouts ', rows: [['bout_no'], [2]] });
    expect(found.places).toEqual(['F43 bouts - -']);
    expect(column(found, 'bout_no')).toEqual([1]);
  });

  it('passes one sheet for each table', async () => {
    expect((await read(bouts(['bout_no'], [1]), { name: 'sessions', rows: [['session_no'], [1]] })).places).toEqual([]);
  });
});

describe('F44 (merged cells)', () => {
  const behind = '<mergeCells count="3"><mergeCell ref="A2:A3"/><mergeCell ref="B3:D3"/><mergeCell ref="F9:G9"/></mergeCells>';

  it('finds merged cells of the table and reads the value in the first of them only', async () => {
    const found = await read({ ...bouts(['bout_no', 'steps', 'rest_after_s'], [1, 10, 0], [null, 20, null]), behind });
    expect(found.places).toEqual(['F44 bouts 2 bout_no', 'F44 bouts 3 steps']);
    expect(column(found, 'bout_no')).toEqual([1, null]);
  });

  it('passes merged cells above, below and beside the table', async () => {
    const around = '<mergeCells><mergeCell ref="A1:C1"/><mergeCell ref="D3:E3"/><mergeCell ref="A4:A5"/></mergeCells>';
    expect((await read({ ...bouts(null, ['bout_no', 'steps'], [1, 10]), behind: around })).places).toEqual([]);
  });
});

describe('F45 (what is hidden)', () => {
  it('finds hidden columns, rows and sheets and reads them all the same', async () => {
    const hiddenRow = (line: number): string => `<row r="${line}" hidden="1"><c r="A${line}"><v>${line}</v></c></row>`;
    const xml = sheetXml({
      ...bouts(['bout_no', 'steps', 'colour']),
      before: '<cols><col min="2" max="3" width="9" hidden="1"/></cols>',
    }).replace('</sheetData>', `${hiddenRow(2)}${hiddenRow(3)}</sheetData>`);
    const found = await read({ name: 'bouts', xml, state: 'veryHidden' });
    expect(found.places).toEqual(['F06 bouts 1 colour', 'F45 bouts - -', 'F45 bouts - colour', 'F45 bouts - steps', 'F45 bouts 2 -']);
    expect(found.findings.at(-1)?.found).toBe('Hidden rows, 2 in all, of which this is the first.');
    expect(column(found, 'bout_no')).toEqual([2, 3]);
  });

  it('passes hidden columns and rows that are empty', async () => {
    const xml = sheetXml({ ...bouts(['bout_no', 'steps'], [1, 2]), before: '<cols><col min="3" max="16384" hidden="1"/></cols>' }).replace(
      '</sheetData>',
      '<row r="9" hidden="1"><c r="A9"/></row></sheetData>',
    );
    expect((await read({ name: 'bouts', xml })).places).toEqual([]);
  });
});

describe('F46 (formulas without a result)', () => {
  it('finds errors of calculation and formulas that were never worked out', async () => {
    const found = await distances(
      '<c r="@" t="e"><f>1/0</f><v>#DIV/0!</v></c>',
      '<c r="@"><f>A1+1</f></c>',
      '<c r="@" t="str"><f>A1&amp;"x"</f></c>',
      '<c r="@" s="1"><v>-3</v></c>',
    );
    expect(found.places).toEqual(['F46 bouts 2 distance_m', 'F46 bouts 3 distance_m', 'F46 bouts 4 distance_m', 'F46 bouts 5 distance_m']);
    expect(found.tables.bouts?.column('distance_m').isUnreadable(0)).toBe(true);
  });

  it('passes formulas with a result', async () => {
    expect((await distances('<c r="@"><f>1+1</f><v>2</v></c>')).places).toEqual([]);
  });
});

describe('F47 (calendar dates)', () => {
  it('finds dates and times, by their style or their kind', async () => {
    const found = await distances(
      '<c r="@" s="1"><v>45000</v></c>',
      '<c r="@" s="2"><v>0.5</v></c>',
      '<c r="@" t="d"><v>2026-03-05</v></c>',
    );
    expect(found.places).toEqual(['F47 bouts 2 distance_m', 'F47 bouts 3 distance_m', 'F47 bouts 4 distance_m']);
    expect(column(found, 'distance_m')).toEqual([null, null, null]);
  });

  it('passes numbers of any other style', async () => {
    expect((await distances('<c r="@" s="0"><v>45000</v></c>', '<c r="@" s="17"><v>1</v></c>')).places).toEqual([]);
  });
});

describe('F48 (the example row of the template)', () => {
  const keys = tableOf('bouts').variables.map(({ key }) => key);
  const example = { ...exampleRow('bouts'), participant: 'EXAMPLE' } as Readonly<Record<string, string | number>>;
  const exampleCells = (changes: Readonly<Record<string, string | number>> = {}): DraftCell[] => {
    const row: Readonly<Record<string, string | number>> = { ...example, ...changes };
    return keys.map((key) => row[key] ?? null);
  };

  it('finds a row that is still marked as the example and holds something else, and does not read it', async () => {
    const found = await read(bouts(keys, exampleCells({ distance_m: 301 })));
    expect([found.places, found.tables.bouts?.length]).toEqual([['F48 bouts 2 participant'], 0]);
  });

  it('passes over the example as it was', async () => {
    const found = await read(bouts(keys, exampleCells(), exampleCells({ participant: code, bout_no: 2 })));
    expect([found.places, column(found, 'bout_no')]).toEqual([[], [2]]);
  });
});
