import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bitsIn, countDifference, peopleSet } from './people-set.ts';

const members = fc.array(fc.integer({ min: 0, max: 300 }));

describe('peopleSet', () => {
  it('counts each person once', () => {
    expect(peopleSet([5, 31, 32, 5, 64]).size).toBe(4);
    expect(peopleSet([]).size).toBe(0);
  });

  it('counts the people in exactly one of two sets, as sets of numbers do', () => {
    fc.assert(
      fc.property(members, members, (a, b) => {
        const [one, other] = [new Set(a), new Set(b)];
        const expected = [...one].filter((n) => !other.has(n)).length + [...other].filter((n) => !one.has(n)).length;
        expect(countDifference(peopleSet(a), peopleSet(b))).toBe(expected);
      }),
      { seed: 51 },
    );
  });

  it('counts the ones of any 32-bit word', () => {
    fc.assert(
      fc.property(fc.integer({ min: -(2 ** 31), max: 2 ** 31 - 1 }), (word) => {
        expect(bitsIn(word)).toBe([...(word >>> 0).toString(2)].filter((bit) => bit === '1').length);
      }),
      { seed: 52 },
    );
  });

  it('refuses what is no registry number', () => {
    expect(peopleSet([0]).size).toBe(1);
    expect(() => peopleSet([-1])).toThrow(RangeError);
    expect(() => peopleSet([1.5])).toThrow(RangeError);
  });
});
