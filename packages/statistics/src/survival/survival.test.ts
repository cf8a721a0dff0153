import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { survivalChecks } from '../../reference/survival.checks.ts';
import { coxRegression, kaplanMeier, logRankTest, survivalAt, survivalQuantile } from './index.ts';

const seed = 48;
const watched = fc.array(
  fc.record({ time: fc.integer({ min: 0, max: 60 }), event: fc.constantFrom(0, 1), group: fc.constantFrom('a', 'b', 'c') }),
  {
    minLength: 1,
    maxLength: 50,
  },
);
const columns = (rows: readonly { time: number; event: number; group: string }[]) => ({
  time: rows.map((row) => row.time),
  event: rows.map((row) => row.event),
  group: rows.map((row) => row.group),
});

describe('survival', () => {
  it.each(survivalChecks)('agrees with the published figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });
});

describe('Kaplan-Meier curve', () => {
  it('only falls, within its limits, and counts everybody once', () => {
    fc.assert(
      fc.property(watched, (rows) => {
        const curve = kaplanMeier(columns(rows));
        if (curve.kind !== 'survival-curve') throw new Error(curve.reason);
        let before = 1;
        for (const step of curve.steps) {
          expect(step.survival).toBeLessThanOrEqual(before);
          before = step.survival;
          if (step.interval === undefined) {
            expect(step.survival).toBe(0);
            continue;
          }
          expect(step.interval.lower).toBeLessThanOrEqual(step.survival + 1e-12);
          expect(step.interval.upper).toBeGreaterThanOrEqual(step.survival - 1e-12);
        }
        expect(curve.steps.reduce((sum, step) => sum + step.events + step.censored, 0)).toBe(curve.n);
      }),
      { seed },
    );
  });

  it('is the share still without the event when all are watched to the end', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 1, max: 20 }), { minLength: 1, maxLength: 30 }),
        fc.integer({ min: 0, max: 21 }),
        (time, at) => {
          const curve = kaplanMeier({ time, event: time.map(() => 1) });
          if (curve.kind !== 'survival-curve') throw new Error(curve.reason);
          expect(survivalAt(curve, at).survival).toBeCloseTo(time.filter((value) => value > at).length / time.length, 12);
          expect(survivalAt(curve, at).atRisk).toBe(time.filter((value) => value >= at).length);
        },
      ),
      { seed },
    );
  });

  it('puts the median in the middle of a stretch at exactly one half', () => {
    const curve = kaplanMeier({ time: [2, 4, 7, 9], event: [1, 1, 1, 1] });
    if (curve.kind !== 'survival-curve') throw new Error(curve.reason);
    expect(curve.median).toMatchObject({ time: 5.5 });
    expect(survivalQuantile(curve, 0.25)).toMatchObject({ time: 3 });
    expect(survivalQuantile(curve, 0.3)).toMatchObject({ time: 4 });
  });

  it('says that the median is not reached, and when nobody had the event', () => {
    expect(kaplanMeier({ time: [3, 5, 6, 8], event: [1, 0, 0, 0] })).toMatchObject({
      median: { kind: 'not-estimable', reason: 'not reached' },
    });
    const quiet = kaplanMeier({ time: [3, 5], event: [0, 0] });
    expect(quiet).toMatchObject({ events: 0, steps: [{ survival: 1, interval: { lower: 1, upper: 1 } }, { survival: 1 }] });
  });

  it('takes events before the ends of watching at the same time', () => {
    expect(kaplanMeier({ time: [5, 5], event: [0, 1] })).toMatchObject({ steps: [{ atRisk: 2, events: 1, censored: 1, survival: 0.5 }] });
  });

  it('says no data and refuses what is no follow-up', () => {
    expect(kaplanMeier({ time: [], event: [] })).toMatchObject({ kind: 'not-estimable', reason: 'no data' });
    expect(kaplanMeier({ time: [null, 4], event: [1, null] })).toMatchObject({ n: 0, leftOut: { missing: 2 } });
    expect(() => kaplanMeier({ time: [-1], event: [1] })).toThrow(RangeError);
    expect(() => kaplanMeier({ time: [1], event: [2] })).toThrow(RangeError);
    const curve = kaplanMeier({ time: [1, 2], event: [1, 0] });
    if (curve.kind !== 'survival-curve') throw new Error(curve.reason);
    expect(() => survivalAt(curve, -1)).toThrow(RangeError);
    expect(() => survivalQuantile(curve, 1)).toThrow(RangeError);
    expect(survivalAt(curve, 0)).toMatchObject({ survival: 1, atRisk: 2, standardError: 0 });
  });
});

