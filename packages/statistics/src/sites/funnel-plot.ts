/**
 * Funnel plot: each site against the registry's value with 95% and 99.8% limits. Where at least ten sites spread more than chance
 * explains, the limits are widened by the root of the overdispersion phi = mean z^2 and the answer says so.
 *
 * A site outside the 99.8% limits "differs from the registry value more than chance explains"; it is never ranked and never called worse.
 *
 * Source: Spiegelhalter (2005) Stat Med 24:1185-1202, multiplicative overdispersion without winsorising.
 */

import { completeRows } from '../complete-rows.ts';
import type { EventCount } from '../proportions/counts.ts';
import { requireEventCount } from '../proportions/counts.ts';
import type { Interval, NotEstimable, Provenance } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons } from '../result.ts';
import type { Observation } from '../samples.ts';
import { meanFunnelLimit, proportionFunnelLimit } from './funnel-limits.ts';

export interface FunnelSite {
  readonly site: string;
  readonly n: number;
  readonly value: number;
  /** Distance from the registry's value in standard errors, before any widening. */
  readonly z: number;
  readonly limits95: Interval;
  readonly limits998: Interval;
  readonly position: 'within 95% limits' | 'between 95% and 99.8% limits' | 'outside 99.8% limits';
}

export interface FunnelPlot extends Provenance {
  readonly kind: 'funnel-plot';
  /** The registry's value. */
  readonly target: number;
  /** Mean z^2: 1 when the sites spread as chance alone would have it. */
  readonly overdispersion: number;
  readonly widened: boolean;
  readonly sites: readonly FunnelSite[];
}

/** From how many sites on overdispersion is believed. */
const sitesForOverdispersion = 10;

interface Point {
  readonly site: string;
  readonly n: number;
  readonly value: number;
  readonly z: number;
}

function funnelPlot(
  points: readonly Point[],
  target: number,
  limitAt: (n: number, p: number) => number,
  range: { readonly lowest: number; readonly highest: number },
  basis: Pick<Provenance, 'n' | 'leftOut'>,
  title: string,
): FunnelPlot {
  const overdispersion = points.reduce((sum, point) => sum + point.z ** 2, 0) / points.length;
  const widened = overdispersion > 1 && points.length >= sitesForOverdispersion;
  const factor = widened ? Math.sqrt(overdispersion) : 1;
  const limits = (n: number, level: number): Interval => {
    const at = (p: number): number => Math.min(range.highest, Math.max(range.lowest, target + (limitAt(n, p) - target) * factor));
    return { lower: at((1 - level) / 2), upper: at((1 + level) / 2), level };
  };
  const outside = (value: number, { lower, upper }: Interval): boolean => value < lower || value > upper;
  return {
    kind: 'funnel-plot',
    ...basis,
    target,
    overdispersion,
    widened,
    sites: points.map((point): FunnelSite => {
      const limits95 = limits(point.n, 0.95);
      const limits998 = limits(point.n, 0.998);
      const position = outside(point.value, limits998)
        ? 'outside 99.8% limits'
        : outside(point.value, limits95)
          ? 'between 95% and 99.8% limits'
          : 'within 95% limits';
      return { ...point, limits95, limits998, position };
    }),
    method: `${title}, 95% and 99.8%${widened ? ', widened by the root of the overdispersion' : ''}.`,
    failedAssumptions:
      overdispersion > 1 && !widened && points.length > 1
        ? [`the sites spread more than chance explains, but ${points.length} sites are too few to widen the limits`]
        : [],
  };
}

/** `target`: the registry's proportion; that of all sites together when not given. Sites without people are passed over. */
export function proportionFunnel(sites: readonly (EventCount & { readonly site: string })[], target?: number): FunnelPlot | NotEstimable {
  sites.forEach(requireEventCount);
  const filled = sites.filter((site) => site.total > 0);
  const n = filled.reduce((sum, site) => sum + site.total, 0);
  const basis = { n, leftOut: nothingLeftOut };
  if (n === 0) return notEstimable(reasons.noData, basis);
  const value = target ?? filled.reduce((sum, site) => sum + site.events, 0) / n;
  if (!(value > 0 && value < 1)) return notEstimable('the registry value is 0 or 1: no limits', basis);
  const points = filled.map(({ site, events, total }) => ({
    site,
    n: total,
    value: events / total,
    z: (events / total - value) / Math.sqrt((value * (1 - value)) / total),
  }));
  return funnelPlot(
    points,
    value,
    (size, p) => proportionFunnelLimit(value, size, p),
    { lowest: 0, highest: 1 },
    basis,
    'Funnel plot with exact binomial limits, interpolated',
  );
}

export interface SiteMean {
  readonly site: string;
  readonly mean: Observation;
  readonly n: number;
}

/** `target`: the registry's mean; `sdWithin`: standard deviation of people within sites, positive. */
export function meanFunnel(sites: readonly SiteMean[], target: number, sdWithin: number): FunnelPlot | NotEstimable {
  const { columns, labels, leftOut } = completeRows(
    [sites.map((site) => site.mean), sites.map((site) => site.n)],
    [sites.map((site) => site.site)],
  );
  const [means, sizes] = columns as [Float64Array, Float64Array];
  const { names, codes } = labels[0] as (typeof labels)[number];
  const basis = { n: sizes.reduce((sum, size) => sum + size, 0), leftOut };
  if (means.length === 0) return notEstimable(reasons.noData, basis);
  const points = Array.from(means, (mean, i) => {
    const n = sizes[i] as number;
    return { site: names[codes[i] as number] as string, n, value: mean, z: ((mean - target) * Math.sqrt(n)) / sdWithin };
  });
  const limitAt = (size: number, p: number): number => meanFunnelLimit(target, sdWithin, size, p);
  if (!points.every(({ z }) => Number.isFinite(z ** 2))) return notEstimable(reasons.tooLarge, basis);
  return funnelPlot(points, target, limitAt, { lowest: -Infinity, highest: Infinity }, basis, 'Funnel plot with normal limits');
}
