import { exampleRow, tableOf } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { encode } from '../test-support/findings-of.ts';
import { FindingLog } from '../finding-log.ts';
import type { Finding } from '../finding.ts';
import { defaultLimits } from '../limits.ts';
import type { ReadLimits } from '../limits.ts';
import type { TypedTable } from '../table/typed-table.ts';
import { readCsv, readTable } from './read-csv.ts';

const code = 'S00000000000000000000Z';

interface Read {
  readonly table: TypedTable;
  readonly findings: readonly Finding[];
  readonly places: readonly string[];
}

async function read(source: string | Uint8Array | AsyncIterable<Uint8Array>, limits: ReadLimits = defaultLimits): Promise<Read> {
  const log = new FindingLog();
  const table = await readTable('bouts', typeof source === 'string' ? encode(source) : source, log, limits);
  const findings = log.byRule().flatMap(({ kept }) => kept);
  return { table, findings, places: findings.map(({ rule, line, column }) => `${rule} ${line} ${column}`) };
}

/** Findings other than the columns that these short files leave out. */
const besidesMissing = ({ places }: Read): string[] => places.filter((place) => !place.startsWith('F08'));
const column = ({ table }: Read, key: string) => Array.from({ length: table.length }, (_, row) => table.column(key).cell(row));

async function* chunks(bytes: Uint8Array, size: number): AsyncGenerator<Uint8Array> {
  for (let from = 0; from < bytes.length; from += size) yield bytes.subarray(from, from + size);
}

