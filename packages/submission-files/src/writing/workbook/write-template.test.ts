import { dictionary, exampleRow, findMeasure, tableKeys, tableOf } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { FindingLog } from '../../finding-log.ts';
import { readWorkbook } from '../../reading/workbook/read-workbook.ts';
import { HeaderNames } from '../../table/header-names.ts';
import { makeZip } from '../../test-support/make-zip.ts';
import { readPlaces } from '../../test-support/read-places.ts';
import { elements, partsOf, whole } from '../../test-support/workbook-parts-of.ts';
import { templateHeader } from './template-header.ts';
import { writeTemplate } from './write-template.ts';

const participants = ['S00000000000000000001Z', 'S00000000000000000002Z', '=1+1'];
const template = await whole(writeTemplate({ site: 'Harbour Clinic', month: '2026-11', participants }));
const parts = partsOf(template);

const sheetNames = elements(parts['xl/workbook.xml'] ?? '', 'sheet').map(({ name = '' }) => name);
const sheetPart = (name: string): string => parts[`xl/worksheets/sheet${sheetNames.indexOf(name) + 1}.xml`] ?? '';

/** Texts of a sheet by cell. */
function cells(name: string): ReadonlyMap<string, string> {
  const found = sheetPart(name).matchAll(/<c r="([A-Z]+\d+)"[^>]*?(?:\/>|>(?:<v>([^<]*)<\/v>|<is><t[^>]*>([^<]*)<\/t><\/is>)<\/c>)/g);
  return new Map([...found].map(([, place = '', number, text]) => [place, number ?? text ?? '']));
}

/** The template with more rows on the sheet of a table. */
function withRows(table: string, rows: string): Uint8Array {
  const changed = `xl/worksheets/sheet${sheetNames.indexOf(table) + 1}.xml`;
  return makeZip(
    Object.entries(parts).map(([name, content]) => ({
      name,
      content: name === changed ? content.replace('</sheetData>', `${rows}</sheetData>`) : content,
    })),
  );
}

