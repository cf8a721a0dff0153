import fc from 'fast-check';
import jStat from 'jstat';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { distributionChecks } from '../../reference/distributions.checks.ts';
import type { Tails } from './index.ts';
import {
  betaQuantile,
  betaTails,
  binomialLogMass,
  binomialMass,
  binomialQuantile,
  binomialTails,
  chiSquareQuantile,
  chiSquareTails,
  fQuantile,
  fTails,
  gammaQuantile,
  gammaTails,
  hypergeometricMass,
  hypergeometricQuantile,
  hypergeometricTails,
  logGamma,
  noncentralityWithLowerTail,
  noncentralTTails,
  normalDensity,
  normalMultiplier,
  normalQuantile,
  normalTails,
  poissonMass,
  poissonQuantile,
  poissonTails,
  studentisedRangeQuantile,
  studentisedRangeTails,
  tMultiplier,
  tQuantile,
  tTails,
  tTwoSided,
  z95,
} from './index.ts';

const seed = 20240601;
const df = fc.double({ min: 0.5, max: 1e7, noNaN: true });
const probability = fc.double({ min: 1e-12, max: 1 - 1e-12, noNaN: true });
const positive = fc.double({ min: 1e-6, max: 1e6, noNaN: true });

function expectWhole({ lower, upper, logLower, logUpper }: Tails): void {
  expect(lower).toBeGreaterThanOrEqual(0);
  expect(upper).toBeGreaterThanOrEqual(0);
  expect(lower + upper).toBeCloseTo(1, 12);
  expect(Math.exp(logLower)).toBeCloseTo(lower, 12);
  expect(Math.exp(logUpper)).toBeCloseTo(upper, 12);
}

