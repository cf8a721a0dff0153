/**
 * Every exported function, with values a registry can really send: gaps, "unable", numbers on the edge of double precision, constant
 * columns, nobody at all. Each either answers soundly or refuses by a RangeError; none answers NaN, null or nothing.
 */

import fc from 'fast-check';
import { describe as group, expect, it } from 'vitest';
import * as statistics from './index.ts';
import type { Group, Label, Observation, Predictor, TwoByTwo } from './index.ts';

const seed = 20_261_201;

interface Row {
  readonly x: Observation;
  readonly y: Observation;
  readonly z: Observation;
  readonly label: Label;
  readonly person: Label;
  readonly event: Observation;
}

/** What the functions are called with. */
interface Given {
  readonly rows: readonly Row[];
  readonly counts: readonly (readonly number[])[];
}

const orderly = fc.integer({ min: -4, max: 12 });
const gap = fc.constantFrom<Observation>(null, undefined, 'unable', NaN, Infinity, -Infinity);
const edge = fc.constantFrom(0, -0, 5e-324, -5e-324, 1e-308, 1e-160, 1e160, 1.7e308, -1.7e308, 2 ** 53, 1e15 + 0.3, 0.1 + 0.2, 1 / 3);

const soundLabels = {
  label: fc.constantFrom<Label>('A', 'B', 'C'),
  person: fc.integer({ min: 1, max: 9 }) as fc.Arbitrary<Label>,
  event: fc.constantFrom<Observation>(0, 1),
};
const labelsWithGaps: typeof soundLabels = {
  label: fc.constantFrom<Label>('A', 'B', '', null, undefined),
  person: fc.constantFrom<Label>(1, 2, '', null),
  event: fc.oneof(fc.constantFrom<Observation>(0, 1), gap),
};
const rowOf = (value: fc.Arbitrary<Observation>, labels = soundLabels): fc.Arbitrary<Row> =>
  fc.record({ x: value, y: value, z: value, ...labels });

const ordinaryRows = fc.array(rowOf(orderly), { minLength: 24, maxLength: 40 });
const hostileRows = fc.oneof(
  fc.array(rowOf(fc.oneof(orderly, gap)), { maxLength: 30 }),
  fc.array(rowOf(fc.oneof(edge, orderly)), { maxLength: 14 }),
  fc.array(rowOf(fc.oneof(edge, gap, fc.double())), { maxLength: 14 }),
  fc.array(rowOf(fc.constant(7)), { maxLength: 12 }),
  fc.array(rowOf(fc.double({ min: 1e12, max: 1e12 + 1, noNaN: true })), { maxLength: 30 }),
  fc.array(rowOf(orderly, labelsWithGaps), { maxLength: 30 }),
);
const table = fc
  .tuple(fc.integer({ min: 2, max: 4 }), fc.integer({ min: 2, max: 4 }))
  .chain(([height, width]) =>
    fc.array(fc.array(fc.integer({ min: 0, max: 6 }), { minLength: width, maxLength: width }), { minLength: height, maxLength: height }),
  );

const column = (rows: readonly Row[], of: 'x' | 'y' | 'z'): Observation[] => rows.map((row) => row[of]);
const part = (rows: readonly Row[], label: Label): Observation[] => rows.filter((row) => row.label === label).map(({ x }) => x);
const groups = (rows: readonly Row[]): Group[] => ['A', 'B', 'C'].map((name) => ({ name, values: part(rows, name) }));
const predictors = (rows: readonly Row[]): Predictor[] => [{ name: 'y', values: column(rows, 'y') }];
const followUp = (rows: readonly Row[]) => ({
  time: column(rows, 'x').map((value) => (typeof value === 'number' ? Math.abs(value) : value)),
  event: rows.map(({ event }) => event),
});
const labels = (rows: readonly Row[]): Label[] => rows.map(({ label }) => label);
const people = (rows: readonly Row[]): Label[] => rows.map(({ person }) => person);
const cell = ({ counts }: Given, i: number, j: number): number => counts[i]?.[j] ?? 0;
const twoByTwo = (given: Given): TwoByTwo => [
  [cell(given, 0, 0), cell(given, 0, 1)],
  [cell(given, 1, 0), cell(given, 1, 1)],
];
const square = (given: Given): number[][] => given.counts.map((_, i) => given.counts.map((_row, j) => cell(given, i, j)));
const events = (given: Given) =>
  given.counts.map((_, i) => ({ site: `site ${i}`, events: cell(given, i, 0), total: cell(given, i, 0) + cell(given, i, 1) }));
