import { describe, expect, it } from 'vitest';
import { completeInjuries2012, edwards2022, khan2019 } from '../reference/published-people.ts';
import { ageBand, ageBands, bandOf, childAgeBands, societyAgeBands, timeBand, timeBands } from './bands.ts';
import { completenessClasses, inCompletenessClass } from './completeness-classes.ts';
import { levelGroups, mostRostralLevel, plegiaGroups, regionGroups } from './level-groups.ts';
import type { ReportingFacts } from './reporting-group.ts';
import { reportingGroup, reportingGroups } from './reporting-group.ts';
import { levels } from './segments.ts';

function counted<T>(people: readonly T[], groupOf: (person: T) => string): Record<string, number> {
  const counts: Record<string, number> = {};
  for (const person of people) counts[groupOf(person)] = (counts[groupOf(person)] ?? 0) + 1;
  return counts;
}

describe('published lists of people', () => {
  it('give the levels of injury and group counts of Edwards 2022', () => {
    const people = edwards2022.map(({ ais, motor, sensory }) => ({ ais, nli: mostRostralLevel([...motor, ...sensory]) }));
    // The paper prints the four levels; the level of injury is the most rostral by the definition of the standard.
    expect(people.map(({ nli }) => nli).join(' ')).toBe('C8 T10 T11 C3 C4 C6 T1 C5 C4 C7 T6 C3 T10 T5 C6');
    expect(counted(people, ({ nli, ais }) => reportingGroup({ ventilator: false, nli: [nli], ais: [ais] }))).toEqual({
      c5_c8_abc: 3,
      t1_s3_abc: 5,
      ais_d: 7,
    });
    expect(counted(people, ({ nli }) => plegiaGroups.assign([nli]))).toEqual({ tetraplegia: 9, paraplegia: 6 });
  });

  it('give the group counts of Khan 2019', () => {
    expect(counted(khan2019, ({ nli, ais }) => reportingGroup({ ventilator: false, nli: [nli], ais: [ais] }))).toEqual({
      c5_c8_abc: 2,
      t1_s3_abc: 9,
      ais_d: 1,
    });
    expect(counted(khan2019, ({ nli }) => plegiaGroups.assign([nli]))).toEqual({ tetraplegia: 3, paraplegia: 9 });
    expect(counted(khan2019, ({ ais }) => ais)).toEqual({ A: 6, B: 2, C: 3, D: 1 });
    expect(counted(khan2019, ({ ais }) => inCompletenessClass('motor_complete', [ais]))).toEqual({ yes: 8, no: 4 });
    expect(counted(khan2019, ({ nli }) => levelGroups.assign([nli]))).toEqual({ c5_c8: 3, t1_t9: 8, t10_t12: 1 });
  });

  it('group seven people with complete injuries', () => {
    expect(counted(completeInjuries2012, ({ nli, ais }) => reportingGroup({ ventilator: false, nli: [nli], ais: [ais] }))).toEqual({
      c5_c8_abc: 1,
      t1_s3_abc: 6,
    });
    expect(counted(completeInjuries2012, ({ nli }) => levelGroups.assign([nli]))).toEqual({ c5_c8: 1, t1_t9: 4, t10_t12: 2 });
    expect(counted(completeInjuries2012, ({ months }) => timeBand(months * 30.44))).toEqual({ under1: 1, y1to5: 6 });
  });
});

describe('level groups', () => {
  it('print their edges and put every level in one group', () => {
    expect(levelGroups.id).toBe('registry-1');
    expect(levelGroups.groups.map(({ label }) => label)).toEqual(['C1–C4', 'C5–C8', 'T1–T9', 'T10–T12', 'L1–L5', 'S1–S3', 'Intact']);
    for (const groups of [levelGroups, regionGroups, plegiaGroups]) {
      for (const level of levels) expect(groups.groups.map(({ id }) => id)).toContain(groups.groupOf(level));
      expect(groups.groupOf('S4_5')).toBeUndefined();
    }
  });

  it('assign an open level only when every value falls in the group', () => {
    expect(levelGroups.assign(['C5', 'C6'])).toBe('c5_c8');
    expect(levelGroups.assign(['C4', 'C5'])).toBe('not_determinable');
    expect(levelGroups.assign(['T9', 'T10'])).toBe('not_determinable');
    expect(regionGroups.assign(['T9', 'T10'])).toBe('thoracic');
    expect(levelGroups.assign(['S3', 'INT'])).toBe('not_determinable');
  });

  it('refuse to group nothing', () => {
    expect(() => levelGroups.assign([])).toThrow(RangeError);
    expect(() => mostRostralLevel([])).toThrow(RangeError);
  });
});

describe('completeness classes', () => {
  it('overlap, and answer only when every grade agrees', () => {
    expect(completenessClasses.classes.filter(({ id }) => inCompletenessClass(id, ['B']) === 'yes').map(({ id }) => id)).toEqual([
      'motor_complete',
      'sensory_incomplete',
    ]);
    expect(inCompletenessClass('motor_complete', ['A', 'B'])).toBe('yes');
    expect(inCompletenessClass('complete', ['A', 'B'])).toBe('not_determinable');
    expect(inCompletenessClass('motor_incomplete', ['C', 'D'])).toBe('yes');
    expect(inCompletenessClass('motor_incomplete', ['B', 'C'])).toBe('not_determinable');
    expect(inCompletenessClass('motor_incomplete', ['E'])).toBe('no');
  });
});

