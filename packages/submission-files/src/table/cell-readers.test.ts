import { cellParser, exampleRow, measureParser, measures, tableKeys, tableOf } from '@cairnstep/dictionary';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readNumber } from './read-number.ts';
import { FindingLog } from '../finding-log.ts';
import { readTable } from '../reading/read-csv.ts';
import { encode } from '../test-support/findings-of.ts';

const decimal = cellParser({
  ...tableOf('bouts').variables.find(({ key }) => key === 'distance_m')!,
  hard: { min: -1e40, max: 1e40 },
  plausible: { min: -1e40, max: 1e40 },
});

describe('readNumber', () => {
  const written = fc
    .tuple(
      fc.constantFrom('', '-'),
      fc.bigInt({ min: 0n, max: 10n ** 18n }),
      fc.option(fc.stringMatching(/^\d{1,12}$/), { nil: undefined }),
    )
    .map(([sign, whole, fraction]) => `${sign}${whole}${fraction === undefined ? '' : `.${fraction}`}`);

  it.each([
    { unit: 'm', times: 1, dividedBy: 1 },
    { unit: 'ft', times: 3_048, dividedBy: 10_000 },
    { unit: 'km', times: 1_000, dividedBy: 1 },
  ])("reads what the dictionary's parser reads, in $unit", ({ unit, times, dividedBy }) => {
    fc.assert(
      fc.property(written, (text) => {
        const into = { value: Number.NaN, mark: 0 };
        expect(readNumber(text, { times, dividedBy }, into)).toBeNull();
        const parsed = decimal(text, unit);
        const expected = parsed.ok ? Number(parsed.value) : Number.NaN;
        // Beyond 15 digits, which no measurement has, the last bit may be rounded twice.
        if (text.replace(/\D/g, '').length <= 15 && times < 10_000) expect(into.value).toBe(expected);
        else expect(Math.abs(into.value - expected)).toBeLessThanOrEqual(Math.abs(expected) * 4 * Number.EPSILON);
      }),
      { seed: 20260805, numRuns: 1_000 },
    );
  });

  it('refuses what is no number, as the dictionary does', () => {
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom('1', '0', '.', '-', 'e', 'x', ' '), minLength: 1, maxLength: 5 }), (text) => {
        const failure = readNumber(text, { times: 1, dividedBy: 1 }, { value: 0, mark: 0 });
        expect(failure === null).toBe(decimal(text).ok);
      }),
      { seed: 20260806, numRuns: 2_000 },
    );
  });

  it('reads a comma where the dictionary wants a point', () => {
    const into = { value: 0, mark: 0 };
    expect(readNumber('12,5', { times: 1, dividedBy: 1 }, into)).toBeNull();
    expect(into).toEqual({ value: 12.5, mark: ','.charCodeAt(0) });
  });

  it('refuses more digits than any measurement has', () => {
    expect(readNumber('1'.repeat(41), { times: 1, dividedBy: 1 }, { value: 0, mark: 0 })).toBe('too-many-digits');
  });
});

describe('reading codes', () => {
  it("stores the dictionary's spelling of every code and every reason of absence", async () => {
    for (const table of tableKeys) {
      const { variables } = tableOf(table);
      for (const { key, codes = [], missingCodes = [] } of variables) {
        for (const { code } of [...codes, ...missingCodes]) {
          const read = await readTable(table, encode(`${key}\n"${code.toLowerCase()}"\n`), new FindingLog());
          expect(read.column(key).cell(0), `${table} ${key} ${code}`).toBe(code);
        }
      }
    }
  });

  it('stores the grades of every measure that has some', async () => {
    for (const measure of measures) {
      for (const { written, stored } of measure.grades ?? []) {
        const read = await readTable('assessments', encode(`measure,value\n${measure.key},${written}\n`), new FindingLog());
        expect(read.column('value').number(0)).toBe(stored);
        expect(measureParser(measure)(written)).toMatchObject({ value: stored });
      }
    }
  });

  it('answers a cell of 10,000 characters at once in every column', async () => {
    const { variables } = tableOf('sessions');
    const example = exampleRow('sessions');
    for (const hostile of ['a'.repeat(10_000), ' '.repeat(9_999) + '(', '='.repeat(10_000), '1'.repeat(10_000), ',;'.repeat(5_000)]) {
      const log = new FindingLog();
      const row = variables.map(({ key }) => (key === 'participant' ? String(example[key]) : `"${hostile}"`)).join(',');
      await readTable('sessions', encode(`${variables.map(({ key }) => key).join(',')}\n${row}\n`), log);
      expect(log.counts.errors).toBe(variables.length - 1);
    }
  });
});