const siteEstimates = (rows: readonly Row[]) =>
  rows.slice(0, 8).map(({ x, y }, i) => ({ site: `site ${i}`, estimate: x, standardError: typeof y === 'number' ? Math.abs(y) : y }));
/** Whole values only where numbers are asked for that the caller has computed. */
const computed = (rows: readonly Row[]) =>
  rows.filter(({ x, y }) => Number.isFinite(x) && Number.isFinite(y)) as { x: number; y: number }[];

type Analysis = (given: Given) => unknown;

/** Analyses of people: what they say does not depend on the order in which the people come. */
const ofPeople: Readonly<Record<string, Analysis>> = {
  cleanSample: ({ rows }) => statistics.cleanSample(column(rows, 'x')).leftOut,
  cleanPairs: ({ rows }) => statistics.cleanPairs(column(rows, 'x'), column(rows, 'y')).leftOut,
  describe: ({ rows }) => statistics.describe(column(rows, 'x')),
  meanWithInterval: ({ rows }) => statistics.meanWithInterval(column(rows, 'x')),
  oneSampleTest: ({ rows }) => statistics.oneSampleTest(column(rows, 'x'), 3),
  pairedChange: ({ rows }) => statistics.pairedChange(column(rows, 'x'), column(rows, 'y')),
  welchTest: ({ rows }) => statistics.welchTest(part(rows, 'A'), part(rows, 'B')),
  signedRankTest: ({ rows }) => statistics.signedRankTest(column(rows, 'x')),
  signedRankChange: ({ rows }) => statistics.signedRankChange(column(rows, 'x'), column(rows, 'y')),
  mannWhitneyTest: ({ rows }) => statistics.mannWhitneyTest(part(rows, 'A'), part(rows, 'B')),
  oneWayAnova: ({ rows }) => statistics.oneWayAnova(groups(rows)),
  welchAnova: ({ rows }) => statistics.welchAnova(groups(rows)),
  brownForsytheTest: ({ rows }) => statistics.brownForsytheTest(groups(rows)),
  tukeyKramer: ({ rows }) => statistics.tukeyKramer(groups(rows)),
  kruskalWallisTest: ({ rows }) => statistics.kruskalWallisTest(groups(rows)),
  dunnTest: ({ rows }) => statistics.dunnTest(groups(rows)),
  jonckheereTest: ({ rows }) => statistics.jonckheereTest(groups(rows)),
  friedmanTest: ({ rows }) => statistics.friedmanTest([column(rows, 'x'), column(rows, 'y'), column(rows, 'z')]),
  standardisedDifference: ({ rows }) => statistics.standardisedDifference(part(rows, 'A'), part(rows, 'B')),
  standardisedChange: ({ rows }) => statistics.standardisedChange(column(rows, 'x'), column(rows, 'y')),
  largestNumberImbalance: ({ rows }) => statistics.largestNumberImbalance(groups(rows)),
  numberBalance: ({ rows }) => statistics.numberBalance(part(rows, 'A'), part(rows, 'B')),
  pearsonCorrelation: ({ rows }) => statistics.pearsonCorrelation(column(rows, 'x'), column(rows, 'y')),
  spearmanCorrelation: ({ rows }) => statistics.spearmanCorrelation(column(rows, 'x'), column(rows, 'y')),
  kendallCorrelation: ({ rows }) => statistics.kendallCorrelation(column(rows, 'x'), column(rows, 'y')),
  linearRegression: ({ rows }) => statistics.linearRegression({ outcome: column(rows, 'x'), predictors: predictors(rows) }),
  ancova: ({ rows }) => statistics.ancova({ baseline: column(rows, 'y'), followUp: column(rows, 'x'), group: labels(rows) }),
  logisticRegression: ({ rows }) =>
    statistics.logisticRegression({ outcome: rows.map(({ event }) => event), predictors: predictors(rows) }),
  randomInterceptModel: ({ rows }) =>
    statistics.randomInterceptModel({ outcome: column(rows, 'x'), predictors: predictors(rows), cluster: people(rows) }),
  randomSlopeModel: ({ rows }) =>
    statistics.randomSlopeModel({
      outcome: column(rows, 'x'),
      slope: { name: 'y', values: column(rows, 'y') },
      predictors: [],
      cluster: people(rows),
    }),
  kaplanMeier: ({ rows }) => statistics.kaplanMeier(followUp(rows)),
  logRankTest: ({ rows }) => statistics.logRankTest({ ...followUp(rows), group: labels(rows) }),
  coxRegression: ({ rows }) => statistics.coxRegression({ ...followUp(rows), predictors: predictors(rows) }),
  intraclassCorrelation: ({ rows }) => statistics.intraclassCorrelation(column(rows, 'x'), people(rows)),
  raterAgreement: ({ rows }) => statistics.raterAgreement(rows.map(({ x, y, z }) => [x, y, z])),
};

