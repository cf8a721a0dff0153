import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { distanceUnits, massUnits, minuteUnits, secondUnits, speedUnits } from './accepted-units.ts';
import { cellParser, measureParser } from './cell-parser.ts';
import { dictionary, variableOf } from './dictionary.ts';
import { exactQuotient } from './exact-quotient.ts';
import { measureOf, measures } from './measures.ts';
import type { TableKey } from './types.ts';

const read = (table: TableKey, key: string, text: string, unit?: string): unknown => {
  const parsed = cellParser(variableOf(table, key))(text, unit);
  return parsed.ok ? parsed.value : parsed.problem.kind;
};

describe('units', () => {
  // NIST SP 811 (2008), appendix B.8: mile per hour, foot, pound, kilometre per hour.
  it.each([
    ['bouts', 'treadmill_speed_mps', '1', 'mph', 0.44704],
    ['bouts', 'treadmill_speed_mps', '1.2', 'mph', 0.536448],
    ['bouts', 'treadmill_speed_mps', '1.8', 'km/h', 0.5],
    ['bouts', 'treadmill_speed_mps', '2', 'km/h', 2 / 3.6],
    ['bouts', 'distance_m', '1', 'ft', 0.3048],
    ['bouts', 'distance_m', '0.25', 'km', 250],
    ['sessions', 'body_mass_kg', '100', 'lb', 45.359237],
    ['bouts', 'duration_s', '10', 'min', 600],
    ['sessions', 'planned_min', '0.75', 'h', 45],
    ['sessions', 'don_min', '240', 's', 4],
    ['bouts', 'treadmill_speed_mps', '0.5', 'm/s', 0.5],
  ] as const)('reads %s.%s %s %s as %d in the stored unit', (table, key, text, unit, stored) => {
    expect(read(table, key, text, unit)).toBe(stored);
  });

  it('rounds 2 km/h to 0.5556 m/s only for display', () => {
    const speed = read('bouts', 'treadmill_speed_mps', '2', 'km/h') as number;
    expect(speed.toFixed(4)).toBe('0.5556');
    expect(speed).not.toBe(0.5556);
  });

  it('knows a mile per hour as 1.609344 km/h', () => {
    expect(exactQuotient('1', 44_704, 100_000)).toBe(exactQuotient('1.609344', 5, 18));
  });

  it('gives the number nearest to the exact result', () => {
    const factors = [...speedUnits, ...distanceUnits, ...massUnits, ...secondUnits, ...minuteUnits];
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 99_999 }),
        fc.integer({ min: 0, max: 3 }),
        fc.constantFrom(...factors),
        (digits, places, { times, dividedBy }) => {
          const text = (digits / 10 ** places).toFixed(places);
          // The same quotient written out to 25 decimals and read by the engine's own correctly rounding parser.
          const scaled = (BigInt(digits) * BigInt(times) * 10n ** 25n) / (10n ** BigInt(places) * BigInt(dividedBy));
          const written = scaled.toString().padStart(26, '0');
          return exactQuotient(text, times, dividedBy) === Number(`${written.slice(0, -25)}.${written.slice(-25)}`);
        },
      ),
      { seed: 20_260_115, numRuns: 2_000 },
    );
  });

  it('refuses a unit that the column does not accept', () => {
    expect(read('bouts', 'treadmill_speed_mps', '1', 'ft')).toBe('unknown-unit');
    expect(read('bouts', 'bout_no', '1', 'min')).toBe('unknown-unit');
  });

  it('checks limits after conversion', () => {
    expect(read('bouts', 'treadmill_speed_mps', '3', 'km/h')).toBe(5 / 6);
    expect(read('bouts', 'treadmill_speed_mps', '3')).toBe('outside-limits');
  });
});

