import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { codebookRows, measureRows } from './codebook.ts';
import { dataPackageFields } from './data-package-fields.ts';
import { describeConversion, describeRange, describeRequirement } from './describe.ts';
import { dictionaryAsJson } from './dictionary-document.ts';
import { dictionary, variableOf } from './dictionary.ts';
import { exampleParticipant, exampleRow } from './example-row.ts';
import { measures } from './measures.ts';
import { pseudonymAlphabet } from './pseudonym.ts';
import { rules } from './rules.ts';
import { sqlType } from './sql-type.ts';

describe('what is derived from the dictionary', () => {
  it.each(dictionary.tables)('covers just the columns of $key, in their order', ({ key, variables }) => {
    const keys = variables.map((variable) => variable.key);
    const inCodebook = codebookRows().filter((row) => row.table === key);
    expect(inCodebook.map((row) => row.column)).toEqual(keys);
    expect(dataPackageFields(key).map((field) => field.name)).toEqual(keys);
    expect(Object.keys(exampleRow(key))).toEqual(keys.filter((column) => column in exampleRow(key)));
  });

  it('gives every column a database type that fits its field type', () => {
    const pairs = new Set(
      dictionary.tables.flatMap((table) =>
        table.variables.map((variable, index) => `${sqlType(variable)}: ${dataPackageFields(table.key)[index]?.type}`),
      ),
    );
    expect([...pairs].toSorted()).toEqual(['double precision: number', 'integer: integer', 'text: string']);
  });

  it('survives JSON unchanged as one document', () => {
    const document = dictionaryAsJson();
    expect(JSON.parse(JSON.stringify(document))).toEqual(document);
    expect(document.rules).toHaveLength(rules.length);
  });
});

describe('codebook', () => {
  it('says everything about a column in text', () => {
    const row = codebookRows().find(({ table, column }) => table === 'consents' && column === 'condition');
    expect(row).toMatchObject({
      type: 'code',
      unit: '',
      range: '',
      missing: 'not_stated = the form does not say which',
      required: 'when permission is DS; else empty',
      since: '1.0',
    });
    expect(row?.codes).toContain('spinal_cord_injury = spinal cord injury');
  });

  it('points to the measure for the unit of a result', () => {
    expect(codebookRows().find(({ column }) => column === 'value')?.unit).toBe('as measure says');
  });

  it('lists each measure with its thresholds and where they come from', () => {
    const rows = measureRows();
    expect(rows.map((row) => row.measure)).toEqual(measures.map((measure) => measure.key));
    expect(rows.find((row) => row.measure === 'mas')?.range).toBe('0, 1, 1+, 2, 3, 4');
    expect(rows.find((row) => row.measure === 'scim3_mobility_room')?.mcid).toBe(
      '1 to 3 points (by level and severity; Corallo V et al. Eur J Phys Rehabil Med 2017;53(4):508-15; looked up)',
    );
  });
});

describe('data package fields', () => {
  it('repeat categories as an enumeration, codes for absent values included', () => {
    const field = dataPackageFields('exams').find(({ name }) => name === 'vac');
    expect(field).toMatchObject({
      type: 'string',
      categories: [
        { value: 'yes', label: 'yes' },
        { value: 'no', label: 'no' },
        { value: 'NT', label: 'not testable' },
      ],
      constraints: { required: true, enum: ['yes', 'no', 'NT'] },
      'x-missing': [{ code: 'NT', label: 'not testable' }],
    });
  });

  it('give limits of numbers, and the pattern of participant codes', () => {
    const fields = dataPackageFields('bouts');
    expect(fields.find(({ name }) => name === 'treadmill_speed_mps')).toMatchObject({
      type: 'number',
      constraints: { minimum: 0.05, maximum: 2.5 },
      'x-unit': 'm/s',
    });
    const pattern = fields.find(({ name }) => name === 'participant')?.constraints?.pattern ?? '';
    expect(exampleParticipant).toMatch(new RegExp(pattern));
  });

  it('do not demand a cell that is needed only under a condition', () => {
    expect(dataPackageFields('bouts').find(({ name }) => name === 'surface')?.constraints?.required).toBeUndefined();
  });
});

describe('descriptions', () => {
  it('writes a unit conversion with its exact factors', () => {
    const convert = (times: number, dividedBy: number) => describeConversion({ unit: 'km/h', times, dividedBy, source: 'SI' }, 'm/s');
    expect(convert(5, 18)).toBe('value in km/h × 5 ÷ 18 = value in m/s');
    expect(convert(45_359_237, 100_000_000)).toBe('value in km/h × 45\u202F359\u202F237 ÷ 100\u202F000\u202F000 = value in m/s');
    expect(convert(60, 1)).toBe('value in km/h × 60 = value in m/s');
    expect(convert(1, 60)).toBe('value in km/h ÷ 60 = value in m/s');
  });

  it('put limits into words', () => {
    expect(describeRange({ min: 0.05, max: 2.5 }, 'm/s')).toBe('0.05 to 2.5 m/s');
    expect(describeRange({ min: 6, max: 10, step: 4 }, 'm')).toBe('6 or 10 m');
    expect(describeRange({ min: 0, max: 10, step: 0.5 }, 'points')).toBe('0 to 10 points in steps of 0.5');
    expect(describeRange({ min: 0, max: 20, step: 1 })).toBe('0 to 20');
  });

  it('put requirements into words', () => {
    expect(describeRequirement(variableOf('participants', 'sex'))).toBe('always');
    expect(describeRequirement(variableOf('participants', 'planned_sessions'))).toBe('no');
    expect(describeRequirement(variableOf('bouts', 'distance_m'))).toBe('no; empty unless activity is walking');
    expect(describeRequirement(variableOf('bouts', 'rpe_scale'))).toBe('when rpe_end is filled');
    expect(describeRequirement(variableOf('assessments', 'rpe_scale'))).toBe('when rpe_end is filled; empty unless measure is six_mwt');
    expect(describeRequirement(variableOf('sessions', 'device_class'))).toBe('when status is completed or shortened');
    expect(describeRequirement(variableOf('assessments', 'value'))).toBe(
      'when attempt_status is done; empty unless attempt_status is done or stopped_early',
    );
    expect(describeRequirement(variableOf('assessments', 'start_type'))).toBe(
      'when measure is tmwt_ss or tmwt_fast and attempt_status is done; empty unless measure is tmwt_ss or tmwt_fast',
    );
  });
});

describe('example rows', () => {
  it('name a participant whose check character is right', () => {
    const digest = createHash('sha256').update(exampleParticipant.slice(0, -1)).digest();
    expect(exampleParticipant.at(-1)).toBe(pseudonymAlphabet[(digest[0] ?? 0) & 31]);
  });

  it('agree with each other: speeds, weight support and totals', () => {
    const walk = exampleRow('assessments');
    expect(walk['value']).toBe(Number(walk['timed_distance_m']) / Number(walk['time_s']));
    const bout = exampleRow('bouts');
    const session = exampleRow('sessions');
    expect(bout['treadmill_speed_mps']).toBe(Number(bout['distance_m']) / Number(bout['duration_s']));
    expect(bout['bws_pct']).toBe((100 * Number(bout['bws_kg'])) / Number(session['body_mass_kg']));
    expect([session['steps_total'], session['distance_total_m']]).toEqual([bout['steps'], bout['distance_m']]);
  });
});
