/** Description and quantiles against R, and against the certified values of NIST. */

import { describe, quantile } from '../src/index.ts';
import type { Description } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import fixture from './description.json' with { type: 'json' };
import { casesOf } from './fixture.ts';
import nist from './nist-univariate.json' with { type: 'json' };

const quantiles = (values: readonly number[], probabilities: readonly number[]): number[] =>
  probabilities.map((p) => quantile(Float64Array.from(values), p));

/** Members named as the fixtures name them; a figure that is not there stays out. */
function members(values: readonly number[]): Record<string, unknown> {
  const of = describe(values);
  if (of.kind === 'not-estimable') return {};
  return {
    n: of.n,
    mean: of.mean,
    median: of.median,
    min: of.least,
    max: of.greatest,
    ...spread(of),
    ...(of.quartiles.kind === 'figure' ? { quartiles: [of.quartiles.value.lower, of.quartiles.value.upper] } : {}),
    ...(of.skewness.kind === 'figure' ? { skewness: of.skewness.value } : {}),
  };
}

const spread = ({ sd }: Description): Record<string, number> => (sd.kind === 'figure' ? { sd: sd.value, variance: sd.value ** 2 } : {});

export const descriptionChecks: readonly ReferenceCheck[] = [
  ...casesOf(fixture, 'describe.').map((one): ReferenceCheck => {
    const { n, mean, variance, sd, min, max, median, quantile_type7: type7, skewness } = one.expected;
    return {
      id: one.id,
      method: 'description',
      source: `R 4.2.2, mean, sd, median, quantile and skewness of e1071 1.7-13; ${one.dataset}`,
      compute: () => ({ ...members(one.inputs.x), type7: quantiles(one.inputs.x, one.inputs.probs) }),
      expected: { n, mean, variance, sd, min, max, median, type7, quartiles: [type7[3], type7[5]], skewness: skewness.G1_type2 },
      tolerance: one.tolerance,
    };
  }),
  ...casesOf(fixture, 'quantile.').map((one): ReferenceCheck => ({
    id: one.id,
    method: 'quantile-type-7',
    source: `R 4.2.2, quantile(type = 7); ${one.dataset}`,
    compute: () => quantiles(one.inputs.x, one.inputs.probs),
    expected: one.expected.type7,
    tolerance: one.tolerance,
  })),
  ...nist.sets.map((set): ReferenceCheck => ({
    id: `NIST ${set.name}`,
    method: 'description',
    source: `NIST StRD univariate; ${set.name}`,
    compute: () => members(set.y),
    expected: set.certified,
    tolerance: { fields: { mean: { rel: 10 ** -set.digits.mean }, sd: { rel: 10 ** -set.digits.sd } } },
  })),
];
