/** Survival curves, the log-rank test and Cox regression against R, Cox regression also against statsmodels. */

import type { CoxModel } from '../src/index.ts';
import { coxRegression, indicatorPredictors, kaplanMeier, logRankTest, survivalAt, survivalQuantile } from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import coxFixture from './cox-covariates.json' with { type: 'json' };
import { membersOf } from './figures.ts';
import fixture from './survival.json' with { type: 'json' };

/** R writes null where a figure does not exist. */
const orNull = (value: number | undefined): number | null => value ?? null;

const curveChecks = fixture.curves.map((one): ReferenceCheck => ({
  ...one,
  method: 'kaplan-meier',
  compute: () =>
    membersOf(kaplanMeier(one), (curve) => {
      const at = one.expected.at.time.map((time) => survivalAt(curve, time));
      const quantiles = one.expected.quantiles.p.map((p) => survivalQuantile(curve, p));
      const events = curve.steps.filter((step) => step.events > 0);
      const member = (key: 'time' | 'lower' | 'upper') =>
        quantiles.map((quantile) => ('kind' in quantile ? quantile.reason : orNull(quantile[key])));
      return {
        ...curve,
        at: {
          time: at.map((row) => row.time),
          atRisk: at.map((row) => row.atRisk),
          survival: at.map((row) => row.survival),
          standardError: at.map((row) => orNull(row.standardError)),
          lower: at.map((row) => orNull(row.interval?.lower)),
          upper: at.map((row) => orNull(row.interval?.upper)),
        },
        quantiles: { p: one.expected.quantiles.p, time: member('time'), lower: member('lower'), upper: member('upper') },
        eventTimes: events.map((step) => step.time),
        afterEvent: events.map((step) => step.survival),
      };
    }),
}));

const coxMembers = (model: CoxModel) => ({
  ...model,
  coefficients: model.coefficients.map((row) => row.estimate),
  standardErrors: model.coefficients.map((row) => row.standardError),
  hazardRatio: model.coefficients.map((row) => row.hazardRatio),
  scoreStatistic: model.scoreTest.statistic,
});

const groupChecks = fixture.groups.flatMap((one): ReferenceCheck[] => {
  const { id, source, tolerance } = one;
  return [
    {
      id: `log-rank ${id}`,
      source,
      tolerance,
      method: 'log-rank',
      expected: one.logRank,
      compute: () =>
        membersOf(logRankTest(one), (test) => ({
          ...test,
          groups: test.groups.map((row) => row.group),
          n: test.groups.map((row) => row.n),
          observed: test.groups.map((row) => row.observed),
          expected: test.groups.map((row) => row.expected),
        })),
    },
    {
      id: `Cox ${id}`,
      source,
      tolerance,
      method: 'cox',
      expected: one.cox,
      compute: () =>
        membersOf(coxRegression({ ...one, predictors: indicatorPredictors('group', one.group, one.logRank.groups) }), coxMembers),
    },
  ];
});

/** Covariates that are numbers, on the data of a case above. */
const covariateChecks = coxFixture.models.map((one): ReferenceCheck => {
  const data = fixture.groups.find(({ id }) => id === one.data);
  const predictors = Object.entries(one.predictors).map(([name, values]) => ({ name, values }));
  return {
    ...one,
    id: `Cox ${one.id}`,
    method: 'cox',
    compute: () => data && membersOf(coxRegression({ time: data.time, event: data.event, predictors }), coxMembers),
  };
});

export const survivalChecks: readonly ReferenceCheck[] = [...curveChecks, ...groupChecks, ...covariateChecks];
