/**
 * One-way analysis of variance, equal variances assumed. Effect sizes: eta² = SSB/SST, omega² = (SSB - df1 MSW)/(SST + MSW),
 * epsilon² = (SSB - df1 MSW)/SST.
 * Source: Fisher (1925) Statistical Methods for Research Workers; Olejnik & Algina (2003) Psychological Methods 8:434-447 (effect sizes).
 */

import type { Moments } from '../description/moments.ts';
import { centredMoments, comparableGroups, groupCautions, pooledMean } from '../groups/groups.ts';
import type { Group, GroupSetAside } from '../groups/groups.ts';
import type { GroupSummary } from '../groups/group-summary.ts';
import { groupSummaries } from '../groups/group-summary.ts';
import type { NotEstimable, TestResult } from '../result.ts';
import { notEstimable, reasons } from '../result.ts';
import { fFigures } from '../test-figures.ts';

/** Sums of squares and their means in squared units of the data; `residualSd` in the unit itself. */
export interface OneWayAnova extends TestResult {
  readonly sumOfSquaresBetween: number;
  readonly sumOfSquaresWithin: number;
  readonly residualSd: number;
  readonly etaSquared: number;
  readonly omegaSquared: number;
  readonly epsilonSquared: number;
  readonly groups: readonly GroupSummary[];
  readonly setAside: readonly GroupSetAside[];
}

export interface SumsOfSquares {
  readonly between: number;
  readonly within: number;
  readonly dfBetween: number;
  readonly dfWithin: number;
}

export function sumsOfSquares(of: readonly Moments[]): SumsOfSquares {
  const centre = pooledMean(of);
  return {
    between: of.reduce((sum, group) => sum + group.n * (group.mean - centre) ** 2, 0),
    within: of.reduce((sum, group) => sum + group.sumOfSquares, 0),
    dfBetween: of.length - 1,
    dfWithin: of.reduce((sum, group) => sum + group.n - 1, 0),
  };
}

/** Two or more groups of at least two values, with variance in at least one; smaller groups are set aside and named. */
export function oneWayAnova(given: readonly Group[]): OneWayAnova | NotEstimable {
  const compared = comparableGroups(given, 2);
  const { groups, setAside, basis } = compared;
  if (groups.length < 2) return notEstimable(reasons.noComparison, basis);
  const centred = centredMoments(groups);
  if (centred === 'too large') return notEstimable(reasons.tooLarge, basis);
  const { between, within, dfBetween, dfWithin } = sumsOfSquares(centred.of);
  if (within === 0) return notEstimable('all values equal within each group', basis);
  const meanSquareWithin = within / dfWithin;
  const excess = between - dfBetween * meanSquareWithin;
  const unit = centred.factor;
  const squares = { between: between * unit * unit, within: within * unit * unit };
  if (!Number.isFinite(squares.between + squares.within)) return notEstimable(reasons.tooLarge, basis);
  return {
    kind: 'test',
    ...basis,
    ...fFigures(between / dfBetween / meanSquareWithin, dfBetween, dfWithin),
    sumOfSquaresBetween: squares.between,
    sumOfSquaresWithin: squares.within,
    residualSd: Math.sqrt(meanSquareWithin) * unit,
    etaSquared: between / (between + within),
    omegaSquared: excess / (between + within + meanSquareWithin),
    epsilonSquared: excess / (between + within),
    groups: groupSummaries(groups, centred),
    setAside,
    method: 'One-way analysis of variance (equal variances assumed).',
    failedAssumptions: groupCautions(compared),
  };
}
