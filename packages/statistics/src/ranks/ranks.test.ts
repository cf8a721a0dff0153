import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import type { FixtureCase } from '../../reference/fixture.ts';
import { casesOf } from '../../reference/fixture.ts';
import fixture from '../../reference/rank-tests.json' with { type: 'json' };
import { rankTestChecks } from '../../reference/rank-tests.checks.ts';
import { dunnTest } from './dunn.ts';
import { friedmanTest } from './friedman.ts';
import { jonckheereTest } from './jonckheere.ts';
import { kruskalWallisTest } from './kruskal-wallis.ts';
import { pairwiseDifferences, walshAverages } from './kth-smallest-sum.ts';
import { mannWhitneyTest } from './mann-whitney.ts';
import { midranks } from './midranks.ts';
import { chosenSumTails, rankSumTails } from './rank-sum-distribution.ts';
import { signedRankTails } from './signed-rank-distribution.ts';
import { signedRankChange, signedRankTest } from './signed-rank.ts';

const seed = 20240606;
/** Few different values, so that ties and zeroes are common. */
const tied = fc.integer({ min: -6, max: 6 }).map((whole) => whole / 10);
const value = fc.integer({ min: -3000, max: 3000 }).map((whole) => whole / 100);

it.each(rankTestChecks)('agrees with R on $id', (check) => {
  expect(agreement(check).disagreements).toEqual([]);
});

describe('midranks', () => {
  it('gives equal values the mean of the ranks they cover', () => {
    expect([...midranks([3, 1, 3, 2, 3]).ranks]).toEqual([4, 1, 4, 2, 4]);
    expect(midranks([3, 1, 3, 2, 1]).tieSizes).toEqual([2, 2]);
    expect([...midranks([]).ranks]).toEqual([]);
  });

  it('adds up to n(n + 1)/2 whatever the ties', () => {
    fc.assert(
      fc.property(fc.array(tied, { maxLength: 40 }), (values) => {
        const { ranks } = midranks(values);
        expect(ranks.reduce((sum, rank) => sum + rank, 0)).toBeCloseTo((values.length * (values.length + 1)) / 2, 9);
      }),
      { seed },
    );
  });
});

/** Two-sided normal tail by the continued fraction of Abramowitz & Stegun 26.2.14. */
function normalTwoSided(z: number): number {
  let fraction = z;
  for (let k = 2000; k >= 1; k--) fraction = z + k / fraction;
  return (2 * Math.exp((-z * z) / 2)) / Math.sqrt(2 * Math.PI) / fraction;
}

/** All 2^n sign patterns, one by one. */
function signedRankByHand(differences: readonly number[]): { readonly v: number; readonly p: number } {
  const moved = differences.filter((difference) => difference !== 0);
  const { ranks } = midranks(moved.map(Math.abs));
  const v = ranks.reduce((sum, rank, i) => sum + ((moved[i] as number) > 0 ? rank : 0), 0);
  let lower = 0;
  let upper = 0;
  for (let pattern = 0; pattern < 2 ** moved.length; pattern++) {
    const sum = ranks.reduce((total, rank, i) => total + ((pattern >> i) & 1 ? rank : 0), 0);
    if (sum <= v) lower++;
    if (sum >= v) upper++;
  }
  return { v, p: Math.min(1, (2 * Math.min(lower, upper)) / 2 ** moved.length) };
}

