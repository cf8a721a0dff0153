import { exampleRow, measures, tableKeys, tableOf } from '@cairnstep/dictionary';
import type { Row, TableKey, Variable } from '@cairnstep/dictionary';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FindingLog } from '../finding-log.ts';
import { readTable } from '../reading/read-csv.ts';
import { tableFromRows } from '../table/table-from-rows.ts';
import type { TypedTable } from '../table/typed-table.ts';
import { encode } from '../test-support/findings-of.ts';
import { formatNumber } from './format-number.ts';
import { csvHeader, writeCsv } from './write-csv.ts';

const rowsOf = (table: TypedTable) => Array.from({ length: table.length }, (_, row) => table.row(row));

/** Any value the variable can hold, or none. */
function cell({ type, codes = [], missingCodes = [], hard }: Variable): fc.Arbitrary<string | number | undefined> {
  const { min = -1e6, max = 1e6 } = hard ?? {};
  const value = (): fc.Arbitrary<string | number> => {
    if (type === 'pseudonym') return fc.stringMatching(/^S[0-9A-HJKMNP-TV-Z]{21}$/);
    if (type === 'integer') return fc.integer({ min, max });
    if (type === 'code' || type === 'flag') return fc.constantFrom(...[...codes, ...missingCodes].map(({ code }) => code));
    const tenths = fc.integer({ min: Math.ceil(min * 10), max: Math.floor(max * 10) }).map((whole) => whole / 10);
    return fc.oneof(
      tenths,
      fc.double({ min, max, noNaN: true }).map((any) => (Math.abs(any) < 1e-9 ? 0 : any)),
    );
  };
  return fc.option(value(), { nil: undefined });
}

const rowOf = (table: TableKey): fc.Arbitrary<Row> => {
  const { variables } = tableOf(table);
  const draft = fc.record(Object.fromEntries(variables.map((variable) => [variable.key, cell(variable)])));
  // A spasticity grade is one of a few numbers; any other one would not be written as it is.
  return draft.map((row) =>
    row['measure'] === 'mas' ? { ...row, value: measures.find(({ key }) => key === 'mas')?.grades?.[2]?.stored } : row,
  ) as fc.Arbitrary<Row>;
};

describe('writeCsv', () => {
  it.each(tableKeys)('writes %s so that reading gives the same rows', async (key) => {
    await fc.assert(
      fc.asyncProperty(fc.array(rowOf(key), { minLength: 1, maxLength: 4 }), async (rows) => {
        const written = tableFromRows(
          key,
          rows.map((row, index) => ({ ...row, participant: row['participant'] ?? `S${String(index).padStart(21, '0')}` })),
        );
        const findings = new FindingLog();
        const read = await readTable(key, encode(writeCsv(written)), findings);
        expect(findings.byRule()).toEqual([]);
        expect(rowsOf(read)).toEqual(rowsOf(written));
      }),
      { seed: 20260807, numRuns: 12 },
    );
  });

  it('begins with the header of the template and ends each line with CR and LF', () => {
    const text = writeCsv(tableFromRows('participants', [exampleRow('participants')]));
    expect(text.startsWith(csvHeader('participants'))).toBe(true);
    expect(csvHeader('participants')).toBe(
      `${tableOf('participants')
        .variables.map(({ key }) => key)
        .join(',')}\r\n`,
    );
    expect(text.match(/\r\n/g)).toHaveLength(2);
    expect(text.replaceAll('\r\n', '')).not.toMatch(/[\r\n\uFEFF]/);
  });

  it('writes grades in their own spelling', () => {
    const row = { ...exampleRow('assessments'), measure: 'mas', value: 1.5 };
    expect(writeCsv(tableFromRows('assessments', [row]))).toContain(',1+,');
  });
});

describe('formatNumber', () => {
  it.each([
    [0.5, '0.5'],
    [-3, '-3'],
    [1e21, '1000000000000000000000'],
    [1e-7, '0.0000001'],
    [0.1 + 0.2, '0.30000000000000004'],
  ])('writes %d as %s', (value, text) => {
    expect(formatNumber(value)).toBe(text);
  });

  it.each([Number.NaN, Infinity])('refuses %d', (value) => {
    expect(() => formatNumber(value)).toThrow(RangeError);
  });
});
