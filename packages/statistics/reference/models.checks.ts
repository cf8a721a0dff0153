/** Regression, analysis of covariance, logistic regression and the random intercept model against R. */

import type { Predictor } from '../src/index.ts';
import {
  ancova,
  indicatorPredictors,
  linearRegression,
  logisticRegression,
  predictedMean,
  productPredictor,
  randomInterceptModel,
  randomSlopeModel,
} from '../src/index.ts';
import type { ReferenceCheck } from './agreement.ts';
import ancovaFixture from './ancova.json' with { type: 'json' };
import { coefficientColumns, figures, membersOf } from './figures.ts';
import linearFixture from './linear-regression.json' with { type: 'json' };
import logisticFixture from './logistic-regression.json' with { type: 'json' };
import mixedFixture from './random-intercept.json' with { type: 'json' };
import slopeFixture from './random-slope.json' with { type: 'json' };

const namedColumns = (columns: object): Predictor[] =>
  Object.entries(columns).map(([name, values]) => ({ name, values: values as number[] }));

const linearChecks = linearFixture.regressions.map((one): ReferenceCheck => {
  const { id, source, outcome, predictors, predictions, tolerance } = one;
  return {
    id,
    source,
    tolerance,
    method: 'linear-regression',
    expected: { ...one.expected, ...(predictions ? { predictions } : {}) },
    compute: () =>
      membersOf(linearRegression({ outcome, predictors: namedColumns(predictors) }), (model) => {
        const predicted = predictions?.at.map((value) => predictedMean(model, [value]));
        return {
          ...model,
          ...coefficientColumns(model.coefficients),
          overall: model.overallTest,
          predictions: {
            at: predictions?.at,
            mean: predicted?.map((row) => row.mean),
            standardError: predicted?.map((row) => row.standardError),
            confidenceLower: predicted?.map((row) => row.confidence.lower),
            confidenceUpper: predicted?.map((row) => row.confidence.upper),
            predictionLower: predicted?.map((row) => row.prediction.lower),
            predictionUpper: predicted?.map((row) => row.prediction.upper),
          },
        };
      }),
  };
});

const ancovaChecks = ancovaFixture.cases.map((one): ReferenceCheck => ({
  ...one,
  method: 'ancova',
  compute: () =>
    membersOf(ancova(one), (model) => ({
      ...model,
      ...coefficientColumns(model.coefficients),
      groups: model.adjustedMeans.map((row) => row.group),
      groupTest: model.groupTest,
      slopeHomogeneity: membersOf(model.slopeHomogeneity, figures),
      adjusted: {
        mean: model.adjustedMeans.map((row) => row.mean),
        standardError: model.adjustedMeans.map((row) => row.standardError),
        lower: model.adjustedMeans.map((row) => row.interval.lower),
        upper: model.adjustedMeans.map((row) => row.interval.upper),
        change: model.adjustedMeans.map((row) => row.change),
      },
      differences: {
        estimate: model.differences.map((row) => row.estimate),
        standardError: model.differences.map((row) => row.standardError),
        t: model.differences.map((row) => row.test?.statistic),
        lower: model.differences.map((row) => row.interval.lower),
        upper: model.differences.map((row) => row.interval.upper),
        p: model.differences.map((row) => row.test?.p),
        holmP: model.differences.map((row) => row.holmP),
        tukeyP: model.differences.map((row) => row.tukeyP),
      },
    })),
}));

const births = logisticFixture.data;
const logisticChecks = logisticFixture.cases.map((one): ReferenceCheck => ({
  ...one,
  source: `${logisticFixture.source}; ${births.name}`,
  method: 'logistic-regression',
  compute: () => {
    const predictors = one.predictors.map((name) => ({ name, values: births[name as keyof typeof births] as number[] }));
    return membersOf(logisticRegression({ outcome: births.low, predictors }), (model) => {
      const { t: z, ...columns } = coefficientColumns(model.coefficients);
      return {
        ...model,
        ...columns,
        z,
        oddsRatio: model.coefficients.map((row) => row.oddsRatio),
        oddsRatioLower: model.coefficients.map((row) => row.oddsRatioLower),
        oddsRatioUpper: model.coefficients.map((row) => row.oddsRatioUpper),
        overallStatistic: model.overallTest.statistic,
      };
    });
  },
}));

const { Orthodont, ChickWeight, anorexia } = mixedFixture.data;
const age = { name: 'age', values: Orthodont.age };
const female = { name: 'female', values: Orthodont.female };
const time = { name: 'time', values: anorexia.time };
const groups = indicatorPredictors('group', anorexia.group, ['CBT', 'Cont', 'FT']);

/** Predictors of each case, in the order of its expected coefficients. */
const mixedPredictors: Readonly<Record<string, readonly Predictor[]>> = {
  'Orthodont, age': [age],
  'Orthodont, age by female': [age, female, productPredictor(age, female)],
  'ChickWeight, time and diet': [
    { name: 'time', values: ChickWeight.time },
    ...indicatorPredictors('diet', ChickWeight.diet, ['1', '2', '3', '4']),
  ],
  'Dyestuff, common mean': [],
  'chickwts, common mean': [],
  'anorexia, time by group': [time, ...groups, ...groups.map((group) => productPredictor(time, group))],
};

const mixedChecks = mixedFixture.cases.map((one): ReferenceCheck => {
  const id = `${one.data}, ${one.model}`;
  const data = mixedFixture.data[one.data as keyof typeof mixedFixture.data];
  return {
    id,
    source: `${mixedFixture.source}; ${data.name}`,
    method: 'random-intercept',
    expected: one.expected,
    tolerance: one.tolerance,
    compute: () =>
      membersOf(randomInterceptModel({ outcome: data.outcome, predictors: mixedPredictors[id] ?? [], cluster: data.cluster }), (model) => ({
        ...model,
        ...coefficientColumns(model.coefficients),
        df: model.coefficients.map((row) => row.df),
        satterthwaiteDf: model.coefficients.map((row) => row.satterthwaiteDf),
        clusterEffects: {
          cluster: model.clusterEffects.map((row) => row.cluster),
          n: model.clusterEffects.map((row) => row.n),
          meanResidual: model.clusterEffects.map((row) => row.meanResidual),
          shrinkage: model.clusterEffects.map((row) => row.shrinkage),
          effect: model.clusterEffects.map((row) => row.effect),
        },
      })),
  };
});

const slopeChecks = slopeFixture.cases.flatMap((one): ReferenceCheck[] => {
  const compute = (): unknown =>
    membersOf(randomSlopeModel({ ...one, predictors: [] }), (model) => ({ ...model, ...coefficientColumns(model.coefficients) }));
  return [
    { ...one, source: `${slopeFixture.source}; ${one.name}`, method: 'random-slope', compute },
    { ...one.printed, id: `${one.id}, as printed`, method: 'random-slope', compute },
  ];
});

export const modelChecks: readonly ReferenceCheck[] = [...linearChecks, ...ancovaChecks, ...logisticChecks, ...mixedChecks, ...slopeChecks];