describe('readCsv', () => {
  it('reads columns in any order, by key, name or alias, however they are spaced', async () => {
    const found = await read(`Session Day,PARTICIPANT-CODE,distance,Duration seconds,Bout  Number\r\n3,${code},12.5,60,1\r\n`);
    expect(besidesMissing(found)).toEqual([]);
    expect(['session_day', 'participant', 'distance_m', 'duration_s', 'bout_no'].map((key) => found.table.column(key).cell(0))).toEqual([
      3,
      code,
      12.5,
      60,
      1,
    ]);
  });

  it.each([
    ['commas', ','],
    ['semicolons', ';'],
    ['tabs', '\t'],
  ])('finds out that cells are separated by %s', async (_, delimiter) => {
    const found = await read([`participant`, `bout_no`, `distance_m`].join(delimiter) + '\n' + [code, '2', '7.5'].join(delimiter) + '\n');
    expect(besidesMissing(found)).toEqual([]);
    expect(column(found, 'distance_m')).toEqual([7.5]);
  });

  it('finds the separator by the names of the columns, not by counting', async () => {
    const found = await read(`participant;"distance_m";bout_no, or so, or so, or so\n${code};1;1\n`);
    expect(column(found, 'participant')).toEqual([code]);
  });

  it('reads decimal commas of a semicolon file', async () => {
    const found = await read('distance_m;duration_s\n12,5;60\n1,234;61\n');
    expect(column(found, 'distance_m')).toEqual([12.5, 1.234]);
    expect(besidesMissing(found)).toEqual([]);
  });

  it('refuses a comma in a comma-separated file that could mark thousands', async () => {
    const found = await read('distance_m,steps\n"1,234","1,234"\n"12,5",3\n');
    expect(besidesMissing(found)).toEqual(['F10 2 steps', 'F14 2 distance_m']);
    expect(column(found, 'distance_m')).toEqual([null, 12.5]);
  });

  it('refuses a second way of writing decimals in the same file', async () => {
    const found = await read('distance_m;duration_s\n12,5;60\n12.5;60\n');
    expect(besidesMissing(found)).toEqual(['F14 3 distance_m']);
  });

  it.each([
    ['distance (ft)', '100', 'distance_m', 30.48],
    ['Distance [km]', '0.25', 'distance_m', 250],
    ['distance_ft', '1', 'distance_m', 0.3048],
    ['duration (min)', '1.5', 'duration_s', 90],
    // 2 km/h = 5/9 m/s; 1.2 mi/h = 0.536448 m/s (NIST SP 811 (2008), B.8).
    ['treadmill speed (km/h)', '2', 'treadmill_speed_mps', 5 / 9],
    ['belt_speed_mph', '1.2', 'treadmill_speed_mps', 0.536448],
    ['bws (lb)', '10', 'bws_kg', 4.5359237],
    ['weight support (pounds)', '10', 'bws_kg', 4.5359237],
    ['Distance (m)', '7', 'distance_m', 7],
  ])('converts %s exactly', async (header, written, key, stored) => {
    const found = await read(`${header}\n${written}\n`);
    expect(besidesMissing(found)).toEqual([]);
    expect(column(found, key)).toEqual([stored]);
  });

  it('reports a unit that cannot be converted, and leaves the column out', async () => {
    const found = await read('bout_no,distance (yards)\n1,10\n');
    expect(besidesMissing(found)).toEqual(['F15 1 distance_m']);
    expect(found.findings.find(({ rule }) => rule === 'F15')?.mend).toBe('Use one of these units: m, ft, km.');
    expect(column(found, 'distance_m')).toEqual([null]);
  });

  it('reports undeclared, repeated and missing columns', async () => {
    const { places } = await read(`participant,Distance,distance_m,therapist,,bout_no\n${code},1,2,x,,3\n`);
    expect(places).toContain('F06 1 therapist');
    expect(places).toContain('F06 1 E');
    expect(places).toContain('F07 1 distance_m');
    expect(places.filter((place) => place.startsWith('F08'))).toHaveLength(
      tableOf('bouts').variables.filter(({ key, required }) => required.when === 'always' && key !== 'participant' && key !== 'bout_no')
        .length,
    );
  });

  it('repeats no cell of a first row that is mostly no header', async () => {
    const { findings } = await read('bout_no,Erika Mustermann,12.03.1960\n1,2,3\n');
    expect(JSON.stringify(findings)).not.toMatch(/Mustermann|1960/);
    expect(findings.map(({ rule, column: place }) => `${rule} ${place}`)).toEqual(expect.arrayContaining(['F06 B', 'F06 C']));
  });

  it('shows a header without control marks, marks of writing direction, and excess', async () => {
    const { findings } = await read(`bout_no,session_no,a\u202Eb\u0007${'c'.repeat(100)}\n1,2,3\n`);
    expect(findings.find(({ rule }) => rule === 'F06')?.column).toBe(`a b ${'c'.repeat(56)}…`);
  });

  it.each(['__proto__', 'constructor', 'toString', 'hasOwnProperty'])(
    'takes a column named %s for one more undeclared column',
    async (name) => {
      const found = await read(`bout_no,${name}\n1,2\n`);
      expect(besidesMissing(found)).toEqual([`F06 1 ${name}`]);
      expect(({} as Record<string, unknown>)['bout_no']).toBeUndefined();
    },
  );

  it('stops at a first row that names none of the columns', async () => {
    const found = await read('measure,value\nbbs,12\n');
    expect(found.places).toEqual(['F05 1 null']);
    expect(found.table.length).toBe(0);
  });

  it.each([
    ['an empty file', ''],
    ['a file of blank lines', '\n\n  \n'],
  ])('stops at %s', async (_, text) => {
    expect((await read(text)).places).toEqual(['F05 null null']);
  });

  it('passes over blank rows and counts their lines', async () => {
    const found = await read('\nbout_no,steps\n1,10\n\n , \n2,20\n,\n\n\n');
    expect(Array.from(found.table.lines)).toEqual([3, 6]);
    expect(column(found, 'steps')).toEqual([10, 20]);
  });

  it('reports rows that are longer or shorter than the header', async () => {
    expect(besidesMissing(await read('bout_no,steps\n1,10,7\n2\n3,30,\n'))).toEqual(['F09 2 null', 'F09 3 null']);
  });

  it('reports text behind a closing quotation mark and reads on', async () => {
    const found = await read('bout_no,stop_reason\n1,"fat"igue\n2,pain\n');
    expect(besidesMissing(found)).toEqual(['F04 2 null']);
    expect(column(found, 'stop_reason')).toEqual(['fatigue', 'pain']);
  });

  it('keeps the rows before a quotation mark that is never closed', async () => {
    const found = await read('bout_no,stop_reason\n1,pain\n2,"pain\n3,pain\n');
    expect(besidesMissing(found)).toEqual(['F04 3 null']);
    expect(column(found, 'bout_no')).toEqual([1]);
  });

  it.each([
    ['=1+1', 'F13'],
    ['=HYPERLINK("x")', 'F13'],
    ['+SUM(A1)', 'F13'],
    ['@cmd', 'F13'],
    ['＝1', 'F13'],
    [';=1', 'F13'],
    ['\t=1', 'F13'],
    ['\t5', 'F13'],
    ['-cmd', 'F13'],
    ['5 m', 'F10'],
    ['1e3', 'F10'],
    ['1 000', 'F10'],
    ['1.2.3', 'F10'],
    ['NaN', 'F10'],
    ['-', 'F10'],
    ['1.', 'F10'],
  ])('refuses %j in a column of numbers', async (cell, rule) => {
    const found = await read(`bout_no,distance_m\n1,"${cell.replaceAll('"', '""')}"\n`);
    expect(besidesMissing(found)).toEqual([`${rule} 2 distance_m`]);
    expect(found.table.column('distance_m').isUnreadable(0)).toBe(true);
  });

  it.each([
    ['+5', 5],
    ['-5', -5],
    ['−5', -5],
    [' 5 ', 5],
    ['.5', 0.5],
    ['-0', 0],
    ['12.0', 12],
    ['0.1234567890123456', 0.1234567890123456],
  ])('reads %j as a number', async (cell, value) => {
    expect(column(await read(`bout_no,distance_m\n1,${cell}\n`), 'distance_m')).toEqual([value]);
  });

  it('reads codes in any case and flags in their usual spellings, and refuses others with the list', async () => {
    const found = await read('bout_no,stop_reason,stim_on\n1, Fatigue ,Y\n2,tired,maybe\n');
    expect([column(found, 'stop_reason'), column(found, 'stim_on')]).toEqual([
      ['fatigue', null],
      ['yes', null],
    ]);
    expect(besidesMissing(found)).toEqual(['F11 3 stim_on', 'F11 3 stop_reason']);
    expect(found.findings.find(({ column: key, rule }) => rule === 'F11' && key === 'stop_reason')?.mend).toMatch(/planned, signal_fading/);
  });

  it('refuses a fraction in a column of whole numbers, and takes 12.0', async () => {
    const found = await read('bout_no,steps\n1,12.5\n2,12.0\n');
    expect(besidesMissing(found)).toEqual(['F10 2 steps']);
    expect(column(found, 'steps')).toEqual([null, 12]);
  });

  it('refuses anything but participant codes, and repeats none of it', async () => {
    const found = await read(`participant,bout_no\nMustermann,1\n4711,2\n${code},3\n${code.toLowerCase()},4\n`);
    expect(besidesMissing(found)).toEqual(['F12 2 participant', 'F12 3 participant', 'F12 5 participant']);
    expect(JSON.stringify(found.findings)).not.toMatch(/Mustermann|4711/);
    expect(column(found, 'participant')).toEqual([null, null, code, null]);
  });

  it('reads grades as they are written, by the measure of the row, wherever its column stands', async () => {
    const log = new FindingLog();
    const table = await readTable('assessments', encode('value,measure\n1+,mas\n1.5,bbs\n2,mas\n1+,bbs\n2.5,mas\n'), log);
    expect(Array.from({ length: 5 }, (_, row) => table.column('value').cell(row))).toEqual([1.5, 1.5, 2, null, null]);
    const places = log
      .byRule()
      .flatMap(({ id, kept }) => (id === 'F08' ? [] : kept.map(({ line, column: key }) => `${id} ${line} ${key}`)));
    expect(places).toEqual(['F10 5 value', 'F11 6 value']);
  });

  it.each([
    ['bytes', { bytes: 40 }, null],
    ['columns', { columns: 2 }, 1],
    ['cell length', { cellLength: 5 }, 1],
    ['rows', { rows: 1 }, 3],
  ])('stops beyond the limit of %s', async (_, limits, line) => {
    const file = 'bout_no,steps,rest_after_s\n1,10,0\n2,20,0\n';
    expect(besidesMissing(await read(file, { ...defaultLimits, ...limits }))).toEqual([`F03 ${line} null`]);
    expect(besidesMissing(await read(file))).toEqual([]);
  });

  it('counts the bytes that arrive and stops asking for more', async () => {
    let sent = 0;
    async function* endless(): AsyncGenerator<Uint8Array> {
      yield encode('bout_no,steps\n');
      for (;;) {
        sent += 1;
        yield encode('1,10\n'.repeat(1_000));
      }
    }
    const found = await read(endless(), { ...defaultLimits, bytes: 100_000 });
    expect(besidesMissing(found)).toEqual(['F03 null null']);
    expect(sent).toBeLessThan(25);
  });

  it('refuses 200,000 columns at the header', async () => {
    const header = ['bout_no', ...Array.from({ length: 200_000 }, (_, index) => `c${index}`)].join(',');
    expect((await read(`${header}\n`)).places).toEqual(['F03 1 null']);
  });

  it('refuses a cell of 5 million characters without reading to its end', async () => {
    const found = await read(chunks(encode(`bout_no,steps\n1,${'9'.repeat(5_000_000)}\n`), 65_536));
    expect(besidesMissing(found)).toEqual(['F03 2 null']);
  });

  it('reads ten million empty lines as an empty file', async () => {
    expect((await read(new Uint8Array(10_000_000).fill(10))).places).toEqual(['F05 null null']);
  });

  it('gives the same rows and findings from single bytes as from the whole', async () => {
    const file = encode(`participant,bout_no,distance_m,stop_reason\r\n${code},1,"12.5",pain\r\n${code},2,x,"pa\r\nin"\r\nÄ,3,1,pain\r\n`);
    const whole = await read(file);
    const pieces = await read(chunks(file, 1));
    expect(pieces.places).toEqual(whole.places);
    expect(Array.from({ length: pieces.table.length }, (_, row) => pieces.table.row(row))).toEqual(
      Array.from({ length: whole.table.length }, (_, row) => whole.table.row(row)),
    );
    expect(Array.from(pieces.table.lines)).toEqual(Array.from(whole.table.lines));
  });

  it('yields rows in batches that together are the whole table', async () => {
    const rows = 60_000;
    const file = encode(
      `bout_no,steps,stop_reason\n${Array.from({ length: rows }, (_, index) => `1,${index},${index % 2 ? 'pain' : 'planned'}\n`).join('')}`,
    );
    const lengths: number[] = [];
    let next = 0;
    for await (const batch of readCsv('bouts', file, new FindingLog())) {
      lengths.push(batch.length);
      const rowsAsWritten = Array.from({ length: batch.length }, (_, row) => [
        next + row,
        (next + row) % 2 ? 'pain' : 'planned',
        next + row + 2,
      ]);
      const rowsAsRead = rowsAsWritten.map((_, row) => [
        batch.column('steps').number(row),
        batch.column('stop_reason').word(row),
        batch.lines[row],
      ]);
      expect(rowsAsRead).toEqual(rowsAsWritten);
      next += batch.length;
    }
    expect(next).toBe(rows);
    expect(lengths.length).toBeGreaterThan(1);
    expect(Math.max(...lengths)).toBeLessThan(25_000);
  });

  it('passes on what goes wrong with the source itself', async () => {
    async function* broken(): AsyncGenerator<Uint8Array> {
      yield encode('bout_no\n');
      throw new Error('connection lost');
    }
    await expect(read(broken())).rejects.toThrow('connection lost');
  });

  it('reads the example row of every table without a finding', async () => {
    const { variables } = tableOf('bouts');
    const example = exampleRow('bouts');
    const found = await read(`${variables.map(({ key }) => key).join(',')}\n${variables.map(({ key }) => example[key] ?? '').join(',')}\n`);
    expect(found.places).toEqual([]);
    expect(found.table.row(0)).toEqual(variables.map(({ key }) => example[key] ?? null));
  });
});
