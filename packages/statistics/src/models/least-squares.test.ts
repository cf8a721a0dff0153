import fc from 'fast-check';
import { linearRegression as simpleRegression } from 'simple-statistics';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { modelChecks } from '../../reference/models.checks.ts';
import { fittedNistSets, nistDigits, nistRegression, nistRegressionChecks } from '../../reference/nist-linear-regression.checks.ts';
import type { LinearModel } from './index.ts';
import { ancova, indicatorPredictors, linearRegression, predictedMean, productPredictor } from './index.ts';

const seed = 46;
const value = fc.integer({ min: -100, max: 100 });

function fitted(answer: ReturnType<typeof linearRegression>): LinearModel {
  if (answer.kind !== 'linear-model') throw new Error(answer.reason);
  return answer;
}

describe('linear regression and analysis of covariance', () => {
  it.each(modelChecks.filter((check) => ['linear-regression', 'ancova'].includes(check.method)))(
    'agree with the figures of $id',
    (check) => {
      expect(agreement(check).disagreements).toEqual([]);
    },
  );
});

describe('the certified regressions of NIST', () => {
  it.each(nistRegressionChecks)('$id is met to the digits asked for', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });

  it('keeps 12 digits of every standard error', () => {
    for (const set of fittedNistSets) expect(nistDigits(set).standardErrors).toBeGreaterThan(12);
  });

  it('names the power of Filip that the lower ones determine in double precision', () => {
    expect(nistRegression('Filip')).toMatchObject({
      kind: 'not-estimable',
      reason: 'x^10 is determined by the predictors before it',
      n: 82,
    });
  });

  it('gives no test where the fit is exact', () => {
    const model = fitted(nistRegression('Wampler1'));
    expect(model.residualSd).toBe(0);
    expect(model).not.toHaveProperty('overallTest');
    expect(model).not.toHaveProperty('likelihood');
    expect(model.coefficients.every((one) => one.test === undefined)).toBe(true);
    expect(model.failedAssumptions.join()).toContain('exactly');
  });
});

