import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Random } from './random.ts';

describe('the random numbers', () => {
  it('are those of the published algorithm', () => {
    const random = new Random([1, 2, 3, 4]);
    // First outputs of the authors' C code (xoshiro128starstar.c, version 1.1) from the state 1, 2, 3, 4.
    const published = [11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804];
    expect(published.map(() => random.word())).toEqual(published);
  });

  it('repeat for the same seed and labels, and differ as soon as one of them differs', () => {
    const first = (seed: number, ...labels: (string | number)[]): number => Random.of(seed, ...labels).word();
    expect(first(7, 'a', 1)).toBe(first(7, 'a', 1));
    expect(new Set([first(7, 'a', 1), first(8, 'a', 1), first(7, 'b', 1), first(7, 'a', 2)]).size).toBe(4);
  });

  it('stay within their limits', () => {
    fc.assert(
      fc.property(fc.nat(), fc.integer({ min: -50, max: 50 }), fc.nat({ max: 40 }), (seed, min, width) => {
        const random = Random.of(seed, 'limits');
        const whole = random.whole(min, min + width);
        const bell = random.around(0, 1);
        return Number.isInteger(whole) && whole >= min && whole <= min + width && bell >= -3.4642 && bell <= 3.4642;
      }),
      { seed: 20261 },
    );
  });

  it('lie around the mean with the deviation asked for', () => {
    const random = Random.of(3, 'bell');
    const drawn = Array.from({ length: 20_000 }, () => random.around(10, 2));
    const mean = drawn.reduce((sum, value) => sum + value, 0) / drawn.length;
    const variance = drawn.reduce((sum, value) => sum + (value - mean) ** 2, 0) / drawn.length;
    expect(mean).toBeCloseTo(10, 1);
    expect(Math.sqrt(variance)).toBeCloseTo(2, 1);
  });

  it('follow the weights, and shuffle without losing anything', () => {
    const random = Random.of(5, 'weights');
    const drawn = Array.from({ length: 10_000 }, () => random.weighted({ often: 3, seldom: 1, never: 0 }));
    expect(drawn.filter((key) => key === 'often').length / drawn.length).toBeCloseTo(0.75, 1);
    expect(drawn).not.toContain('never');
    expect(random.shuffled([1, 2, 3, 4, 5]).sort()).toEqual([1, 2, 3, 4, 5]);
  });

  it('refuse a state and a list from which nothing comes', () => {
    expect(() => new Random([0, 0, 0, 0])).toThrow(RangeError);
    expect(() => Random.of(1).pick([])).toThrow(RangeError);
  });
});