describe('log-rank test', () => {
  it('expects as many events as there were, and depends only on the order of times', () => {
    fc.assert(
      fc.property(watched, (rows) => {
        const data = columns(rows);
        const test = logRankTest(data);
        const stretched = logRankTest({ ...data, time: data.time.map((time) => time ** 2 / 7) });
        expect(stretched.kind).toBe(test.kind);
        if (test.kind !== 'test' || stretched.kind !== 'test') return;
        expect(stretched.statistic).toBeCloseTo(test.statistic, 8);
        const sum = (key: 'observed' | 'expected') => test.groups.reduce((total, group) => total + group[key], 0);
        expect(sum('expected')).toBeCloseTo(sum('observed'), 8);
        expect(test.p).toBeGreaterThan(0);
        expect(test.p).toBeLessThanOrEqual(1);
      }),
      { seed },
    );
  });

  it('is the score test of Cox regression when no two events share a time', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.constantFrom(0, 1), fc.constantFrom(0, 1)), { minLength: 6, maxLength: 40 }), (rows) => {
        const time = rows.map((_, i) => i + 1);
        const event = rows.map(([event]) => event);
        const group = rows.map(([, group]) => group);
        const test = logRankTest({ time, event, group });
        const cox = coxRegression({ time, event, predictors: [{ name: 'group', values: group }] });
        if (test.kind !== 'test' || cox.kind !== 'cox-model') return;
        expect(cox.scoreTest.statistic).toBeCloseTo(test.statistic, 8);
      }),
      { seed },
    );
  });

  it('passes over a group that is never at risk beside others when an event comes', () => {
    const test = logRankTest({ time: [1, 5, 6, 7, 8, 9], event: [0, 1, 1, 0, 1, 1], group: ['left early', 'a', 'b', 'a', 'b', 'a'] });
    expect(test).toMatchObject({ kind: 'test', df: [1] });
  });

  it('finds nothing to compare without events, or in one group', () => {
    expect(logRankTest({ time: [], event: [], group: [] })).toMatchObject({ reason: 'no data' });
    expect(logRankTest({ time: [1, 2], event: [1, 1], group: ['a', 'a'] })).toMatchObject({ reason: 'no comparison possible' });
    expect(logRankTest({ time: [1, 2], event: [0, 0], group: ['a', 'b'] })).toMatchObject({ kind: 'not-estimable', n: 2 });
    expect(logRankTest({ time: [1, 2], event: [0, 1], group: ['a', 'b'] })).toMatchObject({ kind: 'not-estimable', n: 2 });
  });
});

describe('Cox regression', () => {
  const time = [5, 8, 12, 3, 9, 14, 7, 2, 11, 6, 10, 4];
  const event = [1, 1, 0, 1, 1, 1, 0, 1, 1, 1, 0, 1];
  const dose = [2, 3, 5, 1, 2, 4, 3, 2, 6, 1, 4, 3];

  it('follows the units of the covariate', () => {
    const one = coxRegression({ time, event, predictors: [{ name: 'dose', values: dose }] });
    const other = coxRegression({ time, event, predictors: [{ name: 'dose', values: dose.map((value) => 1000 * value + 5) }] });
    if (one.kind !== 'cox-model' || other.kind !== 'cox-model') throw new Error('expected models');
    expect((other.coefficients[0]?.estimate ?? NaN) * 1000).toBeCloseTo(one.coefficients[0]?.estimate ?? NaN, 8);
    expect(other.logLikelihood).toBeCloseTo(one.logLikelihood, 8);
    expect(one.failedAssumptions.join()).toContain('fewer than 10 events');
  });

  it('reports a covariate that orders the events without exception', () => {
    const ordered = coxRegression({
      time,
      event: event.map(() => 1),
      predictors: [{ name: 'speed', values: time.map((value) => -value) }],
    });
    expect(ordered).toMatchObject({ kind: 'not-estimable', n: 12 });
    const onlyInOne = coxRegression({
      time,
      event: dose.map((value) => (value > 3 ? 1 : 0)),
      predictors: [{ name: 'high', values: dose.map((value) => (value > 3 ? 1 : 0)) }],
    });
    expect(onlyInOne).toMatchObject({ kind: 'not-estimable' });
  });

  it('says why there is none', () => {
    const values = dose;
    expect(coxRegression({ time: [], event: [], predictors: [{ name: 'dose', values: [] }] })).toMatchObject({ reason: 'no data' });
    expect(coxRegression({ time, event: event.map(() => 0), predictors: [{ name: 'dose', values }] })).toMatchObject({
      reason: 'no event was seen',
    });
    expect(coxRegression({ time, event, predictors: [{ name: 'site', values: dose.map(() => 1) }] })).toMatchObject({
      reason: 'site does not vary',
    });
    expect(
      coxRegression({
        time,
        event,
        predictors: [
          { name: 'dose', values },
          { name: 'twice', values: dose.map((value) => 2 * value) },
        ],
      }),
    ).toMatchObject({ kind: 'not-estimable' });
    expect(() => coxRegression({ time, event, predictors: [] })).toThrow(RangeError);
  });
});
