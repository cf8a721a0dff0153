import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { GeneralisedVariable } from './index.ts';
import { searchGeneralisations } from './index.ts';

interface Person {
  readonly age: number;
  readonly sex: string;
  readonly level: number;
}

const age: GeneralisedVariable<Person> = {
  key: 'age',
  levels: [
    { name: 'years', of: ({ age: years }) => years },
    { name: '10-year bands', of: ({ age: years }) => Math.floor(years / 10) },
    { name: 'left out', of: () => null },
  ],
};
const sex: GeneralisedVariable<Person> = {
  key: 'sex',
  levels: [
    { name: 'as recorded', of: (person) => person.sex },
    { name: 'left out', of: () => null },
  ],
};
const level: GeneralisedVariable<Person> = {
  key: 'level',
  levels: [
    { name: 'segment', of: (person) => person.level },
    { name: 'region', of: (person) => Math.floor(person.level / 4) },
    { name: 'left out', of: () => null },
  ],
};
const variables = [age, sex, level];

const person = fc.record({ age: fc.integer({ min: 18, max: 49 }), sex: fc.constantFrom('f', 'm'), level: fc.integer({ min: 0, max: 7 }) });

/** Every combination, judged the plain way. */
function byTrial(rows: readonly Person[], k: number, share: number) {
  const all = [0, 1, 2].flatMap((a) => [0, 1].flatMap((s) => [0, 1, 2].map((l) => ({ age: a, sex: s, level: l }))));
  const judged = all.flatMap((levels) => {
    const key = (row: Person) => JSON.stringify(variables.map((v) => v.levels[levels[v.key as keyof typeof levels]]?.of(row)));
    const sizes = new Map<string, number>();
    for (const row of rows) sizes.set(key(row), (sizes.get(key(row)) ?? 0) + 1);
    const leftOut = rows.filter((row) => (sizes.get(key(row)) ?? 0) < k).length;
    const loss = (levels.age / 2 + levels.sex + levels.level / 2) / 3 + leftOut / rows.length;
    return leftOut <= share * rows.length && leftOut < rows.length ? [{ levels, leftOut, loss }] : [];
  });
  return judged.filter(
    (one) =>
      !judged.some(
        (other) =>
          other !== one &&
          other.leftOut <= one.leftOut &&
          other.levels.age <= one.levels.age &&
          other.levels.sex <= one.levels.sex &&
          other.levels.level <= one.levels.level,
      ),
  );
}

describe('searchGeneralisations', () => {
  it('offers at most three, best first, each the best of what is left, as trying every combination finds', () => {
    fc.assert(
      fc.property(fc.array(person, { minLength: 10, maxLength: 80 }), fc.constantFrom(2, 5), fc.constantFrom(0, 0.1), (rows, k, share) => {
        const offers = searchGeneralisations({ rows, variables, k, largestShareLeftOut: share });
        const expected = byTrial(rows, k, share);
        const losses = expected.map(({ loss }) => loss).sort((a, b) => a - b);
        expect(offers).toHaveLength(Math.min(3, expected.length));
        offers.forEach((offer, at) => {
          expect(offer.loss).toBeCloseTo(losses[at] ?? -1, 12);
          expect(expected.map(({ levels }) => levels)).toContainEqual(offer.levels);
          expect(offer.risk.smallestClass).toBeGreaterThanOrEqual(k);
          expect(offer.risk.people + offer.leftOut).toBe(rows.length);
        });
      }),
      { seed: 81, numRuns: 60 },
    );
  });

  it('leaves everything as it is when that is good enough', () => {
    const rows = Array.from({ length: 12 }, () => ({ age: 30, sex: 'f', level: 2 }));
    const offers = searchGeneralisations({ rows, variables, k: 11 });
    expect(offers).toHaveLength(1);
    expect(offers[0]).toMatchObject({ levels: { age: 0, sex: 0, level: 0 }, loss: 0, leftOut: 0 });
    expect(offers[0]?.risk.smallestClass).toBe(12);
  });

  it('offers nothing when there are fewer people than wanted in a class', () => {
    expect(searchGeneralisations({ rows: [{ age: 30, sex: 'f', level: 2 }], variables, k: 5 })).toEqual([]);
  });

  it('gives the same offers whatever the order of the people', () => {
    fc.assert(
      fc.property(fc.array(person, { minLength: 12, maxLength: 40 }), (rows) => {
        const search = { variables, k: 5, largestShareLeftOut: 0.05 };
        expect(searchGeneralisations({ ...search, rows: [...rows].reverse() })).toEqual(searchGeneralisations({ ...search, rows }));
      }),
      { seed: 82, numRuns: 40 },
    );
  });

  it('refuses levels that are not nested, and settings without meaning', () => {
    const rows = [
      { age: 30, sex: 'f', level: 1 },
      { age: 35, sex: 'f', level: 2 },
      { age: 35, sex: 'm', level: 1 },
    ];
    expect(searchGeneralisations({ rows, variables, k: 2 }).length).toBeGreaterThan(0);
    const crossed: GeneralisedVariable<Person> = {
      key: 'age',
      levels: [...age.levels, { name: 'level after all', of: (row) => row.level }],
    };
    expect(() => searchGeneralisations({ rows, variables: [crossed], k: 2 })).toThrow(RangeError);
    expect(() => searchGeneralisations({ rows: [], variables, k: 2 })).toThrow(RangeError);
    expect(() => searchGeneralisations({ rows, variables, k: 1 })).toThrow(RangeError);
    expect(() => searchGeneralisations({ rows, variables, k: 2, largestShareLeftOut: 1 })).toThrow(RangeError);
    expect(() => searchGeneralisations({ rows, variables: [], k: 2 })).toThrow(RangeError);
  });
});