/** Analyses of counts and of figures that were computed before, and the parts that analyses are made of. */
const others: Readonly<Record<string, Analysis>> = {
  quantile: ({ rows }) =>
    statistics.quantile(
      Float64Array.from(computed(rows), ({ x }) => x),
      0.3,
    ),
  quantileOfSorted: ({ rows }) => statistics.quantileOfSorted(Float64Array.from(computed(rows), ({ x }) => x).sort(), 0.9),
  changes: ({ rows }) => [...statistics.changes(statistics.cleanPairs(column(rows, 'x'), column(rows, 'y')))].filter(Number.isFinite),
  midranks: ({ rows }) => [...statistics.midranks(Float64Array.from(computed(rows), ({ x }) => x)).ranks],
  meanFigures: ({ rows }) => statistics.meanFigures(statistics.cleanSample(column(rows, 'x')), 0.95),
  fitness: ({ rows }) => rows.map(({ x }) => statistics.fitness(x)),
  indicatorPredictors: ({ rows }) => statistics.indicatorPredictors('group', labels(rows), ['A', 'B', 'C']).map(({ name }) => name),
  productPredictor: ({ rows }) =>
    statistics.productPredictor({ name: 'x', values: column(rows, 'x') }, { name: 'y', values: column(rows, 'y') }).name,
  predictedMean: ({ rows }) => {
    const model = statistics.linearRegression({ outcome: column(rows, 'x'), predictors: predictors(rows) });
    return model.kind === 'linear-model' ? statistics.predictedMean(model, [2]) : model;
  },
  survivalAt: ({ rows }) => {
    const curve = statistics.kaplanMeier(followUp(rows));
    return curve.kind === 'survival-curve' ? statistics.survivalAt(curve, 3) : curve;
  },
  survivalQuantile: ({ rows }) => {
    const curve = statistics.kaplanMeier(followUp(rows));
    return curve.kind === 'survival-curve' ? statistics.survivalQuantile(curve, 0.25) : curve;
  },
  minimalDetectableChange: ({ rows }) =>
    computed(rows).map(({ x, y }) => statistics.minimalDetectableChange(Math.abs(x), Math.min(1, Math.abs(y)))),
  largestClassImbalance: ({ counts }) => statistics.largestClassImbalance(counts.map((line, i) => ({ name: `group ${i}`, counts: line }))),
  responderBounds: (given) => events(given).map((one) => statistics.responderBounds(one, cell(given, 0, 1))),
  classBalance: (given) => statistics.classBalance(given.counts[0] ?? [], given.counts[1] ?? []),
  bootstrapPercentile: ({ rows }) => {
    const values = computed(rows).map(({ x }) => x);
    return statistics.bootstrapPercentile({
      n: values.length,
      seed: 5,
      replicates: 199,
      statistic: (places) => places.reduce((sum, place) => sum + (values[place] ?? 0), 0) / places.length,
    });
  },
  percentileLimits: ({ rows }) =>
    statistics.percentileLimits(
      Float64Array.from({ length: 39 }, (_, i) => computed(rows)[i]?.x ?? i),
      0.95,
    ),
  rubinsRules: ({ rows }) =>
    statistics.rubinsRules(
      computed(rows).map(({ x, y }) => ({ estimate: x, variance: Math.abs(y) })),
      20,
    ),
  randomEffectsPooling: ({ rows }) => statistics.randomEffectsPooling(siteEstimates(rows)),
  meanFunnel: ({ rows }) =>
    statistics.meanFunnel(
      rows.slice(0, 12).map(({ x }, i) => ({ site: `site ${i}`, mean: x, n: i + 1 })),
      2,
      3,
    ),
  meanFunnelLimit: ({ rows }) => computed(rows).map(({ x, y }) => statistics.meanFunnelLimit(x, Math.abs(y), 5, 0.025)),
  proportionFunnel: (given) => statistics.proportionFunnel(events(given)),
  proportionFunnelLimit: (given) => statistics.proportionFunnelLimit(0.3, cell(given, 0, 0), 0.001),
  holmAdjusted: ({ rows }) => [...statistics.holmAdjusted(computed(rows).map(({ x }) => Math.min(1, Math.abs(x))))],
  falseDiscoveryAdjusted: ({ rows }) => [...statistics.falseDiscoveryAdjusted(computed(rows).map(({ x }) => Math.min(1, Math.abs(x))))],
  bonferroniAdjusted: ({ rows }) => [...statistics.bonferroniAdjusted(computed(rows).map(({ x }) => Math.min(1, Math.abs(x))))],
  wilsonProportion: (given) => events(given).map((one) => statistics.wilsonProportion(one.events, one.total)),
  wilsonLimits: (given) => events(given).map((one) => statistics.wilsonLimits(one, 0.95)),
  clopperPearsonProportion: (given) => events(given).map((one) => statistics.clopperPearsonProportion(one.events, one.total)),
  newcombeDifference: (given) =>
    statistics.newcombeDifference({ events: cell(given, 0, 0), total: 6 }, { events: cell(given, 1, 0), total: cell(given, 1, 0) }),
  chiSquareTest: ({ counts }) => statistics.chiSquareTest(counts),
  fisherTwoByTwo: (given) => statistics.fisherTwoByTwo(twoByTwo(given)),
  fisherExactTable: ({ counts }) => statistics.fisherExactTable(counts, { seed: 1, replicates: 99 }),
  cochranArmitageTrend: (given) => statistics.cochranArmitageTrend(events(given)),
  mantelHaenszel: (given) => statistics.mantelHaenszel([twoByTwo(given), twoByTwo({ ...given, counts: [...given.counts].reverse() })]),
  mcNemarTest: (given) => statistics.mcNemarTest(twoByTwo(given)),
  bowkerSymmetry: (given) => statistics.bowkerSymmetry(square(given)),
  stuartMaxwell: (given) => statistics.stuartMaxwell(square(given)),
  weightedKappa: (given) => statistics.weightedKappa(square(given)),
  transitionSummary: (given) => statistics.transitionSummary(square(given)),
};