describe('signedRankTest', () => {
  it('counts as all sign patterns one by one do, with ties and zeroes', () => {
    fc.assert(
      fc.property(fc.array(tied, { minLength: 1, maxLength: 10 }), (differences) => {
        const result = signedRankTest(differences, 0.1);
        if (result.kind === 'not-estimable') {
          expect(differences.every((difference) => difference === 0)).toBe(true);
          return;
        }
        const byHand = signedRankByHand(differences);
        expect(result.test.statistic).toBe(byHand.v);
        expect(result.test.p).toBeCloseTo(byHand.p, 12);
        expect(result.exact).toBe(true);
      }),
      { seed },
    );
  });

  it('does not mind the order, and turns with the sign of the differences', () => {
    fc.assert(
      fc.property(fc.array(value, { minLength: 1, maxLength: 30 }), (differences) => {
        const one = signedRankTest(differences, 0.01);
        const reversed = signedRankTest([...differences].reverse(), 0.01);
        const turned = signedRankTest(
          differences.map((difference) => -difference),
          0.01,
        );
        if (one.kind === 'not-estimable' || reversed.kind === 'not-estimable' || turned.kind === 'not-estimable') return;
        expect(reversed).toEqual(one);
        expect(turned.test.p).toBe(one.test.p);
        expect(turned.estimate).toBeCloseTo(-one.estimate, 12);
        expect(turned.interval.lower).toBeCloseTo(-one.interval.upper, 12);
        expect(one.interval.lower).toBeLessThanOrEqual(one.estimate);
        expect(one.interval.upper).toBeGreaterThanOrEqual(one.estimate);
        expect(one.test.p).toBeGreaterThanOrEqual(one.smallestPossibleP * (1 - 1e-12));
      }),
      { seed },
    );
  });

  it('takes the interval from the Walsh averages, listed in full', () => {
    fc.assert(
      fc.property(fc.array(value, { minLength: 1, maxLength: 15 }), (values) => {
        const list = Float64Array.from(values);
        const all = values.flatMap((x, i) => values.slice(i).map((y) => x / 2 + y / 2)).sort((a, b) => a - b);
        const walsh = walshAverages(list);
        expect(walsh.total).toBe(all.length);
        expect(all.map((_, i) => walsh.kth(i + 1))).toEqual(all);
        const middle = all.length >> 1;
        const median = all.length % 2 === 1 ? (all[middle] as number) : ((all[middle - 1] as number) + (all[middle] as number)) / 2;
        expect(walsh.median()).toBe(median);
      }),
      { seed },
    );
  });

  it('drops zero differences from the test and says how many', () => {
    expect(signedRankTest([0, 0, 1, 2, 3], 1)).toMatchObject({
      n: 5,
      zeroDifferences: 2,
      smallestPossibleP: 0.25,
      test: { statistic: 6, p: 0.25 },
    });
    expect(signedRankTest([0.004, -0.004], 0.01)).toMatchObject({
      kind: 'not-estimable',
      reason: 'all differences are zero',
      pointEstimate: 0,
    });
  });

  it('says which p is the smallest possible for 3 to 6 differences', () => {
    for (const [n, smallest] of [
      [3, 0.25],
      [4, 0.125],
      [5, 0.0625],
      [6, 0.03125],
    ] as const) {
      const result = signedRankTest(Array.from({ length: n }, (_, i) => i + 1));
      expect(result).toMatchObject({ smallestPossibleP: smallest, test: { p: smallest } });
    }
  });

  it('says which level the interval really has when n is small', () => {
    const result = signedRankTest([1, 2, 4]);
    expect(result).toMatchObject({
      achievedLevel: 0.75,
      failedAssumptions: ['very small sample (n = 3)', 'the interval reaches a level of 75% only'],
    });
  });

  it('goes over to the normal approximation without a jump', () => {
    const list = (n: number): number[] => Array.from({ length: n }, (_, i) => ((i * 7919) % 1000) / 10 - 42.05);
    const exact = signedRankTest(list(200));
    const normal = signedRankTest(list(201));
    if (exact.kind === 'not-estimable' || normal.kind === 'not-estimable') throw new Error('expected estimates');
    expect([exact.exact, normal.exact]).toEqual([true, false]);
    expect(Math.abs(exact.test.p - normal.test.p)).toBeLessThan(0.02);
    expect(Math.abs(exact.interval.lower - normal.interval.lower)).toBeLessThan(0.5);
  });

  it('uses the tie-corrected variance and the continuity correction beyond 200', () => {
    const differences = Array.from({ length: 270 }, (_, i) => [1, -1, 2, 3, -2, 4, -5, -3, 5][i % 9] as number);
    const result = signedRankTest(differences);
    if (result.kind === 'not-estimable') throw new Error('expected an estimate');
    const { tieSizes } = midranks(differences.map(Math.abs));
    const variance = (270 * 271 * 541) / 24 - tieSizes.reduce((sum, size) => sum + size ** 3 - size, 0) / 48;
    const z = (Math.abs(result.test.statistic - (270 * 271) / 4) - 0.5) / Math.sqrt(variance);
    expect(result.exact).toBe(false);
    expect(result.test.p).toBeCloseTo(normalTwoSided(z), 9);
  });

  it('answers nothing for nothing, and refuses enormous values', () => {
    expect(signedRankTest([])).toMatchObject({ reason: 'no data' });
    expect(signedRankChange([null], [1])).toMatchObject({ reason: 'no data', leftOut: { missing: 1 } });
    expect(signedRankTest([1e301, 1])).toMatchObject({ reason: 'values too large to compute with' });
    expect(signedRankTest([5])).toMatchObject({ estimate: 5, interval: { lower: 5, upper: 5 }, achievedLevel: 0, test: { p: 1 } });
  });

  it('takes a hundred thousand differences', () => {
    const result = signedRankTest(Array.from({ length: 100_000 }, (_, i) => (((i * 7919) % 100_003) - 40_000) / 1000));
    expect(result).toMatchObject({ kind: 'estimate', exact: false });
  });
});

