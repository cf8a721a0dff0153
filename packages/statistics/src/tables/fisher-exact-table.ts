/**
 * Fisher-Freeman-Halton exact test of association in a table of any size, without an approximation by chi-square. p is the total
 * probability of the tables with the observed margins that are no more probable than the observed one (relative slack 1e-7).
 *
 * Where the tables are too many to count, p is estimated from `replicates` tables drawn with a seeded generator, (1 + hits)/(B + 1), and
 * the answer says so with B and the seed.
 *
 * Source: Freeman & Halton (1951) Biometrika 38:141-149; Monte Carlo p of Davison & Hinkley (1997) Bootstrap Methods, section 4.2.
 */

import { seededGenerator } from '../resampling/seeded-generator.ts';
import { drawTable } from '../resampling/draw-table.ts';
import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons } from '../result.ts';
import type { CountTable, Margins } from './contingency-table.ts';
import { marginsOf, requireCountTable, withoutEmptyLines } from './contingency-table.ts';
import { exactTableProbability, logTableWeight } from './exact-table-probability.ts';
import { equalProbabilitySlack } from './fisher-two-by-two.ts';
import { logFactorials } from './log-factorials.ts';

export interface Simulation {
  readonly seed: number;
  readonly replicates: number;
}

export interface ExactTableTest extends TestResult {
  /** Present only when p was estimated by drawing tables. */
  readonly simulation?: Simulation;
}

const defaultSimulation: Simulation = { seed: 1, replicates: 9999 };

function simulatedProbability(table: CountTable, margins: Margins, { seed, replicates }: Simulation): number {
  const logFactorial = logFactorials(margins.total);
  const bar = logTableWeight(table, margins.columns, logFactorial) + Math.log1p(equalProbabilitySlack);
  const generator = seededGenerator(seed);
  let hits = 0;
  for (let i = 0; i < replicates; i++) {
    if (logTableWeight(drawTable(generator, margins), margins.columns, logFactorial) <= bar) hits++;
  }
  return (1 + hits) / (replicates + 1);
}

export function fisherExactTable(table: CountTable, simulation: Simulation = defaultSimulation): ExactTableTest | NotEstimable {
  requireCountTable(table);
  if (!(Number.isSafeInteger(simulation.replicates) && simulation.replicates >= 1))
    throw new RangeError('Drawn tables are counted from 1 up.');
  const filled = withoutEmptyLines(table);
  const margins = marginsOf(filled);
  const basis = { n: margins.total, leftOut: nothingLeftOut };
  if (margins.total === 0) return notEstimable(reasons.noData, basis);
  if (margins.rows.length < 2 || margins.columns.length < 2) return notEstimable(reasons.noComparison, basis);
  const logFactorial = logFactorials(margins.total);
  const logConstant = (logFactorial[margins.total] as number) - margins.rows.reduce((sum, row) => sum + (logFactorial[row] as number), 0);
  const statistic = Math.exp(logTableWeight(filled, margins.columns, logFactorial) - logConstant);
  const exact = exactTableProbability(filled, margins);
  const figures = { statisticName: 'table probability' as const, statistic, df: [] };
  const title = 'Fisher-Freeman-Halton exact test (two-sided, sum of tables no more probable';
  if (exact !== undefined) {
    return { kind: 'test', ...basis, ...figures, p: exact, method: `${title}).`, failedAssumptions: [] };
  }
  return {
    kind: 'test',
    ...basis,
    ...figures,
    p: simulatedProbability(filled, margins, simulation),
    method: `${title}), p estimated from B = ${simulation.replicates} tables drawn with seed ${simulation.seed}.`,
    failedAssumptions: ['too many tables to count: p is a simulation estimate'],
    simulation,
  };
}
