import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { generatorFromState, seededGenerator } from './seeded-generator.ts';

describe('seeded generator', () => {
  it("gives the numbers of the authors' own program from the state 1, 2, 3, 4", () => {
    // First ten outputs of xoshiro128starstar.c (Blackman & Vigna, version 1.1) from that state.
    const expected = [11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804];
    const generator = generatorFromState([1, 2, 3, 4]);
    expect(expected.map(() => generator.nextBits())).toEqual(expected);
  });

  it('repeats itself from the same seed and differs between seeds', () => {
    const draw = (seed: number) => {
      const generator = seededGenerator(seed);
      return Array.from({ length: 20 }, () => generator.nextIndex(1000));
    };
    expect(draw(7)).toEqual(draw(7));
    expect(draw(7)).not.toEqual(draw(8));
  });

  it('draws every index about equally often', () => {
    const generator = seededGenerator(20_260_101);
    const counts = new Array<number>(7).fill(0);
    for (let i = 0; i < 70_000; i++) {
      const index = generator.nextIndex(7);
      counts[index] = (counts[index] as number) + 1;
    }
    const chiSquare = counts.reduce((sum, count) => sum + (count - 10_000) ** 2 / 10_000, 0);
    // 99.9% point of chi-square with 6 degrees of freedom.
    expect(chiSquare).toBeLessThan(22.458);
  });

  it('stays within the places asked for', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 2 ** 32 - 1 }), fc.integer({ min: 1, max: 2 ** 32 }), (seed, count) => {
        const index = seededGenerator(seed).nextIndex(count);
        expect(index).toBeGreaterThanOrEqual(0);
        expect(index).toBeLessThan(count);
      }),
      { seed: 11 },
    );
  });

  it('refuses a seed or a count it cannot honour', () => {
    expect(() => seededGenerator(-1)).toThrow(RangeError);
    expect(() => seededGenerator(0.5)).toThrow(RangeError);
    expect(() => seededGenerator(1).nextIndex(0)).toThrow(RangeError);
    expect(() => generatorFromState([0, 0, 0, 0])).toThrow(RangeError);
    expect(seededGenerator(0).nextIndex(1)).toBe(0);
  });
});
