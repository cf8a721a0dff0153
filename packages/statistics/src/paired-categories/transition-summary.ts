/**
 * Movement between ordered grades from baseline (rows) to follow-up (columns): for each baseline grade the shares that stayed, rose, rose by
 * two or more, fell, with Wilson intervals, and over all grades the exact sign test of risen against fallen.
 * Source: Agresti (2002) Categorical Data Analysis, section 10.4 (square tables); sign test as Conover (1999), section 3.4.
 */

import type { EstimateResult, TestOutcome } from '../result.ts';
import { notEstimable, nothingLeftOut, requireLevel } from '../result.ts';
import { wilsonProportion } from '../proportions/wilson-proportion.ts';
import type { CountTable } from '../tables/contingency-table.ts';
import { marginsOf, requireSquareTable } from '../tables/contingency-table.ts';
import { exactSignProbability } from './exact-sign-probability.ts';

export interface Movement {
  readonly n: number;
  readonly unchanged: number;
  /** Follow-up grade later in the order than the baseline grade. */
  readonly improved: number;
  readonly improvedByTwoOrMore: number;
  readonly worsened: number;
}

export interface GradeMovement extends Movement {
  readonly shareImproved: EstimateResult;
  readonly shareImprovedByTwoOrMore: EstimateResult;
}

export interface TransitionSummary extends Movement {
  readonly byBaselineGrade: readonly GradeMovement[];
  readonly signTest: TestOutcome;
}

function movementFrom(row: readonly number[], grade: number): Movement {
  const sum = (counts: readonly number[]): number => counts.reduce((total, count) => total + count, 0);
  return {
    n: sum(row),
    unchanged: row[grade] as number,
    improved: sum(row.slice(grade + 1)),
    improvedByTwoOrMore: sum(row.slice(grade + 2)),
    worsened: sum(row.slice(0, grade)),
  };
}

export function transitionSummary(table: CountTable, level = 0.95): TransitionSummary {
  requireSquareTable(table);
  requireLevel(level);
  const byBaselineGrade = table.map((row, grade): GradeMovement => {
    const movement = movementFrom(row, grade);
    return {
      ...movement,
      shareImproved: wilsonProportion(movement.improved, movement.n, level),
      shareImprovedByTwoOrMore: wilsonProportion(movement.improvedByTwoOrMore, movement.n, level),
    };
  });
  const all = (key: keyof Movement): number => byBaselineGrade.reduce((sum, movement) => sum + movement[key], 0);
  const basis = { n: marginsOf(table).total, leftOut: nothingLeftOut };
  const [improved, worsened] = [all('improved'), all('worsened')];
  return {
    n: basis.n,
    unchanged: all('unchanged'),
    improved,
    improvedByTwoOrMore: all('improvedByTwoOrMore'),
    worsened,
    byBaselineGrade,
    signTest:
      improved + worsened === 0
        ? notEstimable('nobody changed grade: no comparison possible', basis)
        : {
            kind: 'test',
            ...basis,
            statisticName: 'count',
            statistic: improved,
            df: [],
            p: exactSignProbability(improved, worsened),
            method: 'Exact sign test of those who rose against those who fell (two-sided).',
            failedAssumptions: [],
          },
  };
}