describe('reporting groups', () => {
  const group = (facts: Partial<ReportingFacts>) => reportingGroup({ ventilator: false, nli: ['T4'], ais: ['A'], ...facts });

  it('put ventilator dependence before everything else', () => {
    expect(group({ ventilator: true })).toBe('ventilator');
    expect(group({ ventilator: true, nli: undefined, ais: undefined })).toBe('ventilator');
    expect(group({ ventilator: true, ais: ['E'] })).toBe('ventilator');
  });

  it('split the neck at C4 and C5 and end it at C8', () => {
    expect(group({ nli: ['C4'], ais: ['C'] })).toBe('c1_c4_abc');
    expect(group({ nli: ['C5'], ais: ['B'] })).toBe('c5_c8_abc');
    expect(group({ nli: ['C8'], ais: ['A'] })).toBe('c5_c8_abc');
    expect(group({ nli: ['T1'], ais: ['A'] })).toBe('t1_s3_abc');
    expect(group({ nli: ['S3'], ais: ['C'] })).toBe('t1_s3_abc');
  });

  it('need no level for D, E and a normal exam without a grade', () => {
    expect(group({ nli: undefined, ais: ['D'] })).toBe('ais_d');
    expect(group({ nli: ['C4', 'C5'], ais: ['D'] })).toBe('ais_d');
    expect(group({ nli: undefined, ais: ['E'] })).toBe('ais_e');
    expect(group({ nli: ['INT'], ais: ['none'] })).toBe('no_grade');
  });

  it('know A to C although the grade itself is open', () => {
    expect(group({ nli: ['T4'], ais: ['B', 'C'] })).toBe('t1_s3_abc');
    expect(group({ nli: ['T4'], ais: ['C', 'D'] })).toBe('not_determinable');
    expect(group({ nli: ['C4', 'C5'], ais: ['A'] })).toBe('not_determinable');
    // An exam normal in all but an untested contraction: B at S3, or E and intact.
    expect(group({ nli: ['S3', 'INT'], ais: ['B', 'E'] })).toBe('not_determinable');
  });

  it('keep what was not recorded and what contradicts itself out of the groups', () => {
    expect(group({ ais: undefined })).toBe('unknown');
    expect(group({ nli: undefined })).toBe('unknown');
    expect(group({ ventilator: undefined })).toBe('unknown');
    expect(group({ nli: ['INT'], ais: ['A'] })).toBe('not_determinable');
    expect(reportingGroups.groups).toHaveLength(5);
    expect(reportingGroups.outside.map(({ id }) => id)).toEqual(['ais_e', 'no_grade', 'unknown']);
  });
});

describe('bands of age and time', () => {
  it('print their edges and leave no gap', () => {
    expect(ageBands.bands.map(({ label }) => label)).toEqual([
      '0–14 years',
      '15–29 years',
      '30–44 years',
      '45–59 years',
      '60–74 years',
      '75 years and over',
    ]);
    expect(societyAgeBands.bands.map(({ label }) => label).at(-1)).toBe('76 years and over');
    expect(childAgeBands.bands.map(({ label }) => label)).toEqual(['0–5 years', '6–12 years', '13–14 years', '15–17 years', '18–21 years']);
    expect(timeBands.bands.slice(0, 4).map(({ label }) => label)).toEqual(['Under 1 year', '1–5 years', '6–10 years', '11–15 years']);
    for (const { bands } of [ageBands, societyAgeBands, childAgeBands, timeBands]) {
      bands.forEach(({ from }, index) => expect(from).toBe(index === 0 ? 0 : (bands[index - 1]?.to ?? Number.NaN) + 1));
    }
  });

  it('hold a value up to the last day of its last year', () => {
    expect([14, 14.99, 15, 74, 75, 90].map((years) => ageBand(years))).toEqual([
      'y0to14',
      'y0to14',
      'y15to29',
      'y60to74',
      'y75plus',
      'y75plus',
    ]);
    expect(bandOf(societyAgeBands, 15)).toBe('y0to15');
    expect([0, 365, 366, 2191, 2192, 5843, 5844].map(timeBand)).toEqual([
      'under1',
      'under1',
      'y1to5',
      'y1to5',
      'y6to10',
      'y11to15',
      'y16to20',
    ]);
  });

  it('assign a range only when all of it falls in one band', () => {
    expect(ageBand([15, 29])).toBe('y15to29');
    expect(ageBand([29, 30])).toBe('not_determinable');
  });

  it('refuse what is no age or time', () => {
    for (const years of [-1, Number.NaN, 22, Number.POSITIVE_INFINITY]) expect(() => bandOf(childAgeBands, years)).toThrow(RangeError);
    for (const years of [-1, Number.NaN]) expect(() => ageBand(years)).toThrow(RangeError);
    expect(() => ageBand([30, 20])).toThrow(RangeError);
    expect(() => timeBand(-1)).toThrow(RangeError);
  });
});
