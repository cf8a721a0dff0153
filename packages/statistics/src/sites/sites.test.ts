import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { agreement } from '../../reference/agreement.ts';
import { siteChecks } from '../../reference/sites.checks.ts';
import type { SiteEstimate } from './index.ts';
import {
  intraclassCorrelation,
  meanFunnel,
  meanFunnelLimit,
  proportionFunnel,
  proportionFunnelLimit,
  randomEffectsPooling,
  raterAgreement,
} from './index.ts';

const seed = 49;

describe('sites', () => {
  it.each(siteChecks)('agree with the published figures of $id', (check) => {
    expect(agreement(check).disagreements).toEqual([]);
  });
});

describe('pooling', () => {
  const estimates = fc.array(fc.record({ estimate: fc.integer({ min: -50, max: 50 }), standardError: fc.integer({ min: 1, max: 20 }) }), {
    minLength: 3,
    maxLength: 12,
  });
  const named = (rows: readonly { estimate: number; standardError: number }[]): SiteEstimate[] =>
    rows.map((row, i) => ({ site: `S${i}`, ...row }));

  it('follows a change of units, and weights add up to one', () => {
    fc.assert(
      fc.property(estimates, (rows) => {
        const one = randomEffectsPooling(named(rows));
        const other = randomEffectsPooling(
          named(rows.map(({ estimate, standardError }) => ({ estimate: 3 * estimate + 7, standardError: 3 * standardError }))),
        );
        expect(other.kind).toBe(one.kind);
        if (one.kind !== 'estimate' || other.kind !== 'estimate') return;
        expect(other.estimate).toBeCloseTo(3 * one.estimate + 7, 8);
        expect(other.varianceBetween).toBeCloseTo(9 * one.varianceBetween, 6);
        expect(other.inconsistency).toBeCloseTo(one.inconsistency, 10);
        expect(one.sites.reduce((sum, site) => sum + site.weight, 0)).toBeCloseTo(1, 12);
        expect(one.predictionInterval.upper).toBeGreaterThanOrEqual(one.estimate);
      }),
      { seed },
    );
  });

  it('draws every site towards the pooled value and none beyond', () => {
    fc.assert(
      fc.property(estimates, (rows) => {
        const pooled = randomEffectsPooling(named(rows));
        if (pooled.kind !== 'estimate') return;
        pooled.sites.forEach((site, i) => {
          const own = rows[i]?.estimate ?? NaN;
          expect(Math.abs(site.shrunken - pooled.estimate)).toBeLessThanOrEqual(Math.abs(own - pooled.estimate) + 1e-9);
          expect((site.shrunken - pooled.estimate) * (own - pooled.estimate)).toBeGreaterThanOrEqual(-1e-9);
        });
      }),
      { seed },
    );
  });

  it('leaves out a site without weight and says so', () => {
    const sites: SiteEstimate[] = [
      { site: 'a', estimate: 1, standardError: 0.5 },
      { site: 'b', estimate: 2, standardError: 0.4 },
      { site: 'c', estimate: 4, standardError: 0.6 },
      { site: 'd', estimate: 9, standardError: 0 },
      { site: 'e', estimate: null, standardError: 1 },
    ];
    const pooled = randomEffectsPooling(sites);
    expect(pooled).toMatchObject({ kind: 'estimate', n: 3, leftOut: { missing: 1 } });
    if (pooled.kind === 'estimate') expect(pooled.failedAssumptions).toContain('1 site without a positive standard error left out');
    expect(randomEffectsPooling(sites.slice(1))).toMatchObject({
      kind: 'not-estimable',
      reason: 'fewer than 3 sites: no pooling statistics',
      n: 2,
    });
    expect(randomEffectsPooling([])).toMatchObject({ kind: 'not-estimable', n: 0 });
  });

  it('gives no interval from sites that all say the same, and none from weights beyond numbers', () => {
    const same = ['a', 'b', 'c'].map((site) => ({ site, estimate: 2, standardError: 1 }));
    expect(randomEffectsPooling(same)).toMatchObject({ kind: 'not-estimable', pointEstimate: 2 });
    const tiny = ['a', 'b', 'c'].map((site, i) => ({ site, estimate: i, standardError: 1e-160 }));
    expect(randomEffectsPooling(tiny)).toMatchObject({ kind: 'not-estimable' });
    expect(() => randomEffectsPooling([...same, ...same])).toThrow(RangeError);
  });
});