describe('linear regression', () => {
  const rows = fc.array(fc.tuple(value, value, value), { minLength: 6, maxLength: 40 });

  it('follows a change of units', () => {
    fc.assert(
      fc.property(rows, (data) => {
        const fit = (scale: number, shift: number) =>
          linearRegression({
            outcome: data.map(([y]) => y),
            predictors: [
              { name: 'a', values: data.map(([, a]) => scale * a + shift) },
              { name: 'b', values: data.map(([, , b]) => b) },
            ],
          });
        const one = fit(1, 0);
        const other = fit(1000, 7);
        expect(other.kind).toBe(one.kind);
        if (one.kind !== 'linear-model' || other.kind !== 'linear-model') return;
        expect(1000 * (other.coefficients[1]?.estimate ?? NaN)).toBeCloseTo(one.coefficients[1]?.estimate ?? NaN, 8);
        expect(other.coefficients[2]?.standardError).toBeCloseTo(one.coefficients[2]?.standardError ?? NaN, 8);
        expect(other.rSquared).toBeCloseTo(one.rSquared, 10);
      }),
      { seed },
    );
  });

  it('is the line of a second implementation', () => {
    fc.assert(
      fc.property(rows, (data) => {
        const model = linearRegression({ outcome: data.map(([y]) => y), predictors: [{ name: 'a', values: data.map(([, a]) => a) }] });
        if (model.kind !== 'linear-model') return;
        const { m, b } = simpleRegression(data.map(([y, a]) => [a, y]));
        expect(model.coefficients[0]?.estimate).toBeCloseTo(b, 7);
        expect(model.coefficients[1]?.estimate).toBeCloseTo(m, 8);
      }),
      { seed },
    );
  });

  it('predicts the mean of the outcome at the means of the predictors', () => {
    const x = [1, 2, 4, 7, 9, 11, 12, 15, 16, 20];
    const y = [3, 1, 6, 5, 9, 8, 14, 12, 15, 21];
    const model = fitted(linearRegression({ outcome: y, predictors: [{ name: 'x', values: x }] }));
    const { mean, standardError, confidence, prediction } = predictedMean(model, [9.7]);
    expect(mean).toBeCloseTo(9.4, 12);
    expect(standardError).toBeCloseTo(model.residualSd / Math.sqrt(10), 12);
    expect(prediction.upper).toBeGreaterThan(confidence.upper);
    expect(() => predictedMean(model, [])).toThrow(RangeError);
    expect(() => predictedMean(model, [Infinity])).toThrow(RangeError);
  });

  it('withholds p below ten participants for each predictor, and says so', () => {
    const outcome = [1, 3, 2, 5, 4, 6, 8, 7, 9];
    const small = fitted(linearRegression({ outcome, predictors: [{ name: 'x', values: [1, 2, 3, 4, 5, 6, 7, 8, 9] }] }));
    expect(small.coefficients[1]).not.toHaveProperty('test');
    expect(small).not.toHaveProperty('overallTest');
    expect(small.failedAssumptions.join()).toContain('no p-values');
    const enough = fitted(
      linearRegression({ outcome: [...outcome, 9], predictors: [{ name: 'x', values: [1, 2, 3, 4, 5, 6, 7, 8, 9, 10] }] }),
    );
    expect(enough.coefficients[1]).toHaveProperty('test');
    expect(enough.failedAssumptions).toEqual([]);
  });

  it('names the predictor it cannot use', () => {
    const outcome = [1, 3, 2, 5, 4, 6, 8, 7];
    const a = [1, 2, 3, 4, 5, 6, 7, 9];
    const refused = (name: string, values: number[]) =>
      linearRegression({
        outcome,
        predictors: [
          { name: 'a', values: a },
          { name, values },
        ],
      });
    expect(refused('site', [4, 4, 4, 4, 4, 4, 4, 4])).toMatchObject({ kind: 'not-estimable', reason: 'site does not vary' });
    expect(
      refused(
        'twice a',
        a.map((x) => 2 * x + 1),
      ),
    ).toMatchObject({ reason: 'twice a is determined by the predictors before it' });
    expect(
      refused(
        'huge',
        a.map((x) => x * 1e300),
      ),
    ).toMatchObject({ reason: 'values too large to compute with' });
    expect(linearRegression({ outcome: a.map((x) => x * 1e-200), predictors: [{ name: 'a', values: a }] })).toMatchObject({
      reason: 'values too close together to compute with',
    });
    expect(linearRegression({ outcome: a.map(() => 3), predictors: [{ name: 'a', values: a }] })).toMatchObject({
      reason: 'all values equal',
    });
  });

  it('says no data, or too few, and refuses a model without predictors', () => {
    expect(linearRegression({ outcome: [], predictors: [{ name: 'a', values: [] }] })).toMatchObject({ reason: 'no data' });
    expect(linearRegression({ outcome: [1, 2], predictors: [{ name: 'a', values: [1, 2] }] })).toMatchObject({
      reason: 'too few participants for this model (n = 2, 2 coefficients)',
    });
    expect(() => linearRegression({ outcome: [1, 2], predictors: [] })).toThrow(RangeError);
    expect(linearRegression({ outcome: [1, null, 2, 4], predictors: [{ name: 'a', values: [1, 2, Number.NaN, 'unable'] }] })).toMatchObject(
      {
        kind: 'not-estimable',
        n: 1,
        leftOut: { missing: 1, nonFinite: 1, unable: 1 },
      },
    );
  });
});

describe('columns made from labels', () => {
  it('indicate each level against the first and keep gaps', () => {
    const [late] = indicatorPredictors('phase', ['early', 'late', null, ''], ['early', 'late']);
    expect(late).toEqual({ name: 'phase: late', values: [0, 1, null, null] });
    expect(() => indicatorPredictors('phase', ['other'], ['early', 'late'])).toThrow(RangeError);
  });

  it('multiply, and keep what is not usable', () => {
    const product = productPredictor({ name: 'a', values: [2, null, 3, 1] }, { name: 'b', values: [5, 1, 'unable', Number.NaN] });
    expect(product).toEqual({ name: 'a x b', values: [10, null, 'unable', Number.NaN] });
    expect(() => productPredictor({ name: 'a', values: [1] }, { name: 'b', values: [] })).toThrow(RangeError);
  });
});