describe('the distribution functions', () => {
  const names = new Set(distributionChecks.map((check) => check.id.slice(0, check.id.indexOf('('))));
  it.each([...names])('%s agrees with the values computed with mpmath', (name) => {
    const checks = distributionChecks.filter((check) => check.id.startsWith(`${name}(`));
    expect(checks.flatMap((check) => agreement(check).disagreements.map((found) => ({ id: check.id, ...found })))).toEqual([]);
  });

  it('has the tails sum to one', () => {
    fc.assert(
      fc.property(fc.double({ min: -50, max: 50, noNaN: true }), positive, df, df, probability, (x, y, a, b, p) => {
        expectWhole(normalTails(x));
        expectWhole(tTails(x, a));
        expectWhole(chiSquareTails(y, a));
        expectWhole(fTails(y, a, b));
        expectWhole(betaTails(p, a, b));
        expectWhole(gammaTails(y, a, b));
        expectWhole(poissonTails(Math.floor(y), a));
      }),
      { seed, numRuns: 200 },
    );
  });

  it('answers quantiles that give the probability back', () => {
    fc.assert(
      fc.property(probability, fc.double({ min: 1, max: 1e4, noNaN: true }), fc.double({ min: 1, max: 1e4, noNaN: true }), (p, a, b) => {
        expect(normalTails(normalQuantile(p)).lower / p).toBeCloseTo(1, 9);
        expect(tTails(tQuantile(p, a), a).lower / p).toBeCloseTo(1, 9);
        expect(chiSquareTails(chiSquareQuantile(p, a), a).lower / p).toBeCloseTo(1, 9);
        expect(fTails(fQuantile(p, a, b, 'upper'), a, b).upper / p).toBeCloseTo(1, 9);
        expect(betaTails(betaQuantile(p, a, b), a, b).lower / p).toBeCloseTo(1, 7);
        expect(gammaTails(gammaQuantile(p, a, b, 'upper'), a, b).upper / p).toBeCloseTo(1, 9);
      }),
      { seed, numRuns: 100 },
    );
  });

  it('has masses that add up to the tails', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 40 }),
        fc.integer({ min: 0, max: 40 }),
        fc.integer({ min: 1, max: 40 }),
        probability,
        (a, b, n, p) => {
          const draws = Math.min(n, a + b);
          let binomial = 0;
          let hypergeometric = 0;
          let poisson = 0;
          for (let x = 0; x <= n; x++) {
            binomial += binomialMass(x, n, p);
            hypergeometric += hypergeometricMass(x, a, b, draws);
            poisson += poissonMass(x, 3 * p);
            expect(binomialTails(x, n, p).lower).toBeCloseTo(binomial, 12);
            expect(hypergeometricTails(x, a, b, draws).lower).toBeCloseTo(hypergeometric, 12);
            expect(poissonTails(x, 3 * p).lower).toBeCloseTo(poisson, 12);
          }
        },
      ),
      { seed, numRuns: 100 },
    );
  });

  it('answers the smallest number whose lower tail reaches p', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 300 }), probability, probability, (n, p, target) => {
        const x = binomialQuantile(target, n, p);
        expect(binomialTails(x, n, p).lower).toBeGreaterThanOrEqual(target * (1 - 1e-13));
        expect(binomialTails(x - 1, n, p).lower).toBeLessThan(target);
        const count = poissonQuantile(target, n * p);
        expect(poissonTails(count, n * p).lower).toBeGreaterThanOrEqual(target * (1 - 1e-13));
        if (count > 0) expect(poissonTails(count - 1, n * p).lower).toBeLessThan(target);
      }),
      { seed, numRuns: 200 },
    );
    expect(binomialQuantile(0.25, 2, 0.5)).toBe(0);
    expect(hypergeometricQuantile(1 / 70, 4, 4, 4)).toBe(0);
    expect(hypergeometricQuantile(17 / 70, 4, 4, 4)).toBe(1);
    expect(poissonQuantile(1, 3)).toBe(Infinity);
  });

  it('is the limit of the others where it should be', () => {
    expect(tTails(1.7, Infinity)).toEqual(normalTails(1.7));
    expect(tTails(1.7, 1e12).upper).toBeCloseTo(normalTails(1.7).upper, 11);
    expect(fTails(2.1, 3, 1e12).upper).toBeCloseTo(chiSquareTails(6.3, 3).upper, 10);
    expect(noncentralTTails(1.3, 7, 0).upper).toBeCloseTo(tTails(1.3, 7).upper, 13);
    // Two groups: the range over its error is root two times |t|.
    expect(studentisedRangeTails(3, 2, 12).upper).toBeCloseTo(tTwoSided(3 / Math.SQRT2, 12), 12);
    expect(studentisedRangeTails(3, 2, Infinity).upper).toBeCloseTo(2 * normalTails(3 / Math.SQRT2).upper, 12);
    // t with one degree of freedom is Cauchy: P(T > t) = 1/2 - arctan(t)/pi.
    expect(tTails(7, 1).upper).toBeCloseTo(0.5 - Math.atan(7) / Math.PI, 14);
    expect(logGamma(11)).toBeCloseTo(Math.log(3628800), 13);
    expect(normalDensity(0)).toBeCloseTo(1 / Math.sqrt(2 * Math.PI), 15);
    expect(normalMultiplier(0.95)).toBeCloseTo(z95, 14);
    expect(tMultiplier(0.95, 9)).toBe(tQuantile(0.975, 9));
  });

  it('agrees with jstat on the studentised range, to the digits jstat has', () => {
    for (const [q, groups, error] of [
      [3.5, 3, 27],
      [4.1, 6, 66],
      [2, 4, 12],
    ] as const) {
      expect(Math.abs(studentisedRangeTails(q, groups, error).lower - jStat.tukey.cdf(q, groups, error))).toBeLessThan(1e-7);
      expect(Math.abs(studentisedRangeQuantile(0.95, groups, error) - jStat.tukey.inv(0.95, groups, error))).toBeLessThan(1e-6);
    }
  });

  it('agrees with jstat on the common distributions, to the digits jstat has', () => {
    const near = (ours: number, theirs: number) => expect(Math.abs(ours - theirs)).toBeLessThan(1e-7);
    fc.assert(
      fc.property(
        fc.double({ min: -6, max: 6, noNaN: true }),
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        fc.double({ min: 1, max: 60, noNaN: true }),
        fc.double({ min: 1, max: 60, noNaN: true }),
        (x, p, a, b) => {
          near(normalTails(x).lower, jStat.normal.cdf(x, 0, 1));
          near(normalQuantile(p), jStat.normal.inv(p, 0, 1));
          near(tTails(x, a).lower, jStat.studentt.cdf(x, a));
          near(chiSquareTails(10 * p * a, a).lower, jStat.chisquare.cdf(10 * p * a, a));
          near(fTails(5 * p, a, b).lower, jStat.centralF.cdf(5 * p, a, b));
          near(betaTails(p, a, b).lower, jStat.beta.cdf(p, a, b));
          near(gammaTails(10 * p * a, a).lower, jStat.gamma.cdf(10 * p * a, a, 1));
        },
      ),
      { seed, numRuns: 200 },
    );
  });

  it('keeps its digits for enormous statistics', () => {
    for (const df of [1, 2, 5, 200]) {
      for (const q of [50, 5e3, 1e6, 1e8, 1e20, 1e50]) {
        // Two groups: the range over its error is root two times |t|; without noncentrality the noncentral t is t.
        const t = tTails(q / Math.SQRT2, df).logUpper;
        expect(Math.abs(studentisedRangeTails(q, 2, df).logUpper - Math.LN2 - t)).toBeLessThan(1e-13 * Math.abs(t) + 1e-13);
        expect(Math.abs(noncentralTTails(q, df, 0).logUpper - tTails(q, df).logUpper)).toBeLessThan(1e-13 * Math.abs(t) + 1e-13);
      }
    }
    // With 2 degrees of freedom q² P(range > q) approaches E(W²), for three normals 2 + 3 root 3/pi (David & Nagaraja 2003, Order Statistics).
    expect(studentisedRangeTails(1e9, 3, 2).upper * 1e18).toBeCloseTo(2 + (3 * Math.sqrt(3)) / Math.PI, 9);
    // Beyond 1e150 there is nothing left to tell apart.
    expect(studentisedRangeTails(1e300, 3, 2)).toEqual(studentisedRangeTails(1e150, 3, 2));
  });

  it('finds the noncentrality that puts t at a given tail', () => {
    fc.assert(
      fc.property(
        fc.oneof(fc.double({ min: -30, max: 30, noNaN: true }), fc.double({ min: 30, max: 1e9, noNaN: true })),
        fc.double({ min: 1, max: 500, noNaN: true }),
        fc.double({ min: 0.001, max: 0.999, noNaN: true }),
        (t, error, p) => {
          const tails = noncentralTTails(t, error, noncentralityWithLowerTail(t, error, p));
          expect(tails.lower / p).toBeCloseTo(1, 9);
        },
      ),
      { seed, numRuns: 50 },
    );
  });

  it('keeps probabilities too small for a double on the log scale', () => {
    expect(normalTails(60).upper).toBe(0);
    // ln P(Z > 60) = -1805.013560…, leading term of the asymptotic series (Abramowitz & Stegun 26.2.12) to 1e-6.
    expect(normalTails(60).logUpper).toBeCloseTo(-1800 - Math.log(60 * Math.sqrt(2 * Math.PI)) + Math.log1p(-1 / 3600), 6);
    expect(tTails(1e300, 0.5).upper).toBeGreaterThan(0);
    expect(chiSquareTails(1e5, 2).logUpper).toBeCloseTo(-5e4, 6);
    expect(studentisedRangeTails(200, 3, 100).logUpper).toBeLessThan(-100);
    expect(tQuantile(1e-300, 1)).toBeCloseTo(-1e300 / Math.PI, -288);
  });

  it('answers the ends of the scale', () => {
    for (const tails of [
      normalTails(-Infinity),
      tTails(-Infinity, 3),
      chiSquareTails(0, 3),
      fTails(-1, 2, 3),
      betaTails(-0.1, 2, 3),
      binomialTails(-1, 5, 0.2),
      poissonTails(-1, 2),
      hypergeometricTails(-1, 3, 3, 2),
      studentisedRangeTails(0, 3, 9),
      noncentralTTails(-Infinity, 3, 1),
    ]) {
      expect(tails).toMatchObject({ lower: 0, upper: 1, logUpper: 0 });
    }
    for (const tails of [
      normalTails(Infinity),
      tTails(Infinity, 3),
      chiSquareTails(Infinity, 3),
      fTails(Infinity, 2, 3),
      betaTails(1.1, 2, 3),
      binomialTails(5, 5, 0.2),
      hypergeometricTails(2, 3, 3, 2),
      studentisedRangeTails(Infinity, 3, 9),
      noncentralTTails(Infinity, 3, 1),
    ]) {
      expect(tails).toMatchObject({ lower: 1, upper: 0, logLower: 0 });
    }
    expect([
      normalQuantile(0),
      tQuantile(0, 4),
      chiSquareQuantile(0, 4),
      fQuantile(0, 2, 4),
      betaQuantile(0, 2, 4),
      studentisedRangeQuantile(0, 3, 9),
    ]).toEqual([-Infinity, -Infinity, 0, 0, 0, 0]);
    expect([
      normalQuantile(1),
      tQuantile(1, 4),
      chiSquareQuantile(1, 4),
      fQuantile(1, 2, 4),
      betaQuantile(1, 2, 4),
      studentisedRangeQuantile(1, 3, 9),
    ]).toEqual([Infinity, Infinity, Infinity, Infinity, 1, Infinity]);
    expect(binomialTails(3, 5, 0)).toMatchObject({ lower: 1 });
    expect(binomialTails(3, 5, 1)).toMatchObject({ upper: 1 });
    expect([binomialLogMass(0, 5, 0), binomialLogMass(5, 5, 1), binomialLogMass(1, 5, 0), binomialLogMass(1.5, 5, 0.5)]).toEqual([
      0,
      0,
      -Infinity,
      -Infinity,
    ]);
  });

  it('stays finite and quick for enormous parameters', () => {
    for (const tails of [
      tTails(2, 1e15),
      tTails(1e300, 1e7),
      binomialTails(5e8, 1e9, 0.5),
      gammaTails(1e9, 1e9),
      fTails(3, 3, 1e15),
      noncentralTTails(2, 1e6, 1),
      hypergeometricTails(5e5, 1e6, 1e6, 1e6),
    ])
      expectWhole(tails);
  });

  it('refuses what is no argument instead of answering NaN', () => {
    for (const call of [
      () => normalTails(NaN),
      () => normalQuantile(1.1),
      () => normalQuantile(NaN),
      () => tTails(1, 0),
      () => tTails(NaN, 3),
      () => tTails(1, NaN),
      () => tQuantile(-0.1, 3),
      () => chiSquareTails(1, -1),
      () => fTails(1, 0, 3),
      () => betaTails(0.5, 0, 1),
      () => betaTails(0.5, 1, 1e13),
      () => gammaTails(1, 1e13),
      () => binomialTails(1, 2.5, 0.5),
      () => binomialTails(1, 2, 1.5),
      () => poissonTails(1, 0),
      () => hypergeometricTails(1, 2, 2, 5),
      () => noncentralTTails(1, 0.5, 1),
      () => noncentralTTails(1, 5, Infinity),
      () => studentisedRangeTails(1, 1, 5),
      () => studentisedRangeTails(1, 3, 0.5),
      () => logGamma(0),
    ]) {
      expect(call).toThrow(RangeError);
    }
  });
});