describe('writeTemplate', () => {
  it('has a sheet for each table, and reading it finds nothing: every column is there, and the example is passed over', async () => {
    const log = new FindingLog();
    const tables = await readWorkbook(template, log);
    expect(log.byRule()).toEqual([]);
    for (const key of tableKeys) {
      expect(tables[key]?.length, key).toBe(0);
      expect(tables[key]?.present, key).toEqual(new Set(tableOf(key).variables.map((variable) => variable.key)));
    }
  });

  it('has headers with units that mean their own column in its own unit', () => {
    for (const table of dictionary.tables) {
      const names = new HeaderNames(table.key);
      for (const variable of table.variables) {
        const meaning = names.meaning(templateHeader(variable));
        expect(meaning, `${table.key} ${variable.key}`).toMatchObject({
          kind: 'column',
          variable: { key: variable.key },
          factor: { times: 1, dividedBy: 1 },
        });
      }
    }
    expect(templateHeader(tableOf('bouts').variables.find(({ key }) => key === 'distance_m')!)).toMatch(/ \(m\)$/);
  });

  it('reads what was typed below the example, and what was typed over it once the participant is', async () => {
    const [code] = participants;
    const typed = withRows('Consents', `<row r="3"><c r="A3" t="inlineStr"><is><t>${code}</t></is></c><c r="B3"><v>1</v></c></row>`);
    const { tables, places } = await readPlaces(typed);
    expect([tables.consents?.length, tables.consents?.row(0).slice(0, 2), places]).toEqual([1, [code, 1], []]);
    const over = makeZip(Object.entries(parts).map(([name, content]) => ({ name, content: content.replaceAll('EXAMPLE', code ?? '') })));
    const read = await readPlaces(over);
    expect([tableKeys.map((key) => read.tables[key]?.length), read.places]).toEqual([tableKeys.map(() => 1), []]);
    expect(read.tables.sessions?.column('planned_min').number(0)).toBe(exampleRow('sessions')['planned_min']);
  });

  it('has one validation for each column, with the words that a spreadsheet program has room for', () => {
    for (const table of dictionary.tables) {
      const validations = elements(sheetPart(table.name), 'dataValidation');
      expect(validations.map(({ promptTitle }) => promptTitle)).toEqual(table.variables.map(({ key }) => key));
      for (const { promptTitle = '', prompt = '', error = '', sqref = '' } of validations) {
        expect(promptTitle.length).toBeLessThanOrEqual(32);
        expect(Math.max(prompt.length, error.length)).toBeLessThanOrEqual(255);
        expect(sqref).toMatch(/^([A-Z]+)2:\1\d+$/);
      }
      const prompts = validations.map(({ prompt = '' }) => prompt);
      expect(
        table.variables.every(({ definition }, index) =>
          prompts[index]?.replaceAll(/&\w+;/g, '').startsWith(definition.replaceAll(/["<>&]/g, '')),
        ),
      ).toBe(true);
    }
  });

  it('offers for each column of codes just the codes that it takes, and for participants the site’s, others being free', () => {
    const lists = cells('Lists');
    for (const table of dictionary.tables) {
      const formulas = [...sheetPart(table.name).matchAll(/promptTitle="(\w+)"[^>]*>(?:<formula1>([^<]*)<\/formula1>)?/g)];
      const ranges = new Map(formulas.map(([, key = '', formula]) => [key, formula]));
      for (const { key, type, codes = [], missingCodes = [] } of table.variables) {
        const [, letters = '', last = ''] = /^Lists!\$([A-Z]+)\$2:\$\1\$(\d+)$/.exec(ranges.get(key) ?? '') ?? [];
        const offered = Array.from({ length: Math.max(Number(last) - 1, 0) }, (_, index) => lists.get(`${letters}${index + 2}`));
        const expected = type === 'pseudonym' ? participants : [...codes, ...missingCodes].map(({ code }) => code);
        expect(offered, `${table.key} ${key}`).toEqual(expected);
      }
      const open = elements(sheetPart(table.name), 'dataValidation').filter(
        ({ type, showErrorMessage }) => type === 'list' && showErrorMessage !== '1',
      );
      expect(open.map(({ promptTitle }) => promptTitle)).toEqual(['participant']);
    }
  });

  it('has no list of participants for a site without any', async () => {
    const empty = partsOf(await whole(writeTemplate({ site: 'a', month: '2026-11', participants: [] })));
    expect(elements(empty['xl/worksheets/sheet2.xml'] ?? '', 'dataValidation')[0]).not.toHaveProperty('type');
  });

  it('lets numbers be typed between the hard limits of their column', () => {
    const numbers = elements(sheetPart('Participants'), 'dataValidation').filter(({ type }) => type === 'whole' || type === 'decimal');
    expect(numbers.map(({ promptTitle }) => promptTitle)).toEqual(
      tableOf('participants').variables.flatMap(({ key, type }) => (type === 'integer' ? [key] : [])),
    );
    expect(sheetPart('Participants')).toContain('<formula1>0</formula1><formula2>90</formula2>');
  });

  it('formats columns of codes as text, from the first row to the last', () => {
    // 49 is the built-in format for text: ECMA-376-1, 18.8.30.
    const styles = [...(parts['xl/styles.xml'] ?? '').replace(/<cellStyleXfs.*<\/cellStyleXfs>/, '').matchAll(/<xf numFmtId="(\d+)"/g)].map(
      ([, format]) => format,
    );
    for (const { name, variables } of dictionary.tables) {
      const columns = elements(sheetPart(name), 'col');
      const areText = columns.map(({ style }) => style !== undefined && styles[Number(style)] === '49');
      expect(areText).toEqual(variables.map(({ type }) => type === 'pseudonym' || type === 'code' || type === 'flag'));
    }
  });

  it('writes the example as text where codes look like numbers, and marks it', () => {
    const severity = tableOf('adverse_events').variables.findIndex(({ key }) => key === 'severity');
    expect(sheetPart('Adverse events')).toMatch(new RegExp(`<row r="2"><c r="A2" s="\\d+" t="inlineStr"><is><t>EXAMPLE</t>`));
    expect(severity).toBeLessThan(26);
    expect(sheetPart('Adverse events')).toMatch(new RegExp(`<c r="${String.fromCharCode(65 + severity)}2" s="\\d+" t="inlineStr">`));
  });

  it('says on its first sheet whom it is for, and defines every column and measure', () => {
    expect([...cells('Start').values()]).toEqual(
      expect.arrayContaining(['Site: Harbour Clinic', 'Month: 2026-11', `Dictionary: version ${dictionary.version}`]),
    );
    expect(sheetNames).toEqual(['Start', ...dictionary.tables.map(({ name }) => name), 'Definitions', 'Measures', 'Lists']);
    const definitions = new Set(cells('Definitions').values());
    for (const { variables } of dictionary.tables) for (const { key } of variables) expect(definitions).toContain(key);
    const offered = tableOf('assessments').variables.find(({ key }) => key === 'measure')?.codes ?? [];
    const measures = new Set(cells('Measures').values());
    for (const { code } of offered) expect([measures.has(code), findMeasure(code)?.key]).toEqual([true, code]);
  });
});
