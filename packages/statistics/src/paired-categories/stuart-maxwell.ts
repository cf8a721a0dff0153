/**
 * Stuart-Maxwell test that the categories are equally frequent at both occasions (equal margins).
 *
 * One category of each group of categories connected by movements is redundant and left out; the degrees of freedom are those that remain,
 * k - 1 when all are connected.
 *
 * Source: Stuart (1955) Biometrika 42:412-416; Maxwell (1970) Br J Psychiatry 116:651-655.
 */

import { symmetricSolver } from '../linear-algebra/solve-symmetric.ts';
import type { TestOutcome } from '../result.ts';
import { notEstimable, nothingLeftOut } from '../result.ts';
import { chiSquareFigures } from '../test-figures.ts';
import type { CountTable } from '../tables/contingency-table.ts';
import { marginsOf, requireSquareTable } from '../tables/contingency-table.ts';

/** For each category the first one that movements connect it with, directly or over others. */
function connectedWith(moves: (i: number, j: number) => number, categories: number): number[] {
  const root = Array.from({ length: categories }, (_, i) => i);
  for (let i = 0; i < categories; i++) {
    for (let j = 0; j < i; j++) {
      if (moves(i, j) === 0) continue;
      const [from, to] = [Math.max(root[i] as number, root[j] as number), Math.min(root[i] as number, root[j] as number)];
      for (let k = 0; k < categories; k++) if (root[k] === from) root[k] = to;
    }
  }
  return root;
}

/** Rows: before; columns: after; the same categories in the same order. */
export function stuartMaxwell(table: CountTable): TestOutcome {
  requireSquareTable(table);
  const { rows, columns, total } = marginsOf(table);
  const basis = { n: total, leftOut: nothingLeftOut };
  const moves = (i: number, j: number): number => (table[i]?.[j] as number) + (table[j]?.[i] as number);
  const kept = connectedWith(moves, table.length).flatMap((root, i) => (root === i ? [] : [i]));
  if (kept.length === 0) return notEstimable('nobody changed category: no comparison possible', basis);
  const difference = kept.map((i) => (rows[i] as number) - (columns[i] as number));
  const covariance = kept.map((i) =>
    kept.map((j) => (i === j ? (rows[i] as number) + (columns[i] as number) - moves(i, i) : -moves(i, j))),
  );
  const solved = symmetricSolver(covariance)?.solve(difference);
  if (solved === undefined) return notEstimable('the movements do not determine the test', basis);
  return {
    kind: 'test',
    ...basis,
    ...chiSquareFigures(
      solved.reduce((sum, value, i) => sum + value * (difference[i] as number), 0),
      kept.length,
    ),
    method: 'Stuart-Maxwell test of marginal homogeneity (two-sided).',
    failedAssumptions: kept.some((_, i) => (covariance[i]?.[i] as number) < 10)
      ? ['fewer than 10 movements out of or into some category: the chi-square approximation is rough']
      : [],
  };
}
