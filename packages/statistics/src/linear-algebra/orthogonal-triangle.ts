/**
 * The upper triangle R of a Householder QR decomposition, fed with rows block by block, so that a long table passes through memory once
 * and no cross-product X'X is ever formed (which would cost half of the digits).
 *
 * Source: Golub & Van Loan (2013), Matrix Computations, 4th ed., sections 5.1 and 5.2 (Householder QR), 6.5 (adding rows to a
 * factorisation).
 */

/** Square upper triangle, column by column: element (row, column) is `entries[column * size + row]`. Below the diagonal all is zero. */
export interface UpperTriangle {
  readonly size: number;
  readonly entries: Float64Array;
}

/** Rows that are reflected together; small enough to stay in the cache of a processor. */
const blockRows = 512;

export function emptyTriangle(size: number): UpperTriangle {
  return { size, entries: new Float64Array(size * size) };
}

/**
 * Adds the rows of `block` to the triangle, both in place; the block is left with what the reflections made of it.
 * Row j of the triangle is zero left of column j, so each reflection touches one row of it and the block.
 */
function absorbBlock({ size, entries }: UpperTriangle, block: readonly Float64Array[], rows: number): void {
  for (let j = 0; j < size; j++) {
    const pivotColumn = block[j] as Float64Array;
    let below = 0;
    for (let i = 0; i < rows; i++) below += (pivotColumn[i] as number) ** 2;
    if (below === 0) continue;
    const pivot = entries[j * size + j] as number;
    const norm = Math.sqrt(pivot * pivot + below);
    const diagonal = pivot > 0 ? -norm : norm;
    const head = pivot - diagonal;
    const factor = 2 / (head * head + below);
    entries[j * size + j] = diagonal;
    for (let k = j + 1; k < size; k++) {
      const column = block[k] as Float64Array;
      const top = entries[k * size + j] as number;
      let product = head * top;
      for (let i = 0; i < rows; i++) product += (pivotColumn[i] as number) * (column[i] as number);
      const step = product * factor;
      entries[k * size + j] = top - step * head;
      for (let i = 0; i < rows; i++) column[i] = (column[i] as number) - step * (pivotColumn[i] as number);
    }
  }
}

/** Adds rows given as columns of equal length. The columns are not changed; the triangle is. */
export function absorbColumns(triangle: UpperTriangle, columns: readonly Float64Array[]): void {
  const length = columns[0]?.length ?? 0;
  const block = columns.map(() => new Float64Array(Math.min(blockRows, length)));
  for (let start = 0; start < length; start += blockRows) {
    const rows = Math.min(blockRows, length - start);
    for (const [j, column] of columns.entries()) (block[j] as Float64Array).set(column.subarray(start, start + rows));
    absorbBlock(triangle, block, rows);
  }
}

/** Adds the rows of another triangle, each multiplied by `factor`. */
export function absorbTriangle(triangle: UpperTriangle, other: UpperTriangle, factor: number): void {
  const { size } = other;
  const columns = Array.from({ length: size }, (_, j) => other.entries.slice(j * size, (j + 1) * size).map((value) => value * factor));
  absorbBlock(triangle, columns, size);
}

/** The triangle of a whole table given by its columns. */
export function orthogonalTriangle(columns: readonly Float64Array[]): UpperTriangle {
  const triangle = emptyTriangle(columns.length);
  absorbColumns(triangle, columns);
  return triangle;
}

/**
 * Solves R x = b by back substitution with the leading `order` rows and columns; b is the part above the diagonal of column
 * `rightHandSide`.
 */
export function solveAgainstColumn({ size, entries }: UpperTriangle, order: number, rightHandSide: number): Float64Array {
  const solution = entries.slice(rightHandSide * size, rightHandSide * size + order);
  for (let i = order - 1; i >= 0; i--) {
    let rest = solution[i] as number;
    for (let k = i + 1; k < order; k++) rest -= (entries[k * size + i] as number) * (solution[k] as number);
    solution[i] = rest / (entries[i * size + i] as number);
  }
  return solution;
}

/** The inverse of the leading `order` rows and columns. */
export function invertTriangle({ size, entries }: UpperTriangle, order: number): UpperTriangle {
  const inverse = emptyTriangle(order);
  for (let j = 0; j < order; j++) {
    inverse.entries[j * order + j] = 1 / (entries[j * size + j] as number);
    for (let i = j - 1; i >= 0; i--) {
      let sum = 0;
      for (let k = i + 1; k <= j; k++) sum += (entries[k * size + i] as number) * (inverse.entries[j * order + k] as number);
      inverse.entries[j * order + i] = -sum / (entries[i * size + i] as number);
    }
  }
  return inverse;
}

/** (X'X)^-1 from the inverse of R, as rows. */
export function inverseCrossProduct(inverse: UpperTriangle): number[][] {
  const { size, entries } = inverse;
  return Array.from({ length: size }, (_, i) =>
    Array.from({ length: size }, (_, j) => {
      let sum = 0;
      for (let k = Math.max(i, j); k < size; k++) sum += (entries[k * size + i] as number) * (entries[k * size + j] as number);
      return sum;
    }),
  );
}
