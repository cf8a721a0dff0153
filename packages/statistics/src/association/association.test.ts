import fc from 'fast-check';
import { sampleCorrelation, sampleRankCorrelation } from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { correlationChecks } from '../../reference/correlations.checks.ts';
import { exactSpearmanProbability } from './exact-spearman-probability.ts';
import { kendallCorrelation, pearsonCorrelation, spearmanCorrelation } from './index.ts';
import { inversionProbability } from './inversion-probability.ts';
import { sortCountingInversions } from './sort-counting-inversions.ts';

const seed = 44;
const methods = [
  ['Pearson', pearsonCorrelation],
  ['Spearman', spearmanCorrelation],
  ['Kendall', kendallCorrelation],
] as const;
const pairs = fc.array(fc.tuple(fc.integer({ min: -20, max: 20 }), fc.integer({ min: -20, max: 20 })), { minLength: 5, maxLength: 40 });

function permutations(values: readonly number[]): number[][] {
  if (values.length === 0) return [[]];
  return values.flatMap((value, i) => permutations(values.toSpliced(i, 1)).map((rest) => [value, ...rest]));
}

/** Pairs in the wrong order, counted one by one. */
function inversionsOf(values: readonly number[]): number {
  return values.reduce((sum, value, i) => sum + values.slice(i + 1).filter((later) => later < value).length, 0);
}

