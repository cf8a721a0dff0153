import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { tableFromRows } from '../table/table-from-rows.ts';
import { bout, someone } from '../test-support/a-month.ts';
import { copyRows } from './copy-rows.ts';
import { formatNumber } from './format-number.ts';

const text = (pieces: Iterable<Uint8Array>): string => [...pieces].map((piece) => new TextDecoder().decode(piece)).join('');

describe('copyRows', () => {
  it('writes rows as the text format of COPY has them', () => {
    const table = tableFromRows('bouts', [bout({ distance_m: 12.5, steps: undefined }), bout({ bout_no: 2, distance_m: 1e-7 })]);
    expect(text(copyRows(table, ['participant', 'bout_no', 'distance_m', 'steps', 'stop_reason']))).toBe(
      `${someone}\t1\t12.5\t\\N\tplanned\n${someone}\t2\t0.0000001\t600\tplanned\n`,
    );
  });

  it('adds the line of the file and further cells, special characters escaped', () => {
    const table = tableFromRows('bouts', [bout(), bout({ bout_no: 2 })]);
    expect(text(copyRows(table, ['bout_no'], { withLine: true, further: (row) => [`a\tb\\c\n${row}`, null] }))).toBe(
      '1\t0\ta\\tb\\\\c\\n0\t\\N\n2\t0\ta\\tb\\\\c\\n1\t\\N\n',
    );
  });

  it('writes every number as a file has it', () => {
    const few = fc
      .tuple(fc.integer({ min: -2_000_000_000, max: 2_000_000_000 }), fc.constantFrom(1, 10, 100, 1_000, 10_000))
      .map(([whole, scale]) => whole / scale);
    const any = fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e22, max: 1e22 });
    fc.assert(
      fc.property(fc.oneof(few, any, fc.constantFrom(0, 0.5, 999_999_999, 1e9, 0.001, 100.05, 5 / 9)), (value) => {
        const table = tableFromRows('bouts', [bout({ distance_m: value })]);
        expect(text(copyRows(table, ['distance_m']))).toBe(`${formatNumber(value)}\n`);
      }),
      { seed: 20260809, numRuns: 2_000 },
    );
  });

  it('hands over the rows in pieces that end with a row', () => {
    const rows = Array.from({ length: 5_000 }, (_, index) => bout({ bout_no: index }));
    const pieces = [...copyRows(tableFromRows('bouts', rows), ['participant', 'bout_no'])];
    expect(pieces.length).toBeGreaterThan(1);
    for (const piece of pieces) expect(text([piece])).toMatch(/\n$/);
    expect(text(pieces)).toBe(rows.map((row) => `${someone}\t${row['bout_no']}\n`).join(''));
  });
});