const analyses = { ...ofPeople, ...others };

/** Functions of plain numbers: how many they take. Every argument is tried with every awkward number. */
const ofNumbers: Readonly<Record<string, number>> = {
  betaQuantile: 3,
  betaTails: 3,
  binomialLogMass: 3,
  binomialMass: 3,
  binomialQuantile: 3,
  binomialTails: 3,
  chiSquareQuantile: 2,
  chiSquareTails: 2,
  fQuantile: 3,
  fTails: 3,
  gammaQuantile: 3,
  gammaTails: 3,
  hypergeometricLogMass: 4,
  hypergeometricMass: 4,
  hypergeometricQuantile: 4,
  hypergeometricTails: 4,
  logBeta: 2,
  logGamma: 1,
  noncentralTTails: 3,
  noncentralityWithLowerTail: 3,
  normalDensity: 1,
  normalLogLower: 1,
  normalMultiplier: 1,
  normalQuantile: 1,
  normalTails: 1,
  normalUpper: 1,
  poissonMass: 2,
  poissonQuantile: 2,
  poissonTails: 2,
  rankSumTails: 3,
  signedRankTails: 2,
  smallSampleFactor: 1,
  studentisedRangeQuantile: 3,
  studentisedRangeTails: 3,
  tMultiplier: 2,
  tQuantile: 2,
  tTails: 2,
  tTwoSided: 2,
  fixedDecimals: 2,
  numberText: 2,
  limitText: 2,
  rangeText: 3,
  meanSdText: 3,
  pValueText: 1,
  percentOfText: 2,
  roundHalfAwayFromZero: 2,
  roundToResolution: 2,
  shareText: 2,
  summaryDecimals: 1,
  requireLevel: 1,
  seededGenerator: 1,
  verySmallSample: 1,
};

