import { parse } from 'csv-parse/sync';
import { stringify } from 'csv-stringify/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { defaultLimits } from '../limits.ts';
import type { ReadLimits } from '../limits.ts';
import { RecordScanner } from './record-scanner.ts';
import { UnreadableFile } from './unreadable-file.ts';

interface Scanned {
  readonly records: { readonly cells: readonly string[]; readonly line: number; readonly strayQuote: boolean }[];
  readonly refused: UnreadableFile | null;
}

function scan(text: string, { delimiter = ',', limits = defaultLimits, cuts = [] as readonly number[] } = {}): Scanned {
  const records: Scanned['records'] = [];
  const scanner = new RecordScanner(delimiter, limits, (cells, count, line, strayQuote) =>
    records.push({ cells: cells.slice(0, count), line, strayQuote }),
  );
  const ends = [...new Set(cuts)].filter((cut) => cut > 0 && cut < text.length).sort((a, b) => a - b);
  try {
    [...ends, text.length].forEach((end, index, all) =>
      scanner.push(text.slice(index === 0 ? 0 : all[index - 1], end), end === text.length),
    );
  } catch (error) {
    if (!(error instanceof UnreadableFile)) throw error;
    return { records, refused: error };
  }
  return { records, refused: null };
}

const cellsOf = (text: string, delimiter?: string): (readonly string[])[] =>
  scan(text, delimiter === undefined ? {} : { delimiter }).records.map(({ cells }) => cells);
const small = (limits: Partial<ReadLimits>): { limits: ReadLimits } => ({ limits: { ...defaultLimits, ...limits } });

describe('RecordScanner', () => {
  it.each([
    ['CRLF', 'a,b\r\n1,2\r\n'],
    ['LF', 'a,b\n1,2\n'],
    ['CR alone', 'a,b\r1,2\r'],
    ['no line end at the end', 'a,b\n1,2'],
    ['mixed line ends', 'a,b\r1,2\r\n'],
  ])('reads %s', (_, text) => {
    expect(cellsOf(text)).toEqual([
      ['a', 'b'],
      ['1', '2'],
    ]);
  });

  it('reads quoted separators, quotes and line ends as part of the cell', () => {
    expect(cellsOf('"a,b","c ""d""","e\r\nf"\n')).toEqual([['a,b', 'c "d"', 'e\r\nf']]);
  });

  it('reads empty cells, quoted or not, and one behind the last separator', () => {
    expect(cellsOf(',"",\n')).toEqual([['', '', '']]);
  });

  it('keeps a quotation mark inside a cell that does not begin with one', () => {
    expect(cellsOf('5"x,b\n')).toEqual([['5"x', 'b']]);
  });

  it('reads semicolons and tabs', () => {
    expect(cellsOf('a;"b;c"\n', ';')).toEqual([['a', 'b;c']]);
    expect(cellsOf('a\tb\n', '\t')).toEqual([['a', 'b']]);
  });

  it('counts lines as an editor does, by the first line of each record', () => {
    expect(scan('a\r\n"b\nb\r\nb"\r\rc\n').records.map(({ line }) => line)).toEqual([1, 2, 5, 6]);
  });

  it('tells text behind a closing quotation mark', () => {
    expect(scan('"a"b,c\n').records).toEqual([{ cells: ['ab', 'c'], line: 1, strayQuote: true }]);
  });

  it('names the line on which a quotation mark opened that is never closed', () => {
    const { refused, records } = scan('a,b\n1,2\n3,"4\n5,6\n7,8\n');
    expect(records).toHaveLength(2);
    expect(refused).toMatchObject({ rule: 'F04', line: 3 });
  });

  it('takes a quoted cell that runs over lines beyond the limit for one that was never closed', () => {
    const { refused } = scan(`a\n"${'x\n'.repeat(30)}"\n`, small({ cellLength: 20 }));
    expect(refused).toMatchObject({ rule: 'F04', line: 2 });
  });

  it.each([
    ['a plain cell', `a\n${'x'.repeat(21)}\n`],
    ['a quoted cell', `a\n"${'x'.repeat(21)}"\n`],
    ['a cell that has not ended yet', `a\n${'x'.repeat(21)}`],
  ])('refuses %s beyond the limit, with the line', (_, text) => {
    expect(scan(text, small({ cellLength: 20 })).refused).toMatchObject({ rule: 'F03', line: 2 });
    expect(scan(text, small({ cellLength: 21 })).refused).toBeNull();
  });

  it('refuses a row of more cells than allowed, with the line', () => {
    expect(scan('a,b\n1,2,3\n', small({ columns: 2 })).refused).toMatchObject({ rule: 'F03', line: 2 });
    expect(scan('a,b\n1,2\n', small({ columns: 2 })).refused).toBeNull();
  });

  it('gives back what was written, however the text is cut', () => {
    const cell = fc.string({ unit: fc.constantFrom('a', ' ', '"', ',', ';', '\r', '\n', 'ä', '7', '.'), maxLength: 6 });
    const rows = fc.array(fc.array(cell, { minLength: 2, maxLength: 4 }), { minLength: 1, maxLength: 6 });
    fc.assert(
      fc.property(
        rows,
        fc.constantFrom(',', ';'),
        fc.constantFrom('\r\n', '\n', '\r'),
        fc.array(fc.nat(80), { maxLength: 5 }),
        (written, delimiter, record_delimiter, cuts) => {
          const text = stringify(written, { delimiter, record_delimiter, quoted_match: /[\r\n]/ });
          expect(scan(text, { delimiter, cuts }).records.map(({ cells }) => cells)).toEqual(written);
        },
      ),
      { seed: 20260803, numRuns: 500 },
    );
  });

  it('reads well-formed text as csv-parse does', () => {
    const cell = fc.oneof(
      fc.string({ unit: fc.constantFrom('a', '1', ' '), maxLength: 3 }),
      fc.constantFrom('"a,b"', '""', '"x""y"', '"1\n2"'),
    );
    const text = fc
      .array(fc.array(cell, { minLength: 2, maxLength: 2 }), { minLength: 1, maxLength: 5 })
      .map((rows) => rows.map((row) => `${row.join(',')}\n`).join(''));
    fc.assert(
      fc.property(text, (file) => {
        expect(cellsOf(file)).toEqual(parse(file, { record_delimiter: '\n' }));
      }),
      { seed: 20260804, numRuns: 500 },
    );
  });
});