describe('intraclass correlation and agreement of raters', () => {
  const ratings = fc
    .integer({ min: 2, max: 4 })
    .chain((raters) => fc.array(fc.array(fc.nat({ max: 9 }), { minLength: raters, maxLength: raters }), { minLength: 5, maxLength: 12 }));

  it('are the same figure for participants as sites of one size', () => {
    fc.assert(
      fc.property(ratings, (rows) => {
        const agreementOfRaters = raterAgreement(rows);
        const icc = intraclassCorrelation(
          rows.flat(),
          rows.flatMap((row, i) => row.map(() => i)),
        );
        if (agreementOfRaters.kind !== 'rater-agreement' || icc.kind !== 'intraclass-correlation') return;
        const oneWay = agreementOfRaters.forms[0]?.correlation ?? NaN;
        expect(icc.correlation).toBeCloseTo(Math.max(0, oneWay), 10);
        expect(icc.test.p).toBeCloseTo(agreementOfRaters.forms[0]?.test.p ?? NaN, 10);
      }),
      { seed },
    );
  });

  it('lie within their limits', () => {
    fc.assert(
      fc.property(ratings, (rows) => {
        const found = raterAgreement(rows);
        if (found.kind !== 'rater-agreement') return;
        for (const form of found.forms) {
          expect(form.interval.lower).toBeLessThanOrEqual(form.correlation + 1e-12);
          expect(form.interval.upper).toBeGreaterThanOrEqual(form.correlation - 1e-12);
        }
      }),
      { seed },
    );
  });

  it('leave out incomplete participants', () => {
    const rows = [
      [1, 2],
      [4, 4],
      [null, 3],
      [7, 6],
      [2, 2],
      [9, 8],
    ];
    expect(raterAgreement(rows)).toMatchObject({ kind: 'rater-agreement', n: 5, leftOut: { missing: 1 }, raters: 2 });
  });

  it('say why there are none', () => {
    expect(raterAgreement([])).toMatchObject({ reason: 'no data' });
    expect(
      raterAgreement([
        [1, 2],
        [3, 4],
      ]),
    ).toMatchObject({ kind: 'not-estimable', n: 2 });
    expect(raterAgreement([[1], [2], [3], [4], [5]])).toMatchObject({ kind: 'not-estimable' });
    const equal = [1, 2, 3, 4, 5].map((value) => [value, value]);
    const crossed = [
      [9, 0],
      [0, 9],
      [9, 0],
      [0, 9],
      [5, 4],
    ];
    expect(raterAgreement(crossed)).toMatchObject({ kind: 'not-estimable' });
    expect(raterAgreement(equal)).toMatchObject({
      kind: 'not-estimable',
      reason: 'the raters agree exactly: no interval',
      pointEstimate: 1,
    });
    expect(raterAgreement([1, 2, 3, 4, 5].map((value) => [value, value + 1]))).toMatchObject({
      reason: 'the raters agree exactly: no interval',
    });
    expect(raterAgreement([1, 2, 3, 4, 5].map(() => [1, 2]))).toMatchObject({ kind: 'not-estimable' });
    expect(raterAgreement([1, 2, 3, 4, 5].map(() => [3, 3]))).toMatchObject({ reason: 'all values equal' });
    expect(() => raterAgreement([[1, 2], [3]])).toThrow(RangeError);

    const site = ['a', 'a', 'b', 'b', 'c', 'c', 'd', 'd', 'e', 'e'];
    expect(intraclassCorrelation([], [])).toMatchObject({ reason: 'no data' });
    expect(intraclassCorrelation([1, 2, 3, 4], ['a', 'a', 'b', 'b'])).toMatchObject({
      reason: '2 sites: an intraclass correlation needs at least 5',
    });
    expect(
      intraclassCorrelation(
        site.map((_, i) => i),
        site.map((_, i) => i),
      ),
    ).toMatchObject({ reason: 'no site has more than one person' });
    expect(
      intraclassCorrelation(
        site.map(() => 1),
        site,
      ),
    ).toMatchObject({ reason: 'all values equal' });
    expect(intraclassCorrelation([1, 1, 2, 2, 3, 3, 4, 4, 5, 5], site)).toMatchObject({
      reason: 'all people of a site have the same value',
    });
    expect(intraclassCorrelation([1, 9, 2, 8, 3, 7, 4, 6, 5, 5], site)).toMatchObject({
      correlation: 0,
      failedAssumptions: ['no variation between sites detected'],
    });
  });
});

