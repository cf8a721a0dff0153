/** Sites pooled and compared, and agreement of raters, against R. */

import {
  intraclassCorrelation,
  meanFunnel,
  proportionFunnel,
  proportionFunnelLimit,
  randomEffectsPooling,
  raterAgreement,
} from '../src/index.ts';
import type { FunnelPlot } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import { limits, membersOf } from './figures.ts';
import fixture from './sites.json' with { type: 'json' };

const { funnelLimits, funnelPlot, intraclass, raters, meanFunnel: means, widenedFunnel } = fixture;

const poolingChecks = fixture.pooling.map((one): ReferenceCheck => {
  const sites = one.site.map((site, i) => ({ site, estimate: one.estimate[i], standardError: Math.sqrt(one.variance[i] as number) }));
  return {
    ...one,
    method: 'site-pooling',
    compute: () =>
      membersOf(randomEffectsPooling(sites), (pooled) => ({
        ...pooled,
        limits: limits(pooled.interval),
        p: pooled.test.p,
        predictionLimits: limits(pooled.predictionInterval),
        weightsPercent: pooled.sites.map((site) => site.weight * 100),
        shrunken: pooled.sites.map((site) => site.shrunken),
      })),
  };
});

const funnelMembers = (plot: FunnelPlot) => ({
  ...plot,
  value: plot.sites.map((site) => site.value),
  z: plot.sites.map((site) => site.z),
  limits95: plot.sites.map((site) => limits(site.limits95)),
  limits998: plot.sites.map((site) => limits(site.limits998)),
});

export const siteChecks: readonly ReferenceCheck[] = [
  ...poolingChecks,
  {
    ...funnelLimits,
    id: 'limits by size of site',
    method: 'funnel',
    compute: () => funnelLimits.n.map((n) => funnelLimits.probabilities.map((p) => proportionFunnelLimit(funnelLimits.target, n, p))),
  },
  {
    ...funnelPlot,
    id: 'UCBAdmissions',
    method: 'funnel',
    compute: () =>
      membersOf(
        proportionFunnel(
          funnelPlot.site.map((site, i) => ({ site, events: funnelPlot.events[i] as number, total: funnelPlot.totals[i] as number })),
        ),
        funnelMembers,
      ),
  },
  {
    ...widenedFunnel,
    id: 'widened limits of proportions',
    method: 'funnel',
    compute: () =>
      membersOf(
        proportionFunnel(
          widenedFunnel.events.map((events, i) => ({ site: `site ${i}`, events, total: widenedFunnel.totals[i] as number })),
        ),
        funnelMembers,
      ),
  },
  {
    ...means,
    id: 'widened limits of means',
    method: 'funnel',
    compute: () =>
      membersOf(
        meanFunnel(
          means.mean.map((mean, i) => ({ site: `site ${i}`, mean, n: means.n[i] as number })),
          means.target,
          means.sdWithin,
        ),
        funnelMembers,
      ),
  },
  {
    ...intraclass,
    id: 'chickwts',
    method: 'intraclass-correlation',
    compute: () => intraclassCorrelation(intraclass.values, intraclass.site),
  },
  {
    ...raters,
    id: 'Shrout and Fleiss',
    method: 'rater-agreement',
    compute: () =>
      membersOf(raterAgreement(raters.ratings), ({ forms }) => ({
        form: forms.map((row) => row.form),
        correlation: forms.map((row) => row.correlation),
        lower: forms.map((row) => row.interval.lower),
        upper: forms.map((row) => row.interval.upper),
        statistic: forms.map((row) => row.test.statistic),
      })),
  },
];