describe('correlations', () => {
  it.each(correlationChecks)('agree with the published figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });

  it.each(methods)('%s lies within its limits, in turn and under a change of units', (_name, method) => {
    fc.assert(
      fc.property(pairs, (rows) => {
        const x = rows.map(([a]) => a);
        const y = rows.map(([, b]) => b);
        const one = method(x, y);
        const turned = method(y, x);
        const rescaled = method(
          x.map((value) => 8 * value - 3),
          y.map((value) => -value),
        );
        expect(turned.kind).toBe(one.kind);
        if (one.kind !== 'estimate' || turned.kind !== 'estimate' || rescaled.kind !== 'estimate') return;
        expect(Math.abs(one.estimate)).toBeLessThanOrEqual(1);
        expect(one.interval.lower).toBeLessThanOrEqual(one.estimate);
        expect(one.interval.upper).toBeGreaterThanOrEqual(one.estimate);
        expect(turned.estimate).toBeCloseTo(one.estimate, 12);
        expect(rescaled.estimate).toBeCloseTo(-one.estimate, 12);
        expect(rescaled.test.p).toBeCloseTo(one.test.p, 10);
      }),
      { seed },
    );
  });

  it('agree with a second implementation', () => {
    fc.assert(
      fc.property(pairs, (rows) => {
        const x = rows.map(([a]) => a);
        const y = rows.map(([, b]) => b);
        const pearson = pearsonCorrelation(x, y);
        const spearman = spearmanCorrelation(x, y);
        if (pearson.kind === 'estimate') expect(pearson.estimate).toBeCloseTo(sampleCorrelation(x, y), 10);
        if (spearman.kind === 'estimate') expect(spearman.estimate).toBeCloseTo(sampleRankCorrelation(x, y), 10);
      }),
      { seed },
    );
  });

  it('tau-b is what counting every pair gives', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.nat({ max: 4 }), fc.nat({ max: 4 })), { minLength: 5, maxLength: 25 }), (rows) => {
        const tau = kendallCorrelation(
          rows.map(([a]) => a),
          rows.map(([, b]) => b),
        );
        if (tau.kind !== 'estimate') return;
        let [score, freeX, freeY] = [0, 0, 0];
        for (const [i, [x1, y1]] of rows.entries()) {
          for (const [x2, y2] of rows.slice(i + 1)) {
            score += Math.sign(x1 - x2) * Math.sign(y1 - y2);
            freeX += Math.abs(Math.sign(x1 - x2));
            freeY += Math.abs(Math.sign(y1 - y2));
          }
        }
        expect(tau.estimate).toBeCloseTo(score / Math.sqrt(freeX * freeY), 12);
      }),
      { seed },
    );
  });

  it('drop incomplete pairs and count them', () => {
    const x = [1, 2, null, 4, 5, 6, Number.NaN, 'unable' as const];
    const y = [2, 1, 3, 6, 4, 9, 2, 3];
    for (const [, method] of methods) expect(method(x, y)).toMatchObject({ n: 5, leftOut: { missing: 1, nonFinite: 1, unable: 1 } });
  });

  it('say why there is none', () => {
    for (const [, method] of methods) {
      expect(method([], [])).toMatchObject({ kind: 'not-estimable', reason: 'no data' });
      expect(method([1, 2, 3], [3, 1, 2])).toMatchObject({ kind: 'not-estimable', n: 3 });
      expect(method([1, 2, 3, 4, 5], [7, 7, 7, 7, 7])).toMatchObject({ reason: 'one of the two measures does not vary' });
      expect(method([1, 2, 3, 4, 5], [2, 4, 6, 8, 10])).toMatchObject({ kind: 'not-estimable', pointEstimate: 1 });
      expect(method([1, 2, 3, 4, 5], [9, 8, 7, 6, 5])).toMatchObject({ kind: 'not-estimable', pointEstimate: -1 });
      expect(() => method([1, 2], [1])).toThrow(RangeError);
    }
    expect(kendallCorrelation([1, 2, 3, 4], [1, 3, 2, 4])).toMatchObject({
      kind: 'not-estimable',
      pointEstimate: expect.closeTo(4 / 6, 12),
    });
    expect(pearsonCorrelation([1, 2, 3, 4], [1, 3, 2, 4])).toMatchObject({ failedAssumptions: ['very small sample (n = 4)'] });
  });

  it('keep their digits for values far from zero', () => {
    const near = pearsonCorrelation([0, 1, 2, 3, 4], [0, 3, 1, 4, 4]);
    const far = pearsonCorrelation([1e9, 1e9 + 1, 1e9 + 2, 1e9 + 3, 1e9 + 4], [0, 3, 1, 4, 4]);
    if (near.kind !== 'estimate' || far.kind !== 'estimate') throw new Error('expected estimates');
    expect(far.estimate).toBeCloseTo(near.estimate, 14);
    const large = pearsonCorrelation([1e200, 2e200, 3e200, 5e200], [1, 3, 2, 4]);
    expect(large).toMatchObject({ kind: 'estimate' });
  });
});

describe('exact distributions of ranks', () => {
  it('count the orders one by one', () => {
    for (const n of [4, 5, 6]) {
      const ranks = Array.from({ length: n }, (_, i) => i + 1);
      const orders = permutations(ranks);
      const twoSided = (statistics: readonly number[], observed: number): number => {
        const below = statistics.filter((value) => value <= observed).length;
        const above = statistics.filter((value) => value >= observed).length;
        return Math.min(1, (2 * Math.min(below, above)) / statistics.length);
      };
      const squares = orders.map((order) => order.reduce((sum, rank, i) => sum + (rank - i - 1) ** 2, 0));
      const inversions = orders.map(inversionsOf);
      for (const observed of new Set(squares)) expect(exactSpearmanProbability(n, observed)).toBeCloseTo(twoSided(squares, observed), 12);
      for (const observed of new Set(inversions)) expect(inversionProbability(n, observed)).toBeCloseTo(twoSided(inversions, observed), 12);
    }
  });

  it('merging counts the inversions and sorts', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -9, max: 9 }), { maxLength: 60 }), (values) => {
        const list = Float64Array.from(values);
        expect(sortCountingInversions(list)).toBe(inversionsOf(values));
        expect([...list]).toEqual(values.toSorted((a, b) => a - b));
      }),
      { seed },
    );
  });
});
