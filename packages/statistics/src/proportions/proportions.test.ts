import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { proportionChecks } from '../../reference/proportions.checks.ts';
import { clopperPearsonProportion, newcombeDifference, responderBounds, wilsonProportion } from './index.ts';

const seed = 41;
const count = fc
  .nat({ max: 400 })
  .chain((total) => fc.record({ events: fc.nat({ max: total + 1 }).map((n) => Math.min(n, total + 1)), total: fc.constant(total + 1) }));

function estimated<T extends { kind: string }>(answer: T): Extract<T, { kind: 'estimate' }> {
  if (answer.kind !== 'estimate') throw new Error('expected an estimate');
  return answer as Extract<T, { kind: 'estimate' }>;
}

describe('proportions', () => {
  it.each(proportionChecks)('agree with the published figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });

  it.each([
    ['Wilson', wilsonProportion],
    ['Clopper-Pearson', clopperPearsonProportion],
  ] as const)('%s limits hold the share, stay within 0 and 1 and mirror under the complement', (_name, method) => {
    fc.assert(
      fc.property(count, ({ events, total }) => {
        const { estimate, interval } = estimated(method(events, total));
        const complement = estimated(method(total - events, total));
        expect(interval.lower).toBeLessThanOrEqual(estimate);
        expect(interval.upper).toBeGreaterThanOrEqual(estimate);
        expect(interval.lower).toBeGreaterThanOrEqual(0);
        expect(interval.upper).toBeLessThanOrEqual(1);
        expect(complement.interval.lower).toBeCloseTo(1 - interval.upper, 10);
      }),
      { seed },
    );
  });

  it('turns the sign of a difference with the groups and stays within -1 and 1', () => {
    fc.assert(
      fc.property(count, count, (first, second) => {
        const one = estimated(newcombeDifference(first, second));
        const other = estimated(newcombeDifference(second, first));
        expect(other.interval.lower).toBeCloseTo(-one.interval.upper, 12);
        expect(one.interval.lower).toBeGreaterThanOrEqual(-1);
        expect(one.interval.upper).toBeLessThanOrEqual(1);
      }),
      { seed },
    );
  });

  it('reaches 0 and 1 exactly at no event and at all events', () => {
    for (const method of [wilsonProportion, clopperPearsonProportion]) {
      expect(estimated(method(0, 12)).interval.lower).toBe(0);
      expect(estimated(method(12, 12)).interval.upper).toBe(1);
    }
  });

  it('narrows with n and widens with the level', () => {
    const width = (n: number, level: number): number => {
      const { lower, upper } = estimated(wilsonProportion(n / 2, n, level)).interval;
      return upper - lower;
    };
    expect(width(40, 0.95)).toBeLessThan(width(20, 0.95));
    expect(width(40, 0.99)).toBeGreaterThan(width(40, 0.95));
  });

  it('holds for a registry of any size', () => {
    const { interval } = estimated(clopperPearsonProportion(1, 1e11));
    expect(interval.lower).toBeGreaterThan(0);
    expect(interval.upper).toBeLessThan(1e-10);
  });

  it('says no data, or no comparison, where there is none', () => {
    expect(wilsonProportion(0, 0)).toMatchObject({ kind: 'not-estimable', reason: 'no data', n: 0 });
    expect(clopperPearsonProportion(0, 0)).toMatchObject({ kind: 'not-estimable', reason: 'no data' });
    expect(newcombeDifference({ events: 1, total: 2 }, { events: 0, total: 0 })).toMatchObject({ reason: 'no comparison possible', n: 2 });
    expect(wilsonProportion(1, 1)).toMatchObject({ failedAssumptions: ['very small sample (n = 1)'] });
    expect(wilsonProportion(1, 5)).toMatchObject({ failedAssumptions: [] });
  });

  it.each([
    [3, 2],
    [-1, 2],
    [0.5, 2],
    [Number.NaN, 2],
    [1, Infinity],
  ])('refuses %d events of %d people', (events, total) => {
    expect(() => wilsonProportion(events, total)).toThrow(RangeError);
    expect(() => clopperPearsonProportion(events, total)).toThrow(RangeError);
    expect(() => newcombeDifference({ events, total }, { events: 1, total: 2 })).toThrow(RangeError);
  });

  it.each([0, 1, -0.5, Number.NaN])('refuses the level %d', (level) => {
    expect(() => wilsonProportion(1, 2, level)).toThrow(RangeError);
    expect(() => wilsonProportion(1, 2, 0.9)).not.toThrow();
  });
});

describe('the bounds of a proportion with results missing', () => {
  it('hold the share of those who have a result, and meet it when nothing is missing', () => {
    fc.assert(
      fc.property(count, fc.nat({ max: 300 }), ({ events, total }, missing) => {
        const bounds = responderBounds({ events, total }, missing);
        if (bounds.kind !== 'bounds') throw new Error(bounds.reason);
        expect(bounds.lowest).toBeLessThanOrEqual(events / total);
        expect(bounds.highest).toBeGreaterThanOrEqual(events / total);
        expect(bounds.highest - bounds.lowest).toBeCloseTo(missing / (total + missing), 12);
        // The complement turns them round.
        expect(responderBounds({ events: total - events, total }, missing)).toMatchObject({
          lowest: expect.closeTo(1 - bounds.highest, 12),
        });
      }),
      { seed },
    );
  });

  it('mark a loss of more than a fifth', () => {
    expect(responderBounds({ events: 12, total: 40 }, 10)).toMatchObject({ lowest: 0.24, highest: 0.44, failedAssumptions: [] });
    expect(responderBounds({ events: 12, total: 40 }, 11)).toMatchObject({ failedAssumptions: ['11 of 51 people have no result'] });
    expect(responderBounds({ events: 0, total: 0 }, 3)).toMatchObject({ n: 0, lowest: 0, highest: 1 });
  });

  it('say no data for nobody, and refuse counts that are none', () => {
    expect(responderBounds({ events: 0, total: 0 }, 0)).toMatchObject({ kind: 'not-estimable', reason: 'no data' });
    expect(() => responderBounds({ events: 1, total: 2 }, -1)).toThrow(RangeError);
    expect(() => responderBounds({ events: 1, total: 2 }, 0.5)).toThrow(RangeError);
  });
});
