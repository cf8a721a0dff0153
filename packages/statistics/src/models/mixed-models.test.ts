import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { modelChecks } from '../../reference/models.checks.ts';
import { symmetricSolver } from '../linear-algebra/solve-symmetric.ts';
import { seededGenerator } from '../resampling/index.ts';
import { linearRegression, randomInterceptModel, randomSlopeModel } from './index.ts';
import { minimiseSmooth } from './minimise-smooth.ts';

const seed = 47;

describe('mixed models', () => {
  it.each(modelChecks.filter((check) => check.method.startsWith('random-')))('agree with the figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });
});

describe('random intercept model', () => {
  const balanced = fc.tuple(fc.integer({ min: 5, max: 9 }), fc.integer({ min: 2, max: 6 })).chain(([clusters, size]) =>
    fc.record({
      size: fc.constant(size),
      values: fc.array(fc.integer({ min: 0, max: 200 }), { minLength: clusters * size, maxLength: clusters * size }),
    }),
  );

  it('is the analysis of variance when all clusters have one size', () => {
    fc.assert(
      fc.property(balanced, ({ size, values }) => {
        const cluster = values.map((_, i) => Math.floor(i / size));
        const clusters = values.length / size;
        const model = randomInterceptModel({ outcome: values, predictors: [], cluster });
        const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
        const means = Array.from(
          { length: clusters },
          (_, c) => values.slice(c * size, (c + 1) * size).reduce((sum, value) => sum + value, 0) / size,
        );
        const within =
          values.reduce((sum, value, i) => sum + (value - (means[cluster[i] as number] as number)) ** 2, 0) / (clusters * (size - 1));
        const between = (size * means.reduce((sum, value) => sum + (value - mean) ** 2, 0)) / (clusters - 1);
        if (within === 0) {
          expect(model.kind).toBe('not-estimable');
          return;
        }
        if (model.kind !== 'random-intercept-model') throw new Error(model.reason);
        expect(model.coefficients[0]?.estimate).toBeCloseTo(mean, 8);
        if (between > within * (1 + 1e-6)) {
          expect(model.varianceResidual / within).toBeCloseTo(1, 6);
          expect(model.varianceBetween / ((between - within) / size)).toBeCloseTo(1, 4);
        }
        if (between < within) {
          expect(model.varianceBetween).toBe(0);
          expect(model.failedAssumptions).toEqual(['no variation between clusters detected']);
          expect(model.coefficients[0]).not.toHaveProperty('satterthwaiteDf');
        }
      }),
      { seed },
    );
  });

  it('is least squares where there is no variation between clusters', () => {
    const x = Array.from({ length: 60 }, (_, i) => i % 6);
    const cluster = x.map((_, i) => Math.floor(i / 6));
    // The same six residuals in every cluster: the means of the clusters do not differ.
    const outcome = x.map((value, i) => 3 + 2 * value + ([1, -1, 2, -2, 0.5, -0.5][i % 6] as number));
    const mixed = randomInterceptModel({ outcome, predictors: [{ name: 'x', values: x }], cluster });
    const plain = linearRegression({ outcome, predictors: [{ name: 'x', values: x }] });
    if (mixed.kind !== 'random-intercept-model' || plain.kind !== 'linear-model') throw new Error('expected models');
    expect(mixed.varianceBetween).toBe(0);
    expect(mixed.coefficients[1]?.estimate).toBeCloseTo(plain.coefficients[1]?.estimate ?? NaN, 10);
    expect(mixed.coefficients[1]?.standardError).toBeCloseTo(plain.coefficients[1]?.standardError ?? NaN, 10);
    expect(mixed.clusterEffects.every((one) => one.effect === 0)).toBe(true);
  });

  it('does not mind the order of rows and follows a change of units', () => {
    const cluster = [1, 1, 2, 2, 2, 3, 3, 4, 4, 4, 5, 5, 6];
    const x = [0, 1, 0, 1, 2, 0, 2, 1, 2, 3, 0, 1, 2];
    const outcome = [3, 5, 8, 9, 12, 1, 4, 6, 6, 9, 2, 5, 7];
    const one = randomInterceptModel({ outcome, predictors: [{ name: 'x', values: x }], cluster });
    const other = randomInterceptModel({
      outcome: outcome.map((y) => 1e5 + 0.01 * y).reverse(),
      predictors: [{ name: 'x', values: x.map((value) => 1000 * value - 5e5).reverse() }],
      cluster: [...cluster].reverse(),
    });
    if (one.kind !== 'random-intercept-model' || other.kind !== 'random-intercept-model') throw new Error('expected models');
    expect(other.coefficients[1]?.test.statistic).toBeCloseTo(one.coefficients[1]?.test.statistic ?? NaN, 6);
    expect(other.intraclassCorrelation).toBeCloseTo(one.intraclassCorrelation, 7);
    expect(other.coefficients[1]?.satterthwaiteDf).toBeCloseTo(one.coefficients[1]?.satterthwaiteDf ?? NaN, 4);
  });

  it('says why there is none', () => {
    const cluster = [1, 1, 2, 2, 3, 3, 4, 4, 5, 5];
    const outcome = [1, 2, 4, 3, 6, 5, 8, 9, 7, 8];
    const fit = (change: Partial<Parameters<typeof randomInterceptModel>[0]>) =>
      randomInterceptModel({ outcome, predictors: [], cluster, ...change });
    expect(fit({ outcome: [], cluster: [] })).toMatchObject({ reason: 'no data' });
    expect(fit({ cluster: cluster.map((c) => Math.min(c, 4)) })).toMatchObject({
      reason: '4 clusters: a random intercept needs at least 5',
    });
    expect(fit({ cluster: cluster.map((_, i) => i) })).toMatchObject({ reason: 'no cluster has more than one row' });
    expect(fit({ outcome: outcome.map(() => 2) })).toMatchObject({ reason: 'all values equal' });
    expect(fit({ outcome: cluster })).toMatchObject({ reason: 'the outcome does not vary within clusters beyond what the predictors say' });
    expect(fit({ predictors: [{ name: 'site', values: outcome.map(() => 1) }] })).toMatchObject({ reason: 'site does not vary' });
    const x = outcome.map((_, i) => i % 2);
    expect(
      fit({
        predictors: [
          { name: 'x', values: x },
          { name: 'not x', values: x.map((value) => 1 - value) },
        ],
      }),
    ).toMatchObject({ reason: 'not x is determined by the predictors before it' });
    const own = [1, 2, 3, 4].map((c) => ({ name: `cluster ${c}`, values: cluster.map((value) => (value === c ? 1 : 0)) }));
    expect(fit({ predictors: own })).toMatchObject({ reason: 'too few participants for this model (n = 10, 5 coefficients)' });
    expect(fit({ outcome: [null, ...outcome.slice(1)] })).toMatchObject({ n: 9, leftOut: { missing: 1 } });
  });
});

describe('restricted likelihood', () => {
  /** ln determinant and inverse of a positive definite matrix. */
  const decomposed = (matrix: number[][]) => {
    const solver = symmetricSolver(matrix);
    if (solver === undefined) throw new Error('expected a positive definite matrix');
    return { logDeterminant: solver.logDeterminant, inverse: solver.inverse() };
  };

  /** With the covariance of all rows written out: -1/2 [(N - p)(ln 2 pi s2 + 1) + ln|V| + ln|X'V^-1 X|]. */
  function writtenOut(y: number[], x: number[][], covariance: (i: number, j: number) => number): number {
    const { logDeterminant, inverse } = decomposed(y.map((_, i) => y.map((_, j) => covariance(i, j) + (i === j ? 1 : 0))));
    const form = (a: number[], b: number[]): number =>
      a.reduce((sum, value, i) => sum + value * b.reduce((inner, other, j) => inner + (inverse[i]?.[j] as number) * other, 0), 0);
    const column = (k: number): number[] => x.map((row) => row[k] as number);
    const order = x[0]?.length ?? 0;
    const cross = Array.from({ length: order }, (_, k) => Array.from({ length: order }, (_, l) => form(column(k), column(l))));
    const moment = cross.map((_, k) => form(column(k), y));
    const { logDeterminant: ofCoefficients, inverse: crossInverse } = decomposed(cross);
    const explained = moment.reduce(
      (sum, value, k) => sum + value * moment.reduce((inner, other, l) => inner + (crossInverse[k]?.[l] as number) * other, 0),
      0,
    );
    const df = y.length - order;
    return -(df * (Math.log((2 * Math.PI * (form(y, y) - explained)) / df) + 1) + logDeterminant + ofCoefficients) / 2;
  }

  const cluster = [1, 1, 1, 2, 2, 3, 3, 3, 3, 4, 4, 4, 5, 5, 5, 6, 6, 6, 6];
  const week = [0, 1, 3, 0, 2, 0, 1, 2, 4, 1, 2, 3, 0, 1, 3, 0, 1, 2, 4];
  const outcome = [3, 6, 11, 8, 9, 1, 2, 4, 5, 9, 9, 15, 4, 4, 7, 10, 13, 15, 24];
  const slope = { name: 'week', values: week };
  const design = week.map((time) => [1, time]);
  const together = (i: number, j: number): boolean => cluster[i] === cluster[j];

  it('is what writing out the covariance of all rows gives, and no ratio does better', () => {
    const model = randomInterceptModel({ outcome, predictors: [slope], cluster });
    if (model.kind !== 'random-intercept-model') throw new Error(model.reason);
    const ratio = model.varianceBetween / model.varianceResidual;
    const at = (lambda: number): number => writtenOut(outcome, design, (i, j) => (together(i, j) ? lambda : 0));
    expect(model.logLikelihood).toBeCloseTo(at(ratio), 8);
    for (const factor of [0, 0.5, 0.99, 1.01, 2, 100]) expect(at(ratio * factor)).toBeLessThan(model.logLikelihood);
  });

  it('is what writing out the covariance of all rows gives with a slope too', () => {
    const crossing = [3, 6, 14, 14, 15, 5, 2, 4, 1, 9, 9, 15, 1, 4, 12, 10, 13, 15, 14];
    const model = randomSlopeModel({ outcome: crossing, slope, predictors: [], cluster });
    if (model.kind !== 'random-slope-model') throw new Error(model.reason);
    const { varianceIntercept: a, covariance: b, varianceSlope: c, varianceResidual } = model;
    const at = (fa: number, fb: number, fc: number): number =>
      writtenOut(crossing, design, (i, j) => {
        const [t, u] = [week[i] as number, week[j] as number];
        return together(i, j) ? (a * fa + b * fb * (t + u) + c * fc * t * u) / varianceResidual : 0;
      });
    expect(model.logLikelihood).toBeCloseTo(at(1, 1, 1), 8);
    for (const [fa, fb, fc] of [
      [1.02, 1, 1],
      [0.98, 1, 1],
      [1, 1.05, 1],
      [1, 0.95, 1],
      [1, 1, 1.02],
      [1, 1, 0.98],
    ] as const) {
      expect(at(fa, fb, fc)).toBeLessThan(model.logLikelihood + 1e-9);
    }
  });
});

describe('random slope model', () => {
  const generator = seededGenerator(470);
  const noise = (): number => generator.nextFraction() - 0.5;
  const people = 40;
  const times = [0, 1, 2, 3, 4];
  const cluster = Array.from({ length: people * times.length }, (_, i) => `P${Math.floor(i / times.length)}`);
  const week = cluster.map((_, i) => times[i % times.length] as number);
  const own = Array.from({ length: people }, () => [4 * noise(), 2 * noise()] as const);
  const withSlopes = cluster.map((_, i) => {
    const [level, pace] = own[Math.floor(i / times.length)] as readonly [number, number];
    return 10 + level + (1 + pace) * (week[i] as number) + noise();
  });
  const slope = { name: 'week', values: week };

  it('finds the slopes that were put in', () => {
    const model = randomSlopeModel({ outcome: withSlopes, slope, predictors: [], cluster });
    if (model.kind !== 'random-slope-model') throw new Error(model.reason);
    const sampled = (values: readonly number[]): number => {
      const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
      return values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1);
    };
    // Up to what the noise of forty people leaves open.
    const ratio = model.varianceSlope / sampled(own.map(([, pace]) => pace));
    expect(ratio).toBeGreaterThan(0.8);
    expect(ratio).toBeLessThan(1.25);
    expect(model.coefficients[0]?.df).toBe(people * times.length - people - 1);
    expect(model.failedAssumptions).toEqual([]);
  });

  it('does not mind where time begins, but for the intercepts', () => {
    const one = randomSlopeModel({ outcome: withSlopes, slope, predictors: [], cluster });
    const other = randomSlopeModel({
      outcome: withSlopes,
      slope: { name: 'day', values: week.map((time) => 7 * time + 100) },
      predictors: [],
      cluster,
    });
    if (one.kind !== 'random-slope-model' || other.kind !== 'random-slope-model') throw new Error('expected models');
    expect((other.varianceSlope * 49) / one.varianceSlope).toBeCloseTo(1, 6);
    // Variance of the person's line at week 0, which is day 100.
    const atStart = other.varianceIntercept + 2 * 100 * other.covariance + 100 ** 2 * other.varianceSlope;
    expect(atStart / one.varianceIntercept).toBeCloseTo(1, 5);
    expect(other.coefficients[1]?.test.statistic).toBeCloseTo(one.coefficients[1]?.test.statistic ?? NaN, 6);
  });

  it('is the random intercept model where the slopes do not vary, and says that it is on the edge', () => {
    const parallel = withSlopes.map((y, i) => y - (own[Math.floor(i / times.length)]?.[1] ?? 0) * (week[i] as number) + 0.05 * Math.cos(i));
    const flat = parallel.map((y, i) => y - 0.02 * (i % 2));
    const slopes = randomSlopeModel({ outcome: flat, slope, predictors: [], cluster });
    const intercepts = randomInterceptModel({ outcome: flat, predictors: [slope], cluster });
    if (slopes.kind !== 'random-slope-model' || intercepts.kind !== 'random-intercept-model') throw new Error('expected models');
    // The larger model is never less likely, and here hardly more.
    expect(slopes.logLikelihood).toBeGreaterThanOrEqual(intercepts.logLikelihood - 1e-8);
    expect(slopes.logLikelihood - intercepts.logLikelihood).toBeLessThan(4);
    expect(slopes.coefficients[1]?.estimate).toBeCloseTo(intercepts.coefficients[1]?.estimate ?? NaN, 2);
  });

  it('settles where nothing varies between participants', () => {
    const outcome = week.map((time, i) => 3 + time + ([1, -1, 0.5, -0.5, 0][i % 5] as number) * (Math.floor(i / 5) % 2 === 0 ? 1 : -1));
    const model = randomSlopeModel({ outcome, slope, predictors: [], cluster });
    if (model.kind !== 'random-slope-model') throw new Error(model.reason);
    expect(model.failedAssumptions.join()).toContain('edge');
    expect(model.varianceIntercept).toBeGreaterThanOrEqual(0);
  });

  it('says why there is none', () => {
    const fit = (change: Partial<Parameters<typeof randomSlopeModel>[0]>) =>
      randomSlopeModel({ outcome: withSlopes, slope, predictors: [], cluster, ...change });
    expect(fit({ cluster: cluster.map((_, i) => i % 4) })).toMatchObject({ reason: '4 clusters: a random slope needs at least 5' });
    expect(fit({ cluster: cluster.map((_, i) => Math.floor(i / 2)) })).toMatchObject({ kind: 'not-estimable' });
    expect(fit({ outcome: withSlopes.map(() => 1) })).toMatchObject({ reason: 'all values equal' });
    expect(fit({ slope: { name: 'week', values: week.map(() => 1) } })).toMatchObject({ reason: 'week does not vary' });
    expect(fit({ slope: { name: 'age', values: cluster.map((_, i) => Math.floor(i / 5)) } })).toMatchObject({
      reason: 'age does not vary within clusters',
    });
    expect(fit({ predictors: [{ name: 'again', values: week }] })).toMatchObject({
      reason: 'again is determined by the predictors before it',
    });
    expect(fit({ outcome: week.map((time, i) => Math.floor(i / 5) * time) })).toMatchObject({
      reason: 'each cluster lies on its own line exactly',
    });
    expect(fit({ outcome: withSlopes.map((y) => y * 1e200) })).toMatchObject({ reason: 'values too large to compute with' });
  });
});

describe('smooth minimum', () => {
  it('finds the bottom of a curved valley', () => {
    // Rosenbrock (1960): minimum 0 at (1, 1).
    const { at, value, converged } = minimiseSmooth(([x = 0, y = 0]) => (1 - x) ** 2 + 100 * (y - x * x) ** 2, [-1.2, 1]);
    expect(converged).toBe(true);
    expect(value).toBeLessThan(1e-12);
    expect(at[0]).toBeCloseTo(1, 5);
    expect(at[1]).toBeCloseTo(1, 5);
  });

  it('says when it did not settle', () => {
    expect(minimiseSmooth(([x = 0]) => x, [0]).converged).toBe(false);
  });
});
