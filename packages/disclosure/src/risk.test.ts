import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { knownPeople } from '../reference/people-tables.ts';
import { diversity, equivalenceClasses, riskReport } from './index.ts';

describe.each(knownPeople)('$id', ({ rows, quasiIdentifiers, sensitive, k, distinct, entropyL, highestRisk, averageRisk, classes }) => {
  const found = equivalenceClasses(rows, quasiIdentifiers);

  it('has the known k and risks', () => {
    const risk = riskReport(found.map(({ members }) => members.length));
    expect(risk.smallestClass).toBe(k);
    expect(risk.highestRisk).toBeCloseTo(highestRisk, 12);
    expect(risk.averageRisk).toBeCloseTo(averageRisk, 10);
    expect(risk.people).toBe(rows.length);
  });

  it('has the known diversity', () => {
    const report = diversity(rows, found, sensitive);
    expect(report.distinct).toBe(distinct);
    expect(report.entropyL).toBeCloseTo(entropyL, 10);
    for (const known of classes) {
      const mine = report.classes.find(({ values }) => JSON.stringify(values) === JSON.stringify(known.values));
      expect(mine?.counts).toEqual(known.counts);
      expect(mine?.distinct).toBe(known.counts.length);
      expect(mine?.entropyL).toBeCloseTo(known.entropyL, 10);
      expect(mine?.mostFrequentShare).toBeCloseTo(known.mostFrequentShare, 10);
      expect(mine?.recursiveC).toBe(known.recursiveC);
    }
  });
});

describe('riskReport', () => {
  it('counts people, not classes', () => {
    expect(riskReport([1, 1, 4, 10, 11])).toEqual({
      people: 27,
      classes: 5,
      smallestClass: 1,
      unique: 2,
      inClassesBelow5: 6,
      inClassesBelow11: 16,
      highestRisk: 1,
      averageRisk: 5 / 27,
    });
  });

  it('agrees with counting for each person who looks like them', () => {
    const people = fc.array(fc.record({ age: fc.integer({ min: 0, max: 3 }), sex: fc.constantFrom('f', 'm', null) }), {
      minLength: 1,
      maxLength: 60,
    });
    fc.assert(
      fc.property(people, (rows) => {
        const alike = rows.map((one) => rows.filter((other) => other.age === one.age && other.sex === one.sex).length);
        const risk = riskReport(equivalenceClasses(rows, ['age', 'sex']).map(({ members }) => members.length));
        expect(risk.smallestClass).toBe(Math.min(...alike));
        expect(risk.unique).toBe(alike.filter((size) => size === 1).length);
        expect(risk.inClassesBelow5).toBe(alike.filter((size) => size < 5).length);
        expect(risk.inClassesBelow11).toBe(alike.filter((size) => size < 11).length);
        expect(risk.averageRisk).toBeCloseTo(alike.reduce((sum, size) => sum + 1 / size, 0) / rows.length, 12);
      }),
      { seed: 71 },
    );
  });

  it('refuses to report on nobody or on a column that is not there', () => {
    expect(() => riskReport([])).toThrow(RangeError);
    expect(() => riskReport([2.5])).toThrow(RangeError);
    expect(() => equivalenceClasses([{ age: 1 }], ['agge'])).toThrow(RangeError);
    expect(() => diversity([], [], 'outcome')).toThrow(RangeError);
    expect(() => diversity([{ age: 1 }], equivalenceClasses([{ age: 1 }], ['age']), 'outcome')).toThrow(RangeError);
  });

  it('keeps missing apart from the word for it, and numbers apart from their text', () => {
    expect(equivalenceClasses([{ x: null }, { x: 'null' }, { x: 1 }, { x: '1' }], ['x'])).toHaveLength(4);
  });
});
