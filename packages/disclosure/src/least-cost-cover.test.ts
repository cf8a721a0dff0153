import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { leastCostCover } from './least-cost-cover.ts';

const enough = () => ({ branches: 100_000 });

describe('leastCostCover', () => {
  it('takes one shared item rather than two cheap ones, when it costs less', () => {
    const costs = [3, 4, 5];
    const costOf = (item: number) => costs[item] ?? 0;
    expect(
      leastCostCover(
        [
          [0, 2],
          [1, 2],
        ],
        costOf,
        Number.POSITIVE_INFINITY,
        enough(),
      ),
    ).toEqual({ items: [2], cost: 5 });
    expect(
      leastCostCover(
        [
          [0, 2],
          [1, 2],
        ],
        costOf,
        5,
        enough(),
      ),
    ).toBeUndefined();
  });

  it('needs nothing when there is nothing to hit', () => {
    expect(leastCostCover([], () => 1, 1, enough())).toEqual({ items: [], cost: 0 });
  });

  it('finds no choice when a set is empty', () => {
    expect(leastCostCover([[]], () => 1, Number.POSITIVE_INFINITY, enough())).toBeUndefined();
  });

  it('says so when the search was cut short', () => {
    expect(
      leastCostCover(
        [
          [0, 1],
          [2, 3],
        ],
        () => 1,
        Number.POSITIVE_INFINITY,
        { branches: 2 },
      ),
    ).toBe('out-of-budget');
  });

  it('costs what trying every choice finds', () => {
    const sets = fc.array(fc.uniqueArray(fc.integer({ min: 0, max: 7 }), { minLength: 1, maxLength: 4 }), { maxLength: 8 });
    const costs = fc.array(fc.integer({ min: 1, max: 30 }), { minLength: 8, maxLength: 8 });
    fc.assert(
      fc.property(sets, costs, (family, prices) => {
        let best = Number.POSITIVE_INFINITY;
        for (let choice = 0; choice < 256; choice++) {
          const hits = (item: number) => ((choice >> item) & 1) === 1;
          if (family.every((set) => set.some(hits)))
            best = Math.min(
              best,
              prices.reduce((sum, price, item) => sum + (hits(item) ? price : 0), 0),
            );
        }
        const cover = leastCostCover(family, (item) => prices[item] ?? 0, Number.POSITIVE_INFINITY, enough());
        if (cover === undefined || cover === 'out-of-budget') throw new Error('A choice exists.');
        expect(cover.cost).toBe(best);
        expect(family.every((set) => set.some((item) => cover.items.includes(item)))).toBe(true);
      }),
      { seed: 61 },
    );
  });
});