/** All ways to choose the first group, one by one. */
function mannWhitneyByHand(first: readonly number[], second: readonly number[]): { readonly u: number; readonly p: number } {
  const { ranks } = midranks([...first, ...second]);
  const all = ranks.length;
  const observed = ranks.subarray(0, first.length).reduce((sum, rank) => sum + rank, 0);
  let [lower, upper, ways] = [0, 0, 0];
  for (let choice = 0; choice < 2 ** all; choice++) {
    let [size, sum] = [0, 0];
    for (let i = 0; i < all; i++) {
      if ((choice >> i) & 1) {
        size++;
        sum += ranks[i] as number;
      }
    }
    if (size !== first.length) continue;
    ways++;
    if (sum <= observed) lower++;
    if (sum >= observed) upper++;
  }
  return { u: observed - (first.length * (first.length + 1)) / 2, p: Math.min(1, (2 * Math.min(lower, upper)) / ways) };
}

describe('mannWhitneyTest', () => {
  const small = fc.array(tied, { minLength: 1, maxLength: 6 });

  it('counts as all ways to form the groups do, with ties', () => {
    fc.assert(
      fc.property(small, small, (first, second) => {
        const result = mannWhitneyTest(first, second);
        if (result.kind === 'not-estimable') {
          expect(new Set([...first, ...second]).size).toBe(1);
          return;
        }
        const byHand = mannWhitneyByHand(first, second);
        expect(result.test.statistic).toBe(byHand.u);
        expect(result.test.p).toBeCloseTo(byHand.p, 12);
      }),
      { seed },
    );
  });

  it('turns when the groups are exchanged, and follows a monotone change of scale', () => {
    fc.assert(
      fc.property(fc.array(value, { minLength: 1, maxLength: 20 }), fc.array(value, { minLength: 1, maxLength: 20 }), (first, second) => {
        const one = mannWhitneyTest(first, second);
        const two = mannWhitneyTest(second, first);
        const cubed = mannWhitneyTest(
          first.map((x) => x ** 3),
          second.map((x) => x ** 3),
        );
        if (one.kind === 'not-estimable' || two.kind === 'not-estimable' || cubed.kind === 'not-estimable') return;
        expect(two.test.p).toBeCloseTo(one.test.p, 12);
        expect(two.estimate).toBeCloseTo(-one.estimate, 12);
        expect(two.probabilityOfSuperiority).toBeCloseTo(1 - one.probabilityOfSuperiority, 12);
        expect(cubed.test).toEqual(one.test);
        expect(one.interval.lower).toBeLessThanOrEqual(one.estimate);
        expect(one.interval.upper).toBeGreaterThanOrEqual(one.estimate);
      }),
      { seed },
    );
  });

  it('takes shift and interval from all differences, listed in full', () => {
    fc.assert(
      fc.property(fc.array(value, { minLength: 1, maxLength: 10 }), fc.array(value, { minLength: 1, maxLength: 10 }), (first, second) => {
        const all = first.flatMap((x) => second.map((y) => x - y)).sort((a, b) => a - b);
        const ordered = pairwiseDifferences(Float64Array.from(first), Float64Array.from(second));
        expect(all.map((_, i) => ordered.kth(i + 1) + 0)).toEqual(all.map((difference) => difference + 0));
      }),
      { seed },
    );
  });

  it('says which p is the smallest possible', () => {
    for (const [m, n, smallest] of [
      [3, 3, 0.1],
      [4, 4, 2 / 70],
      [3, 5, 2 / 56],
    ] as const) {
      const result = mannWhitneyTest(
        Array.from({ length: m }, (_, i) => i),
        Array.from({ length: n }, (_, i) => 10 + i),
      );
      if (result.kind === 'not-estimable') throw new Error('expected an estimate');
      expect(result.smallestPossibleP).toBeCloseTo(smallest, 12);
      expect(result.test.p).toBeCloseTo(smallest, 12);
    }
  });

  // R 4.2.2, wilcox.test(exact = FALSE, correct = TRUE) on ozone in May and August gives z = -3.84448102728007, p = 0.000120807830768774;
  // exact counting with ties must lie close to it.
  it('is close to the normal approximation where both can be had', () => {
    const [{ inputs }] = casesOf(fixture, 'mannwhitney.ties.airquality') as [FixtureCase];
    const expected = 0.000120807830768774;
    const result = mannWhitneyTest(inputs.x, inputs.y);
    if (result.kind === 'not-estimable') throw new Error('expected an estimate');
    expect(result.exact).toBe(true);
    expect(Math.abs(Math.log(result.test.p / expected))).toBeLessThan(0.7);
  });

  it('uses the normal approximation beyond a hundred values', () => {
    const first = Array.from({ length: 51 }, (_, i) => i % 13);
    const second = Array.from({ length: 50 }, (_, i) => (i % 17) + 1);
    const result = mannWhitneyTest(first, second);
    if (result.kind === 'not-estimable') throw new Error('expected an estimate');
    expect(result.exact).toBe(false);
    const { tieSizes } = midranks([...first, ...second]);
    const ties = tieSizes.reduce((sum, size) => sum + size ** 3 - size, 0);
    const variance = ((51 * 50) / 12) * (102 - ties / (101 * 100));
    const z = (Math.abs(result.test.statistic - 1275) - 0.5) / Math.sqrt(variance);
    expect(result.test.p).toBeCloseTo(normalTwoSided(z), 9);
  });

  it('says why there is no comparison', () => {
    expect(mannWhitneyTest([], [1])).toMatchObject({ reason: 'no comparison possible' });
    expect(mannWhitneyTest([2, 2], [2])).toMatchObject({ reason: 'all values equal' });
    expect(mannWhitneyTest([1e301], [1])).toMatchObject({ reason: 'values too large to compute with' });
    expect(mannWhitneyTest([0.7 - 0.4], [1.1 - 0.8], 0.01)).toMatchObject({ reason: 'all values equal' });
    expect(mannWhitneyTest([1e-300, 3e-300], [2e-300])).toMatchObject({ kind: 'estimate', test: { statistic: 1, p: 1 } });
  });
});

