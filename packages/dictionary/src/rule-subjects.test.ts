import { describe, expect, it } from 'vitest';
import { variableOf } from './dictionary.ts';
import { measureOf } from './measures.ts';
import { rulesAbout, rulesAboutMeasure, subjectOf } from './rule-subjects.ts';
import { rules } from './rules.ts';
import { tableKeys } from './types.ts';

const ids = (found: readonly { readonly id: string }[]): string[] => found.map(({ id }) => id);

describe('what a rule compares', () => {
  it('is stated for every rule, in columns of the tables that the rule names and measures that exist', () => {
    for (const { id, tables } of rules) {
      const { columns, measures = [] } = subjectOf(id);
      const named = tableKeys.filter((table) => columns[table] !== undefined);
      expect(named.length, id).toBeGreaterThan(0);
      for (const table of named) {
        expect(tables, id).toContain(table);
        const keys = columns[table] ?? [];
        expect(new Set(keys).size, id).toBe(keys.length);
        for (const key of keys) expect(variableOf(table, key).key, id).toBe(key);
      }
      for (const measure of measures) expect(measureOf(measure).key, id).toBe(measure);
    }
  });

  it('finds the rules about a column and about a measure', () => {
    expect(ids(rulesAbout('bouts', 'steps'))).toEqual(['T03', 'T04', 'T05']);
    expect(ids(rulesAbout('bouts', 'hip_r_control'))).toEqual(['T08', 'T09', 'T17']);
    expect(ids(rulesAbout('exams', 'm_l_l3'))).toEqual(['C02', 'C13', 'C14', 'C15', 'E01', 'E02', 'E03', 'E04', 'E09', 'T13', 'T17']);
    expect(ids(rulesAbout('exams', 'lt_r_s3'))).toContain('E05');
    expect(ids(rulesAbout('exams', 'lt_r_s2'))).not.toContain('E05');
    expect(ids(rulesAbout('consents', 'participant'))).toEqual(['R01']);
    expect(ids(rulesAbout('sessions', 'staff_count'))).toEqual([]);
    expect(ids(rulesAboutMeasure('bbs'))).toEqual(['C11']);
    expect(ids(rulesAboutMeasure('wisci2'))).toEqual(['C05', 'C10', 'C12', 'C17']);
  });

  it('refuses an unknown id', () => {
    expect(() => subjectOf('Z99')).toThrow(RangeError);
  });
});
