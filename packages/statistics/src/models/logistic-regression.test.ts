import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { modelChecks } from '../../reference/models.checks.ts';
import { areaUnderCurve } from './area-under-curve.ts';
import { logisticRegression } from './index.ts';

/** Outcome and a 0/1 predictor with these counts. */
function fromCounts([[a, b], [c, d]]: readonly [readonly [number, number], readonly [number, number]]) {
  const repeat = (count: number, x: number, y: number) => Array.from({ length: count }, () => ({ x, y }));
  const rows = [...repeat(a, 1, 1), ...repeat(b, 1, 0), ...repeat(c, 0, 1), ...repeat(d, 0, 0)];
  return { outcome: rows.map((row) => row.y), x: rows.map((row) => row.x) };
}

describe('logistic regression', () => {
  it.each(modelChecks.filter((check) => check.method === 'logistic-regression'))('agrees with the figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });

  it('is the cross product of a 2 x 2 table, with its standard error', () => {
    const { outcome, x } = fromCounts([
      [23, 17],
      [12, 31],
    ]);
    const model = logisticRegression({ outcome, predictors: [{ name: 'x', values: x }] });
    if (model.kind !== 'logistic-model') throw new Error('expected a model');
    expect(model.coefficients[1]?.oddsRatio).toBeCloseTo((23 * 31) / (17 * 12), 10);
    expect(model.coefficients[1]?.standardError).toBeCloseTo(Math.sqrt(1 / 23 + 1 / 17 + 1 / 12 + 1 / 31), 10);
    expect(model.events).toBe(35);
  });

  it('follows the units of the predictor', () => {
    const { outcome, x } = fromCounts([
      [23, 17],
      [12, 31],
    ]);
    const fit = (values: number[]) => logisticRegression({ outcome, predictors: [{ name: 'x', values }] });
    const one = fit(x);
    const other = fit(x.map((value) => 1e6 + 1e-3 * value));
    if (one.kind !== 'logistic-model' || other.kind !== 'logistic-model') throw new Error('expected models');
    expect(other.coefficients[1]?.estimate).toBeCloseTo((one.coefficients[1]?.estimate ?? NaN) * 1000, 3);
    expect(other.deviance).toBeCloseTo(one.deviance, 8);
  });

  it.each([
    ['complete', Array.from({ length: 40 }, (_, i) => i), Array.from({ length: 40 }, (_, i) => (i < 20 ? 0 : 1))],
    ['complete in reverse', Array.from({ length: 40 }, (_, i) => -i), Array.from({ length: 40 }, (_, i) => (i < 20 ? 0 : 1))],
    [
      'quasi-complete (an empty cell)',
      fromCounts([
        [15, 0],
        [15, 30],
      ]).x,
      fromCounts([
        [15, 0],
        [15, 30],
      ]).outcome,
    ],
    [
      'quasi-complete at one point',
      [...Array.from({ length: 15 }, () => 0), 1, 1, ...Array.from({ length: 15 }, () => 2)],
      [...Array.from({ length: 15 }, () => 0), 0, 1, ...Array.from({ length: 15 }, () => 1)],
    ],
    ['complete in thousandths', Array.from({ length: 40 }, (_, i) => i / 1000), Array.from({ length: 40 }, (_, i) => (i < 20 ? 0 : 1))],
  ])('reports separation: %s', (_name, x, outcome) => {
    const model = logisticRegression({ outcome, predictors: [{ name: 'x', values: x }] });
    expect(model).toMatchObject({ kind: 'not-estimable' });
    if (model.kind === 'not-estimable') expect(model.reason).toMatch(/^separation/);
  });

  it('takes one overlapping pair as no separation, however steep', () => {
    const x = Array.from({ length: 60 }, (_, i) => i);
    const outcome: number[] = x.map((value) => (value < 30 ? 0 : 1));
    [outcome[29], outcome[30]] = [1, 0];
    expect(logisticRegression({ outcome, predictors: [{ name: 'x', values: x }] })).toMatchObject({ kind: 'logistic-model' });
  });

  it('asks for ten with and ten without the event for each predictor', () => {
    const { outcome, x } = fromCounts([
      [5, 15],
      [4, 30],
    ]);
    const model = logisticRegression({ outcome, predictors: [{ name: 'x', values: x }] });
    expect(model).toMatchObject({ kind: 'not-estimable', n: 54 });
    if (model.kind === 'not-estimable') expect(model.reason).toContain('9 with and 45 without the event');
  });

  it('names the predictor it cannot use', () => {
    const { outcome, x } = fromCounts([
      [23, 17],
      [22, 31],
    ]);
    const refused = (name: string, values: number[]) =>
      logisticRegression({
        outcome,
        predictors: [
          { name: 'x', values: x },
          { name, values },
        ],
      });
    expect(
      refused(
        'site',
        x.map(() => 2),
      ),
    ).toMatchObject({ reason: 'site does not vary' });
    expect(
      refused(
        'not x',
        x.map((value) => 1 - value),
      ),
    ).toMatchObject({ reason: 'not x is determined by the predictors before it' });
  });

  it('refuses an outcome that is not 0 or 1, and says no data', () => {
    expect(() => logisticRegression({ outcome: [0, 2], predictors: [{ name: 'x', values: [1, 2] }] })).toThrow(RangeError);
    expect(() => logisticRegression({ outcome: [0, 1], predictors: [] })).toThrow(RangeError);
    expect(logisticRegression({ outcome: [], predictors: [{ name: 'x', values: [] }] })).toMatchObject({ reason: 'no data' });
    expect(logisticRegression({ outcome: [null, 1], predictors: [{ name: 'x', values: [1, null] }] })).toMatchObject({
      leftOut: { missing: 2 },
    });
  });
});

describe('area under the curve', () => {
  it('is the share of pairs in the right order, ties counting half', () => {
    expect(areaUnderCurve(Float64Array.of(1, 2, 3, 4), Float64Array.of(0, 0, 1, 1))).toBe(1);
    expect(areaUnderCurve(Float64Array.of(1, 1, 1), Float64Array.of(0, 1, 0))).toBe(0.5);
    // Pairs: (2 beats 1), (2 loses to 3), (2 ties 2).
    expect(areaUnderCurve(Float64Array.of(2, 1, 3, 2), Float64Array.of(1, 0, 0, 0))).toBeCloseTo(0.5, 12);
  });
});