describe('the exact distributions', () => {
  it('have two tails that sum to one', () => {
    for (const n of [1, 2, 7, 60]) {
      for (const v of [-1, 0, 3, 11.5, 900, 5000]) {
        const { lower, upper } = signedRankTails(v, n);
        expect(lower + upper).toBeCloseTo(1, 13);
      }
    }
    for (const [m, n] of [
      [1, 1],
      [3, 4],
      [20, 30],
    ] as const) {
      for (const u of [-1, 0, 2, 7.5, 300, 1000]) {
        const { lower, upper } = rankSumTails(u, m, n);
        expect(lower + upper).toBeCloseTo(1, 13);
      }
    }
  });

  it('are refused where counting would leave the range of a double', () => {
    expect(() => signedRankTails(1000, 1001)).toThrow(RangeError);
  });

  it('agree with each other where there are no ties', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 9 }), fc.integer({ min: 1, max: 9 }), fc.nat(), (m, n, choice) => {
        const u = choice % (m * n + 1);
        const ranks = Array.from({ length: m + n }, (_, i) => i + 1);
        const { atMost, atLeast } = chosenSumTails(ranks, m, u + (m * (m + 1)) / 2);
        expect(atMost).toBeCloseTo(rankSumTails(u, m, n).lower, 12);
        expect(atLeast).toBeCloseTo(rankSumTails(u - 1, m, n).upper, 12);
      }),
      { seed },
    );
  });
});

describe.each([
  ['kruskalWallisTest', kruskalWallisTest],
  ['dunnTest', dunnTest],
  ['jonckheereTest', jonckheereTest],
] as const)('%s', (_name, test) => {
  it('says why there is no comparison, and names what it set aside', () => {
    expect(test([])).toMatchObject({ reason: 'no comparison possible' });
    expect(
      test([
        { name: 'A', values: [1, 2] },
        { name: 'B', values: [null] },
      ]),
    ).toMatchObject({ reason: 'no comparison possible' });
    expect(
      test([
        { name: 'A', values: [3, 3] },
        { name: 'B', values: [3] },
      ]),
    ).toMatchObject({ reason: 'all values equal' });
    const result = test([
      { name: 'A', values: [1, 2, 5, 7, 9] },
      { name: 'B', values: ['unable'] },
      { name: 'C', values: [4, 8, 6, 10, 3] },
    ]);
    expect(result).toMatchObject({ n: 10, leftOut: { unable: 1 } });
    if (result.kind !== 'not-estimable') expect(result.failedAssumptions).toEqual(['group left out: B (n = 0, no data)']);
  });
});