describe('cellParser', () => {
  it('reads an empty cell of any column as no value', () => {
    for (const variable of dictionary.tables.flatMap((table) => table.variables)) {
      expect(cellParser(variable)('')).toEqual({ ok: true, value: undefined });
    }
  });

  it('reads codes in any case and gives them as the dictionary writes them', () => {
    expect(read('exams', 'm_r_c5', 'nt**')).toBe('NT**');
    expect(read('exams', 'recorded_nli', 't10')).toBe('T10');
    expect(read('participants', 'sex', 'Female')).toBe('female');
    expect(read('exams', 'm_r_c5', '5*')).toBe('not-a-code');
    expect(read('exams', 'lt_r_c2', '2*')).toBe('not-a-code');
    expect(read('participants', 'sex', 'constructor')).toBe('not-a-code');
  });

  it('reads the usual spellings of yes and no', () => {
    expect(['yes', 'Y', 'TRUE', '1'].map((text) => read('assessments', 'in_device', text))).toEqual(['yes', 'yes', 'yes', 'yes']);
    expect(['no', 'N', 'False', '0'].map((text) => read('assessments', 'in_device', text))).toEqual(['no', 'no', 'no', 'no']);
    expect(['maybe', 'constructor'].map((text) => read('assessments', 'in_device', text))).toEqual(['not-a-code', 'not-a-code']);
  });

  it('reads whole numbers with or without an empty fraction', () => {
    expect(read('exams', 'exam_day', '-12')).toBe(-12);
    expect(read('exams', 'exam_day', '12.0')).toBe(12);
    expect(read('exams', 'exam_day', '-0')).toBe(0);
    expect(read('exams', 'exam_day', '12.5')).toBe('not-whole');
  });

  it.each(['12 min', '1e3', '+5', '1,000,000', '0x10', '12.', '.', '-', 'NaN', 'Infinity', '=1+1', '９', '1'.repeat(41)])(
    'refuses %s as a number',
    (text) => {
      expect(read('bouts', 'duration_s', text)).toBe('not-a-number');
    },
  );

  it('asks for a decimal point where a comma may mean either', () => {
    expect(read('bouts', 'distance_m', '1,234')).toBe('decimal-comma');
    expect(read('bouts', 'distance_m', '1.234')).toBe(1.234);
  });

  it('keeps to the steps of a scale', () => {
    expect(read('assessments', 'timed_distance_m', '6')).toBe(6);
    expect(read('assessments', 'timed_distance_m', '10')).toBe(10);
    expect(read('assessments', 'timed_distance_m', '8')).toBe('outside-limits');
    expect(read('sessions', 'rpe', '3.5')).toBe(3.5);
    expect(read('sessions', 'rpe', '3.4')).toBe('outside-limits');
  });

  it('reads an improbable value and doubts it', () => {
    const parsed = cellParser(variableOf('bouts', 'duration_s'))('5');
    expect(parsed).toMatchObject({ ok: true, value: 5, doubt: { kind: 'unlikely' } });
    expect(cellParser(variableOf('bouts', 'duration_s'))('600')).toEqual({ ok: true, value: 600 });
  });

  it('reads a participant code only in its own shape', () => {
    const code = 'S00000000000000000000Z';
    expect(read('participants', 'participant', code)).toBe(code);
    for (const wrong of [code.slice(1), `${code}0`, code.replace('Z', 'I'), code.toLowerCase(), code.replace('S', 'R')]) {
      expect(read('participants', 'participant', wrong)).toBe('not-a-participant-code');
    }
  });

  it('never repeats the cell in its message', () => {
    const written = ['987654321', 'Marigold', '1,5', '77.7777'];
    const parsers = [...dictionary.tables.flatMap((table) => table.variables).map(cellParser), ...measures.map(measureParser)];
    for (const parse of parsers) {
      for (const text of written) {
        const parsed = parse(text);
        const message = parsed.ok ? (parsed.doubt?.message ?? '') : parsed.problem.message;
        expect(message).not.toContain(text);
      }
    }
  });
});

describe('measureParser', () => {
  const result = (key: string, text: string, unit?: string): unknown => {
    const parsed = measureParser(measureOf(key))(text, unit);
    return parsed.ok ? parsed.value : parsed.problem.kind;
  };

  it('reads each spasticity grade as written or as stored, and nothing between', () => {
    expect(['0', '1', '1+', '1.5', '2', '3', '4'].map((text) => result('mas', text))).toEqual([0, 1, 1.5, 1.5, 2, 3, 4]);
    expect(['0.5', '2+', '2.5', '5'].map((text) => result('mas', text))).toEqual(['not-a-code', 'not-a-code', 'not-a-code', 'not-a-code']);
  });

  it('reads 1+ for no other measure', () => {
    expect(result('tmwt_ss', '1+')).toBe('not-a-number');
  });

  it("keeps to each measure's own limits and whole numbers", () => {
    expect(result('scim3_mobility_room', '10')).toBe(10);
    expect(result('scim3_mobility_room', '11')).toBe('outside-limits');
    expect(result('wisci2', '12.5')).toBe('not-whole');
    expect(result('rpe_cr10', '0.5')).toBe(0.5);
    expect(result('six_mwt', '1000', 'ft')).toBe(304.8);
    expect(result('tmwt_ss', '1.2', 'mph')).toBe(0.536448);
  });

  it('refuses a result that the registry computes', () => {
    expect(result('speed_derived', '0.5')).toBe('never-entered');
    expect(result('speed_derived', '')).toBeUndefined();
  });
});
