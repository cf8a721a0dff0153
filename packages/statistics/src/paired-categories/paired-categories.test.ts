import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { pairedCategoryChecks } from '../../reference/paired-categories.checks.ts';
import { exactSignProbability } from './exact-sign-probability.ts';
import { bowkerSymmetry, mcNemarTest, stuartMaxwell, transitionSummary, weightedKappa } from './index.ts';

const seed = 43;
const square = (size: number) =>
  fc.array(fc.array(fc.nat({ max: 12 }), { minLength: size, maxLength: size }), { minLength: size, maxLength: size });
const anySquare = fc.integer({ min: 2, max: 5 }).chain(square);
const transposed = (table: readonly (readonly number[])[]): number[][] => table.map((_, i) => table.map((row) => row[i] as number));

describe('the same people classified twice', () => {
  it.each(pairedCategoryChecks)('agrees with the published figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });
});

describe('symmetry and equal margins', () => {
  it('do not mind which occasion came first', () => {
    fc.assert(
      fc.property(anySquare, (table) => {
        for (const method of [bowkerSymmetry, stuartMaxwell]) {
          const one = method(table);
          const other = method(transposed(table));
          expect(other.kind).toBe(one.kind);
          if (one.kind !== 'test' || other.kind !== 'test') continue;
          expect(other.statistic).toBeCloseTo(one.statistic, 8);
          expect(other.df).toEqual(one.df);
        }
      }),
      { seed },
    );
  });

  it('are McNemar for two categories', () => {
    fc.assert(
      fc.property(
        fc.tuple(fc.tuple(fc.nat({ max: 30 }), fc.nat({ max: 30 })), fc.tuple(fc.nat({ max: 30 }), fc.nat({ max: 30 }))),
        (table) => {
          const mcNemar = mcNemarTest(table);
          const bowker = bowkerSymmetry(table);
          const stuart = stuartMaxwell(table);
          if (mcNemar.kind !== 'test') {
            expect(bowker.kind).toBe('not-estimable');
            expect(stuart.kind).toBe('not-estimable');
            return;
          }
          expect(bowker).toMatchObject({ statistic: expect.closeTo(mcNemar.asymptotic.statistic, 8) });
          expect(stuart).toMatchObject({ statistic: expect.closeTo(mcNemar.asymptotic.statistic, 8) });
        },
      ),
      { seed },
    );
  });

  it('count degrees of freedom from what moved', () => {
    // A and B exchange people, C and D exchange people, E keeps to itself: two pairs, and one free margin in each.
    const islands = [
      [4, 3, 0, 0, 0],
      [1, 5, 0, 0, 0],
      [0, 0, 6, 2, 0],
      [0, 0, 4, 7, 0],
      [0, 0, 0, 0, 9],
    ];
    expect(bowkerSymmetry(islands)).toMatchObject({ df: [2] });
    const stuart = stuartMaxwell(islands);
    expect(stuart).toMatchObject({ df: [2] });
    // Each island is a McNemar test of its own: (3-1)^2/4 + (4-2)^2/6.
    expect(stuart).toMatchObject({ statistic: expect.closeTo(1 + 4 / 6, 12) });
  });

  it('find nothing where nobody changed', () => {
    const still = [
      [4, 0],
      [0, 3],
    ];
    expect(bowkerSymmetry(still)).toMatchObject({ kind: 'not-estimable', n: 7 });
    expect(stuartMaxwell(still)).toMatchObject({ kind: 'not-estimable', n: 7 });
    expect(
      mcNemarTest([
        [4, 0],
        [0, 3],
      ]),
    ).toMatchObject({ kind: 'not-estimable', n: 7 });
    expect(bowkerSymmetry([])).toMatchObject({ kind: 'not-estimable', n: 0 });
  });

  it('refuse a table that is not square', () => {
    expect(() => bowkerSymmetry([[1, 2, 3]])).toThrow(RangeError);
    expect(() => stuartMaxwell([[1, 2, 3]])).toThrow(RangeError);
    expect(() => weightedKappa([[1, 2, 3]])).toThrow(RangeError);
    expect(() => transitionSummary([[1, 2, 3]])).toThrow(RangeError);
  });
});

describe('exact sign test', () => {
  it('has the p that can be counted by hand', () => {
    expect(exactSignProbability(6, 0)).toBeCloseTo(2 / 64, 14);
    expect(exactSignProbability(3, 3)).toBe(1);
    // P(X <= 1 of 5) = 6/32, twice.
    expect(exactSignProbability(1, 4)).toBeCloseTo(12 / 32, 14);
  });
});

describe('weighted kappa', () => {
  it('is 1 for full agreement of at least two categories and never above', () => {
    expect(
      weightedKappa([
        [5, 0],
        [0, 4],
      ]),
    ).toMatchObject({ estimate: 1 });
    fc.assert(
      fc.property(anySquare, fc.constantFrom('quadratic' as const, 'linear' as const, 'none' as const), (table, weights) => {
        const kappa = weightedKappa(table, weights);
        if (kappa.kind !== 'estimate') return;
        expect(kappa.estimate).toBeLessThanOrEqual(1 + 1e-12);
        expect(kappa.standardError).toBeGreaterThanOrEqual(0);
        expect(Number.isFinite(kappa.test.p)).toBe(true);
      }),
      { seed },
    );
  });

  it('does not mind which observer comes first, and for two categories not the weights either', () => {
    fc.assert(
      fc.property(square(2), (table) => {
        const one = weightedKappa(table, 'quadratic');
        const other = weightedKappa(transposed(table), 'none');
        expect(other.kind).toBe(one.kind);
        if (one.kind === 'estimate' && other.kind === 'estimate') expect(other.estimate).toBeCloseTo(one.estimate, 10);
      }),
      { seed },
    );
  });

  it('says so when all are in one category', () => {
    expect(
      weightedKappa([
        [7, 0],
        [0, 0],
      ]),
    ).toMatchObject({ kind: 'not-estimable', n: 7 });
    expect(weightedKappa([[7]])).toMatchObject({ kind: 'not-estimable' });
    expect(weightedKappa([])).toMatchObject({ kind: 'not-estimable', reason: 'no data' });
  });

  it('gives no test where chance leaves no room for one', () => {
    // Everybody in the first category before, spread after: kappa is 0 by construction.
    expect(
      weightedKappa([
        [3, 4],
        [0, 0],
      ]),
    ).toMatchObject({ kind: 'not-estimable', pointEstimate: expect.closeTo(0, 12) });
  });
});

describe('grade transitions', () => {
  it('count everybody once', () => {
    fc.assert(
      fc.property(anySquare, (table) => {
        const summary = transitionSummary(table);
        expect(summary.unchanged + summary.improved + summary.worsened).toBe(summary.n);
        expect(summary.improvedByTwoOrMore).toBeLessThanOrEqual(summary.improved);
        expect(summary.byBaselineGrade.reduce((sum, grade) => sum + grade.n, 0)).toBe(summary.n);
      }),
      { seed },
    );
  });

  it('keep a baseline grade without anybody, and a cohort in which nobody moved', () => {
    const summary = transitionSummary([
      [4, 0],
      [0, 0],
    ]);
    expect(summary.signTest).toMatchObject({ kind: 'not-estimable' });
    expect(summary.byBaselineGrade[1]?.shareImproved).toMatchObject({ kind: 'not-estimable', reason: 'no data' });
    expect(summary.byBaselineGrade[0]?.shareImproved).toMatchObject({ estimate: 0 });
  });
});