describe('kruskalWallisTest', () => {
  const lists = fc.array(fc.array(tied, { minLength: 1, maxLength: 8 }), { minLength: 2, maxLength: 4 });

  it('is the square of the uncorrected Mann-Whitney z for two groups', () => {
    fc.assert(
      fc.property(fc.array(tied, { minLength: 2, maxLength: 12 }), fc.array(tied, { minLength: 2, maxLength: 12 }), (first, second) => {
        const h = kruskalWallisTest([
          { name: 'a', values: first },
          { name: 'b', values: second },
        ]);
        const u = mannWhitneyTest(first, second);
        if (h.kind === 'not-estimable' || u.kind === 'not-estimable') return;
        const [m, n] = [first.length, second.length];
        const { tieSizes } = midranks([...first, ...second]);
        const ties = tieSizes.reduce((sum, size) => sum + size ** 3 - size, 0);
        const variance = ((m * n) / 12) * (m + n + 1 - ties / ((m + n) * (m + n - 1)));
        expect(h.statistic).toBeCloseTo((u.test.statistic - (m * n) / 2) ** 2 / variance, 9);
      }),
      { seed },
    );
  });

  it('does not mind the order of the groups', () => {
    fc.assert(
      fc.property(lists, (given) => {
        const groups = given.map((values, i) => ({ name: `${i}`, values }));
        const one = kruskalWallisTest(groups);
        if (one.kind === 'not-estimable') return;
        expect(kruskalWallisTest([...groups].reverse())).toMatchObject({ statistic: expect.closeTo(one.statistic, 9) });
      }),
      { seed },
    );
  });

  it('has nothing to say of single values', () => {
    expect(
      kruskalWallisTest([
        { name: 'a', values: [1] },
        { name: 'b', values: [2] },
      ]),
    ).toMatchObject({ reason: 'every group has a single value' });
  });
});

describe('jonckheereTest', () => {
  it('changes its sign with the order of the groups', () => {
    fc.assert(
      fc.property(fc.array(fc.array(tied, { minLength: 1, maxLength: 8 }), { minLength: 2, maxLength: 4 }), (given) => {
        const groups = given.map((values, i) => ({ name: `${i}`, values }));
        const up = jonckheereTest(groups);
        const down = jonckheereTest([...groups].reverse());
        if (up.kind === 'not-estimable' || down.kind === 'not-estimable') return;
        expect(down.z).toBeCloseTo(-up.z, 9);
        expect(down.statistic + up.statistic).toBeCloseTo(2 * up.expected, 9);
      }),
      { seed },
    );
  });
});

describe('friedmanTest', () => {
  it('uses people with every visit, and follows ranks within each person only', () => {
    const visits = [
      [5.4, 5.85, 5.2, null, 5.9],
      [5.5, 5.7, 5.6, 5.5, 5.85],
      [5.55, 5.75, 5.5, 5.4, 5.7],
    ];
    const one = friedmanTest(visits);
    expect(one).toMatchObject({ kind: 'test', n: 4, leftOut: { missing: 1 }, df: [2], failedAssumptions: ['very small sample (n = 4)'] });
    const moved = friedmanTest(visits.map((visit) => visit.map((x, person) => (x === null ? x : x * 4 + person * 100))));
    if (one.kind === 'test') expect(moved).toMatchObject({ statistic: expect.closeTo(one.statistic, 10) });
  });

  it('says why there is no comparison', () => {
    expect(friedmanTest([[1, 2, 3]])).toMatchObject({ reason: 'no comparison possible' });
    expect(friedmanTest([[null], [1]])).toMatchObject({ reason: 'no data' });
    expect(
      friedmanTest([
        [1, 2],
        [1, 2],
      ]),
    ).toMatchObject({ reason: 'all values equal within each person' });
    expect(
      friedmanTest(
        [
          [0.7 - 0.4, 1],
          [1.1 - 0.8, 1],
        ],
        0.01,
      ),
    ).toMatchObject({ reason: 'all values equal within each person' });
  });

  it('has a W of 1 when everyone agrees', () => {
    expect(
      friedmanTest([
        [1, 4, 2, 7, 3],
        [2, 5, 3, 8, 4],
        [3, 6, 4, 9, 5],
      ]),
    ).toMatchObject({ kendallW: 1, meanRanks: [1, 2, 3] });
  });
});
