/** What keeps a set of predictors out of a model, found before it is fitted. */

import type { CentredColumn } from '../linear-algebra/centred-column.ts';
import { rangeObstacle } from '../linear-algebra/centred-column.ts';
import { orthogonalTriangle } from '../linear-algebra/orthogonal-triangle.ts';
import { rankTolerance } from './least-squares.ts';
import { reasonForUnfit } from './linear-regression.ts';

/** Why one of the centred columns cannot enter, if so: it does not vary, or by the rank test of ordinary least squares. */
export function unusablePredictor(columns: readonly CentredColumn[], names: readonly string[]): string | undefined {
  const outOfRange = rangeObstacle(columns);
  if (outOfRange !== undefined) return outOfRange;
  const flat = columns.findIndex((column) => column.norm === 0);
  if (flat >= 0) return reasonForUnfit({ kind: 'constant-predictor', column: flat }, names);
  const { size, entries } = orthogonalTriangle(columns.map((column) => column.unit));
  const dependent = columns.findIndex((_, j) => Math.abs(entries[j * size + j] as number) < rankTolerance);
  return dependent < 0 ? undefined : reasonForUnfit({ kind: 'dependent-predictor', column: dependent }, names);
}