/** Made of what others have checked: nothing of their own can go wrong with a value. */
const withoutValues = [
  'addLeftOut',
  'basisText',
  'comparisonText',
  'estimateText',
  'figure',
  'generatorFromState',
  'intervalText',
  'medianQuartilesText',
  'noFigure',
  'notEstimable',
  'prefersRanks',
  'statisticText',
  'sumsOfSquares',
  'tieTerm',
];

/** Limits, and ratios whose limits are one-sided, may be without bound. */
const mayBeInfinite = /^(lower|upper|oddsRatioUpper|hazardRatioUpper|estimate|oddsRatio|logLower|logUpper|logProbability)$/;

function expectSound(value: unknown, key = '', path = key): void {
  if (typeof value === 'number') {
    if (Number.isNaN(value)) expect.fail(`${path} is not a number`);
    if (!Number.isFinite(value) && !mayBeInfinite.test(key)) expect.fail(`${path} is ${value}`);
    if (key === 'p' && !(value >= 0 && value <= 1)) expect.fail(`${path} is ${value}`);
    return;
  }
  if (typeof value === 'string') {
    if (key !== 'name' && value === '') expect.fail(`${path} says nothing`);
    return;
  }
  if (value === null || value === undefined) expect.fail(`${path} is ${value}`);
  if (typeof value !== 'object') return;
  const entries = Object.entries(value).filter(([, member]) => typeof member !== 'function');
  const { lower, upper, level, n } = value as Record<string, unknown>;
  if (typeof level === 'number' && typeof lower === 'number' && typeof upper === 'number' && lower > upper)
    expect.fail(`${path}: ${lower} to ${upper}`);
  if (n !== undefined && !(Number.isSafeInteger(n) && (n as number) >= 0)) expect.fail(`${path} rests on n = ${String(n)}`);
  for (const [name, member] of entries) expectSound(member, name, path === '' ? name : `${path}.${name}`);
}

/** The answer, or the word for a refusal by name; any other failure is one of the function. */
function answerOf(call: () => unknown): unknown {
  try {
    return call();
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    expect(error.message).toMatch(/^[A-Z(].*\.$/);
    return 'refused';
  }
}

/** Near enough for sums taken in another order. */
function expectAlike(one: unknown, other: unknown, path: string): void {
  if (typeof one === 'number' && typeof other === 'number') {
    if (one !== other && !(Math.abs(one - other) <= 1e-7 + 1e-5 * Math.abs(one))) expect.fail(`${path}: ${one}, then ${other}`);
    return;
  }
  if (typeof one !== 'object' || one === null) {
    expect(other, path).toBe(one);
    return;
  }
  expect(Object.keys(other as object), path).toEqual(Object.keys(one));
  for (const [key, member] of Object.entries(one)) expectAlike(member, (other as Record<string, unknown>)[key], `${path}.${key}`);
}

/** Tested against a number of the caller's, which has a unit of its own. */
const testedAgainstANumber: readonly string[] = ['oneSampleTest'];

const times = (value: Observation, unit: number): Observation => (typeof value === 'number' ? value * unit : value);

/** Every p in an answer, in the order of its members. */
function probabilities(value: unknown, key = ''): number[] {
  if (key === 'p' && typeof value === 'number') return [value];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([name, member]) => probabilities(member, name));
}