describe('analysis of covariance', () => {
  const baseline = [10, 12, 9, 14, 11, 13, 8, 12, 10, 15, 9, 11, 13, 12, 14, 10, 11, 12, 13, 9, 10, 14];
  const group = baseline.map((_, i) => (i % 2 === 0 ? 'control' : 'training'));
  const followUp = baseline.map((x, i) => 2 + 0.8 * x + (i % 2 === 0 ? 0 : 3) + Math.sin(7 * i));

  it('finds for follow-up and for change the same difference of groups', () => {
    const one = ancova({ baseline, followUp, group });
    const other = ancova({ baseline, followUp: followUp.map((y, i) => y - (baseline[i] as number)), group });
    if (one.kind !== 'ancova' || other.kind !== 'ancova') throw new Error('expected models');
    expect(other.differences[0]?.estimate).toBeCloseTo(one.differences[0]?.estimate ?? NaN, 10);
    expect(other.differences[0]?.test?.p).toBeCloseTo(one.differences[0]?.test?.p ?? NaN, 10);
    expect(one.differences[0]?.name).toBe('training minus control');
    // With one pair there is nothing to adjust for.
    expect(one.differences[0]?.holmP).toBeCloseTo(one.differences[0]?.test?.p ?? NaN, 12);
    expect(one.differences[0]?.tukeyP).toBeCloseTo(one.differences[0]?.test?.p ?? NaN, 8);
  });

  it('gives means at several baselines only where slopes differ', () => {
    const parallel = ancova({ baseline, followUp, group });
    const crossing = ancova({ baseline, followUp: followUp.map((y, i) => y + (i % 2) * 3 * ((baseline[i] as number) - 11)), group });
    if (parallel.kind !== 'ancova' || crossing.kind !== 'ancova') throw new Error('expected models');
    expect(parallel).not.toHaveProperty('meansByBaseline');
    expect(crossing.meansByBaseline?.map((row) => row.baseline)).toEqual([10, 11.5, 13]);
    const [low, , high] = crossing.meansByBaseline ?? [];
    const gap = (row: typeof low) => (row?.means[1]?.mean ?? NaN) - (row?.means[0]?.mean ?? NaN);
    expect(gap(high) - gap(low)).toBeGreaterThan(6);
    expect(crossing.failedAssumptions.join()).toContain('slope on baseline differs');
  });

  it('keeps the model when a group is too small for a slope of its own', () => {
    const single = group.map((name, i) => (i === 0 ? 'alone' : name));
    const model = ancova({ baseline, followUp, group: single });
    expect(model).toMatchObject({ kind: 'ancova', slopeHomogeneity: { kind: 'not-estimable' } });
  });

  it('says why there is none', () => {
    expect(ancova({ baseline: [], followUp: [], group: [] })).toMatchObject({ reason: 'no data' });
    expect(ancova({ baseline, followUp, group: group.map(() => 'one') })).toMatchObject({ reason: 'no comparison possible' });
    expect(ancova({ baseline: baseline.map(() => 5), followUp, group })).toMatchObject({ reason: 'baseline does not vary' });
    expect(ancova({ baseline: [1, 2, 3], followUp: [2, 3, 4], group: ['a', 'b', 'a'] })).toMatchObject({ kind: 'not-estimable', n: 3 });
    expect(ancova({ baseline, followUp: baseline.map((x, i) => 2 * x + (i % 2)), group })).toMatchObject({
      reason: 'baseline and group reproduce the follow-up exactly',
    });
  });

  it('withholds p below ten participants for each coefficient', () => {
    const few = { baseline: baseline.slice(0, 12), followUp: followUp.slice(0, 12), group: group.slice(0, 12) };
    const model = ancova(few);
    if (model.kind !== 'ancova') throw new Error('expected a model');
    expect(model).not.toHaveProperty('groupTest');
    expect(model.differences[0]).not.toHaveProperty('holmP');
    expect(model.failedAssumptions.join()).toContain('no p-values');
  });
});
