/**
 * Fisher's exact test of a 2 x 2 table with the conditional maximum likelihood odds ratio and its exact limits. The margins are taken as
 * given, so the upper left count follows the noncentral hypergeometric distribution.
 *
 * Two-sided p: total probability, at odds ratio 1, of the tables no more probable than the observed one (relative slack 1e-7), as R does.
 * Limits: both tails at (1 - level)/2. The odds ratio and the upper limit are Infinity, or the odds ratio and the lower limit 0, where the
 * observed count is at the end of what the margins allow.
 *
 * Source: Fisher (1935) J R Stat Soc 98:39-82; Agresti (2002) Categorical Data Analysis, 2nd ed., sections 3.5.1 and 3.6.1.
 */

import { hypergeometricLogMass } from '../distributions/hypergeometric.ts';
import type { NotEstimable, TestedEstimate } from '../result.ts';
import { notEstimable, nothingLeftOut, reasons, requireLevel } from '../result.ts';
import { findRoot } from '../root.ts';
import { percentText } from '../test-figures.ts';
import type { CountTable } from './contingency-table.ts';
import { marginsOf, requireCountTable } from './contingency-table.ts';

export type TwoByTwo = readonly [readonly [number, number], readonly [number, number]];

/** Tables whose probability differs from the observed one's by no more than this share count as equally probable. */
export const equalProbabilitySlack = 1e-7;

/** ln odds ratios beyond this make every other count impossible in double precision. */
const widestLogOdds = 700;

interface Noncentral {
  readonly mean: number;
  /** P(X <= observed) and P(X >= observed). */
  readonly atMost: number;
  readonly atLeast: number;
}

/** Sums over the support at one log odds ratio; `logMass` holds the central distribution from `least` up. */
function noncentral(logMass: Float64Array, least: number, observed: number, logOdds: number): Noncentral {
  let peak = -Infinity;
  for (let i = 0; i < logMass.length; i++) peak = Math.max(peak, (logMass[i] as number) + i * logOdds);
  let [total, moment, below, above] = [0, 0, 0, 0];
  for (let i = 0; i < logMass.length; i++) {
    const weight = Math.exp((logMass[i] as number) + i * logOdds - peak);
    total += weight;
    moment += weight * i;
    if (least + i <= observed) below += weight;
    if (least + i >= observed) above += weight;
  }
  return { mean: least + moment / total, atMost: below / total, atLeast: above / total };
}

function rootOfLogOdds(f: (logOdds: number) => number): number {
  return Math.exp(findRoot(f, -widestLogOdds, widestLogOdds));
}

export function fisherTwoByTwo(table: TwoByTwo, level = 0.95): TestedEstimate | NotEstimable {
  requireCountTable(table satisfies CountTable);
  requireLevel(level);
  const { rows, columns, total } = marginsOf(table);
  const basis = { n: total, leftOut: nothingLeftOut };
  if (total === 0) return notEstimable(reasons.noData, basis);
  if ([...rows, ...columns].includes(0)) return notEstimable(reasons.noComparison, basis);
  const observed = table[0][0];
  const [row1 = 0] = rows;
  const [column1 = 0, column2 = 0] = columns;
  const least = Math.max(0, row1 - column2);
  const most = Math.min(row1, column1);
  const logMass = Float64Array.from({ length: most - least + 1 }, (_, i) => hypergeometricLogMass(least + i, column1, column2, row1));
  const bar = (logMass[observed - least] as number) + Math.log1p(equalProbabilitySlack);
  const p = Math.min(
    1,
    logMass.reduce((sum, log) => (log <= bar ? sum + Math.exp(log) : sum), 0),
  );

  const at = (logOdds: number): Noncentral => noncentral(logMass, least, observed, logOdds);
  const tail = (1 - level) / 2;
  const atBottom = observed === least;
  const atTop = observed === most;
  return {
    kind: 'estimate',
    ...basis,
    estimate: atBottom ? 0 : atTop ? Infinity : rootOfLogOdds((logOdds) => at(logOdds).mean - observed),
    interval: {
      lower: atBottom ? 0 : rootOfLogOdds((logOdds) => at(logOdds).atLeast - tail),
      upper: atTop ? Infinity : rootOfLogOdds((logOdds) => tail - at(logOdds).atMost),
      level,
    },
    test: { statisticName: 'count', statistic: observed, df: [], p },
    method: `Fisher's exact test (two-sided, sum of tables no more probable) with conditional maximum likelihood odds ratio and exact interval (${percentText(level)}).`,
    failedAssumptions: atBottom || atTop ? ['an empty cell: the odds ratio is bounded on one side only'] : [],
  };
}