const slow: readonly string[] = ['tukeyKramer', 'ancova', 'randomSlopeModel', 'standardisedDifference', 'standardisedChange'];
const runs = (name: string): number => (slow.includes(name) ? 25 : 120);

group('every exported function', () => {
  it('is tried here', () => {
    const functions = Object.entries(statistics).flatMap(([name, member]) => (typeof member === 'function' ? [name] : []));
    expect([...Object.keys(analyses), ...Object.keys(ofNumbers), ...withoutValues].sort()).toEqual(functions.sort());
  });

  it.each(Object.keys(analyses))('%s answers soundly or refuses, whatever it is given', (name) => {
    fc.assert(
      fc.property(hostileRows, table, (rows, counts) => {
        expectSound(answerOf(() => analyses[name]?.({ rows, counts })));
      }),
      { seed, numRuns: runs(name) },
    );
  });

  it.each(Object.keys(analyses))('%s answers the same again, and leaves what it was given as it is', (name) => {
    fc.assert(
      fc.property(ordinaryRows, table, (rows, counts) => {
        const before = structuredClone({ rows, counts });
        const first = answerOf(() => analyses[name]?.({ rows, counts }));
        expect({ rows, counts }).toEqual(before);
        expect(answerOf(() => analyses[name]?.({ rows, counts }))).toEqual(first);
      }),
      { seed, numRuns: 10 },
    );
  });

  it.each(Object.keys(ofPeople))('%s does not hang on the order of the people', (name) => {
    fc.assert(
      fc.property(
        ordinaryRows.chain((rows) => fc.tuple(fc.constant(rows), fc.shuffledSubarray(rows, { minLength: rows.length }))),
        ([rows, shuffled]) => {
          expectAlike(
            answerOf(() => ofPeople[name]?.({ rows, counts: [] })),
            answerOf(() => ofPeople[name]?.({ rows: shuffled, counts: [] })),
            name,
          );
        },
      ),
      { seed, numRuns: slow.includes(name) ? 10 : 40 },
    );
  });

  it.each(Object.keys(ofPeople).filter((name) => !testedAgainstANumber.includes(name)))('%s gives the same p in any unit', (name) => {
    fc.assert(
      fc.property(ordinaryRows, (rows) => {
        const inUnit = (unit: number) =>
          rows.map((row) => ({ ...row, x: times(row.x, unit), y: times(row.y, unit), z: times(row.z, unit) }));
        const plain = probabilities(answerOf(() => ofPeople[name]?.({ rows, counts: [] })));
        const other = probabilities(answerOf(() => ofPeople[name]?.({ rows: inUnit(1024), counts: [] })));
        expectAlike(plain, other, name);
      }),
      { seed, numRuns: slow.includes(name) ? 8 : 25 },
    );
  });

  const awkward = [NaN, Infinity, -Infinity, 0, -0, -1, 0.5, 1, 2, 2.5, 7, 40, 1e6, 5e-324, 1e308, 2 ** 53];
  it.each(Object.entries(ofNumbers))('%s answers soundly or refuses any %i numbers', (name, count) => {
    const call = (statistics as unknown as Record<string, (...numbers: number[]) => unknown>)[name]!;
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...awkward), { minLength: count, maxLength: count }), (numbers) => {
        const answer = answerOf(() => call(...numbers));
        if (answer !== undefined && !(typeof answer === 'number' && Math.abs(answer) === Infinity)) expectSound(answer);
      }),
      { seed, numRuns: name.startsWith('studentisedRange') ? 60 : 300 },
    );
  });
});
