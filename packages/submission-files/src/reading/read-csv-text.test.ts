import { describe, expect, it } from 'vitest';
import { encode } from '../test-support/findings-of.ts';
import { defaultLimits } from '../limits.ts';
import { readCsvText } from './read-csv-text.ts';
import type { CsvText } from './read-csv-text.ts';
import type { Unreadable } from './unreadable.ts';

async function read(...input: Parameters<typeof readCsvText>): Promise<CsvText> {
  const found = await readCsvText(...input);
  if (!found.ok) throw new Error(found.found);
  return found;
}

async function refusal(...input: Parameters<typeof readCsvText>): Promise<Unreadable> {
  const found = await readCsvText(...input);
  if (found.ok) throw new Error('was read');
  return found;
}

describe('the CSV file of a clinic, as text', () => {
  it('keeps headers, cells and lines as they stand, and passes over blank rows', async () => {
    const found = await read(encode('\r\nMRN,Seen on,Notes,\r\n0042,05/03/2026,"two\nlines"\r\n,,\r\n0043,06/03/2026,\r\n'));
    expect(found.headers).toEqual(['MRN', 'Seen on', 'Notes']);
    expect(found.rows).toEqual([
      ['0042', '05/03/2026', 'two\nlines'],
      ['0043', '06/03/2026', ''],
    ]);
    expect(found.lines).toEqual([3, 6]);
  });

  it('fills rows that end early with empty cells, and keeps what stands beyond the header', async () => {
    const found = await read(encode('a,b,c\n1,2,3\n4\n5,6,7,8\n9,10,11,,\n'));
    expect(found.rows).toEqual([
      ['1', '2', '3'],
      ['4', '', ''],
      ['5', '6', '7', '8'],
      ['9', '10', '11'],
    ]);
  });

  it.each([
    ['semicolons with decimal commas', 'id;speed;day\n1;0,5;3\n2;0,75;4\n', ';', ['0,5', '0,75']],
    ['tabs', 'id\tspeed, mean\tday\n1\t0.5\t3\n', '\t', ['0.5']],
    ['commas with semicolons in a note', 'id,speed,note\n1,0.5,a; b\n2,0.6,c; d; e\n', ',', ['0.5', '0.6']],
  ])('finds that cells are separated by %s', async (_, text, delimiter, speeds) => {
    const found = await read(encode(text));
    expect(found.delimiter).toBe(delimiter);
    expect(found.rows.map((row) => row[1])).toEqual(speeds);
  });

  it('says where another separator would fit too, and takes the one that somebody states', async () => {
    const file = encode('id;speed,x\n1;2,3\n2;4,5\n');
    expect((await read(file)).fittingDelimiters).toEqual([',', ';']);
    expect((await read(file, ';')).headers).toEqual(['id', 'speed,x']);
  });

  it('finds the names of the columns under a title', async () => {
    const found = await read(encode('Training log;;\n;;November\n\nMRN;Date;km\n0042;x;1\n'));
    expect(found).toMatchObject({ headers: ['MRN', 'Date', 'km'], rowsAbove: 2, rows: [['0042', 'x', '1']], lines: [5] });
    const bare = await read(encode('Training, November\n\nMRN;Date;km\n0042;x;0,5\n'));
    expect(bare).toMatchObject({ delimiter: ';', fittingDelimiters: [';'], rowsAbove: 1, lines: [4] });
  });

  it('reads a file of one column', async () => {
    expect(await read(encode('MRN\n0042\n'))).toMatchObject({ headers: ['MRN'], rows: [['0042']], fittingDelimiters: [] });
  });

  it('reads UTF-16 and Windows-1252, however the bytes arrive', async () => {
    const wide = new Uint8Array([0xff, 0xfe, ...[...'Größe,x\n1,2\n'].flatMap((letter) => [letter.charCodeAt(0), 0])]);
    expect(await read(wide)).toMatchObject({ headers: ['Größe', 'x'], encoding: 'utf-16le' });
    const narrow = Uint8Array.from('Größe,x\n1,2\n', (letter) => letter.charCodeAt(0));
    async function* bytes() {
      for (const byte of narrow) yield Uint8Array.of(byte);
    }
    expect(await read(bytes())).toMatchObject({ headers: ['Größe', 'x'], encoding: 'windows-1252', rows: [['1', '2']] });
  });

  it('takes the first row of one column for its name, however many rows follow', async () => {
    const many = Array.from({ length: 15 }, (_, at) => String(at));
    for (const rows of [many.slice(0, 3), many]) {
      const found = await read(encode(['MRN', ...rows, ''].join('\n')));
      expect(found).toMatchObject({ headers: ['MRN'], rowsAbove: 0, rows: rows.map((row) => [row]) });
      expect(found.lines).toEqual(rows.map((_, at) => at + 2));
    }
  });

  it('refuses what it cannot read, with the line and never with a cell', async () => {
    expect(await refusal(encode(''))).toMatchObject({ rule: 'F05' });
    expect(await refusal(encode('a,b\n1,"open\n'))).toMatchObject({ rule: 'F04', line: 2 });
    expect(await refusal(encode('a,b\n1,"closed"behind\n'))).toMatchObject({ rule: 'F04', line: 2 });
    expect(await refusal(encode('a\n1\n2\n'), undefined, { ...defaultLimits, rows: 1 })).toMatchObject({ rule: 'F03', line: 3 });
    expect(await refusal(Uint8Array.of(0x50, 0x4b, 3, 4))).toMatchObject({ rule: 'F01' });
  });
});
