/**
 * Solves A x = b for a small symmetric positive definite matrix by Cholesky decomposition, and answers when A is not of full rank.
 * Source: Golub & Van Loan (2013), Matrix Computations, 4th ed., algorithm 4.2.1.
 */

export interface SymmetricSolver {
  readonly solve: (rightHandSide: readonly number[]) => number[];
  readonly inverse: () => number[][];
  readonly logDeterminant: number;
}

/** A pivot below this share of its diagonal element counts as zero. */
const rankTolerance = 1e-11;

/** `undefined` when the matrix is singular (to `rankTolerance`) or not positive. */
export function symmetricSolver(matrix: readonly (readonly number[])[]): SymmetricSolver | undefined {
  const order = matrix.length;
  const lower: number[][] = [];
  for (let i = 0; i < order; i++) {
    const row: number[] = [];
    for (let j = 0; j < i; j++) {
      let sum = matrix[i]?.[j] as number;
      const other = lower[j] as number[];
      for (let k = 0; k < j; k++) sum -= (row[k] as number) * (other[k] as number);
      row.push(sum / (other[j] as number));
    }
    const diagonal = matrix[i]?.[i] as number;
    const pivot = row.reduce((rest, value) => rest - value * value, diagonal);
    if (!(pivot > rankTolerance * diagonal)) return undefined;
    row.push(Math.sqrt(pivot));
    lower.push(row);
  }

  const at = (i: number, j: number): number => (lower[i] as number[])[j] as number;

  function solve(rightHandSide: readonly number[]): number[] {
    const x = [...rightHandSide];
    for (let i = 0; i < order; i++) {
      for (let k = 0; k < i; k++) x[i] = (x[i] as number) - at(i, k) * (x[k] as number);
      x[i] = (x[i] as number) / at(i, i);
    }
    for (let i = order - 1; i >= 0; i--) {
      for (let k = i + 1; k < order; k++) x[i] = (x[i] as number) - at(k, i) * (x[k] as number);
      x[i] = (x[i] as number) / at(i, i);
    }
    return x;
  }

  return {
    solve,
    inverse: () => lower.map((_, j) => solve(lower.map((_, i) => (i === j ? 1 : 0)))),
    logDeterminant: 2 * lower.reduce((sum, row, i) => sum + Math.log(row[i] as number), 0),
  };
}