describe('funnel plot', () => {
  it('has limits in order, closing in on the target, within 0 and 1', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2000 }), fc.double({ min: 0.02, max: 0.98, noNaN: true }), (n, target) => {
        const limits = [0.001, 0.025, 0.975, 0.999].map((p) => proportionFunnelLimit(target, n, p));
        expect(limits).toEqual(limits.toSorted((a, b) => a - b));
        expect(Math.min(...limits)).toBeGreaterThanOrEqual(0);
        expect(Math.max(...limits)).toBeLessThanOrEqual(1);
        expect(proportionFunnelLimit(target, 100 * n, 0.999)).toBeLessThanOrEqual((limits[3] as number) + 1e-9);
      }),
      { seed },
    );
  });

  const alike = Array.from({ length: 12 }, (_, i) => ({ site: `S${i}`, events: 8 + (i % 3), total: 24 }));
  const unlike = Array.from({ length: 12 }, (_, i) => ({ site: `S${i}`, events: i % 2 === 0 ? 39 : 61, total: 100 }));

  it('leaves the limits alone where sites spread no more than chance, and widens them from ten sites on where they do', () => {
    expect(proportionFunnel(alike)).toMatchObject({ widened: false, failedAssumptions: [] });
    const wide = proportionFunnel(unlike);
    const few = proportionFunnel(unlike.slice(0, 6));
    if (wide.kind !== 'funnel-plot' || few.kind !== 'funnel-plot') throw new Error('expected plots');
    expect(wide.overdispersion).toBeCloseTo(4.84, 8);
    expect(wide.widened).toBe(true);
    expect(few.widened).toBe(false);
    expect(few.failedAssumptions.join()).toContain('too few');
    const width = (plot: typeof wide): number => (plot.sites[0]?.limits95.upper ?? NaN) - 0.5;
    expect(width(wide)).toBeCloseTo(2.2 * width(few), 10);
    expect(wide.sites[0]?.position).toBe('within 95% limits');
    expect(few.sites[0]?.position).toBe('between 95% and 99.8% limits');
  });

  it('says where a site lies without ranking it', () => {
    const plot = proportionFunnel([...alike, { site: 'far', events: 200, total: 200 }], 0.36);
    if (plot.kind !== 'funnel-plot') throw new Error(plot.reason);
    expect(plot.sites.map((site) => site.site)).toEqual([...alike.map((site) => site.site), 'far']);
    expect(plot.target).toBe(0.36);
  });

  it('places means by their standard error', () => {
    const plot = meanFunnel(
      [
        { site: 'a', mean: 10, n: 25 },
        { site: 'b', mean: 13, n: 25 },
        { site: 'c', mean: null, n: 4 },
      ],
      10,
      5,
    );
    expect(plot).toMatchObject({
      n: 50,
      leftOut: { missing: 1 },
      sites: [
        { z: 0, position: 'within 95% limits' },
        { z: 3, position: 'between 95% and 99.8% limits' },
      ],
    });
    expect(meanFunnelLimit(10, 5, 25, 0.975)).toBeCloseTo(10 + 1.959963984540054, 10);
    expect(meanFunnel([{ site: 'a', mean: 1e200, n: 9 }], 10, 5)).toMatchObject({ reason: 'values too large to compute with' });
    expect(meanFunnel([], 10, 5)).toMatchObject({ reason: 'no data' });
  });

  it('says why there is none and refuses what is no funnel', () => {
    expect(proportionFunnel([])).toMatchObject({ reason: 'no data' });
    expect(proportionFunnel([{ site: 'a', events: 0, total: 5 }])).toMatchObject({ reason: 'the registry value is 0 or 1: no limits' });
    expect(() => proportionFunnelLimit(1, 5, 0.5)).toThrow(RangeError);
    expect(() => proportionFunnelLimit(0.5, 0, 0.5)).toThrow(RangeError);
    expect(() => meanFunnelLimit(1, 0, 5, 0.5)).toThrow(RangeError);
    expect(() => meanFunnelLimit(1, 2, 5, 0)).toThrow(RangeError);
    expect(() => meanFunnelLimit(1, 2, 5.5, 0.5)).toThrow(RangeError);
  });
});
