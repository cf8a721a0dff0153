import { dictionary, measures } from '@cairnstep/dictionary';
import { describe, expect, it } from 'vitest';
import { searchDictionary } from './search-dictionary.ts';
import type { Scope } from './search-dictionary.ts';

const keys = (query: string, scope?: Scope) => searchDictionary(query, scope).variables.map(({ table, key }) => `${table}.${key}`);

describe('searching the dictionary', () => {
  it('finds everything without words, in the dictionary’s order', () => {
    const { variables, measures: found } = searchDictionary('  ');
    expect(variables).toEqual(dictionary.tables.flatMap((table) => table.variables));
    expect(found).toEqual(measures);
  });

  it('finds a column by its key, name, definition, code, label, unit or another header', () => {
    expect(keys('bws_kg')).toContain('bouts.bws_kg');
    expect(keys('voluntary anal')).toContain('exams.vac');
    expect(keys('sphincter contracts')).toContain('exams.vac');
    expect(keys('signal_driven_exoskeleton')).toContain('bouts.device_class');
    expect(keys('peripheral nerve')).toContain('exams.tag_cause');
    expect(keys('lowest_non_key_left')).toEqual(['exams.non_key_l']);
    expect(searchDictionary('timed up').measures.map(({ key }) => key)).toEqual(['tug']);
  });

  it('compares words without regard to case, hyphens, underscores and spaces, and asks for all of them', () => {
    expect(keys('LIGHT touch left s4-5')).toEqual(['exams.lt_l_s4_5']);
    expect(keys('LT_L_S4-5')).toEqual(['exams.lt_l_s4_5']);
    expect(keys('right').includes('sessions.upright_min')).toBe(false);
    expect(keys('light touch treadmill')).toEqual([]);
  });

  it('keeps to one table, or to the measures', () => {
    expect(new Set(keys('day', 'sessions').map((found) => found.split('.')[0]))).toEqual(new Set(['sessions']));
    expect(searchDictionary('', 'sessions').measures).toEqual([]);
    const onlyMeasures = searchDictionary('', 'measures');
    expect([onlyMeasures.variables.length, onlyMeasures.measures.length]).toEqual([0, 33]);
  });
});
