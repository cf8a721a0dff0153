import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { centredColumn, correctedMean } from './centred-column.ts';
import {
  absorbTriangle,
  emptyTriangle,
  inverseCrossProduct,
  invertTriangle,
  orthogonalTriangle,
  solveAgainstColumn,
} from './orthogonal-triangle.ts';
import { symmetricSolver } from './solve-symmetric.ts';

const seed = 45;
const entry = fc.double({ min: -10, max: 10, noNaN: true });
const columnsOf = (rows: number, columns: number) =>
  fc.array(
    fc.array(entry, { minLength: rows, maxLength: rows }).map((values) => Float64Array.from(values)),
    { minLength: columns, maxLength: columns },
  );
const table = fc
  .tuple(fc.integer({ min: 1, max: 30 }), fc.integer({ min: 1, max: 4 }))
  .chain(([rows, columns]) => columnsOf(rows, columns));

const squared = (value: number | undefined): number => (value ?? NaN) ** 2;
const dot = (a: Float64Array, b: Float64Array): number => a.reduce((sum, value, i) => sum + value * (b[i] as number), 0);

describe('orthogonal triangle', () => {
  it('has the cross-products of the table', () => {
    fc.assert(
      fc.property(table, (columns) => {
        const { size, entries } = orthogonalTriangle(columns);
        for (let i = 0; i < size; i++) {
          for (let j = 0; j < size; j++) {
            const product = dot(entries.subarray(i * size, (i + 1) * size), entries.subarray(j * size, (j + 1) * size));
            expect(product).toBeCloseTo(dot(columns[i] as Float64Array, columns[j] as Float64Array), 8);
          }
        }
      }),
      { seed },
    );
  });

  it('is the same for a long table, whose rows pass in blocks', () => {
    const rows = 1500;
    const columns = [0, 1, 2].map((k) => Float64Array.from({ length: rows }, (_, i) => Math.sin(i * (k + 1)) + k));
    const { entries } = orthogonalTriangle(columns);
    expect(squared(entries[0])).toBeCloseTo(dot(columns[0] as Float64Array, columns[0] as Float64Array), 8);
    expect(squared(entries[6]) + squared(entries[7]) + squared(entries[8])).toBeCloseTo(
      dot(columns[2] as Float64Array, columns[2] as Float64Array),
      8,
    );
  });

  it('adds another triangle with a factor', () => {
    const one = orthogonalTriangle([Float64Array.of(3, 4), Float64Array.of(1, 2)]);
    const sum = emptyTriangle(2);
    absorbTriangle(sum, one, 1);
    absorbTriangle(sum, one, 2);
    // Once and twice the length: 1 + 4 times the squares.
    expect(squared(sum.entries[0])).toBeCloseTo(5 * 25, 10);
  });

  it('solves and inverts', () => {
    const columns = [Float64Array.of(1, 0, 2), Float64Array.of(0, 3, 1), Float64Array.of(4, 5, 6)];
    const triangle = orthogonalTriangle(columns);
    const [a = 0, b = 0] = solveAgainstColumn(triangle, 2, 2);
    // Normal equations of the three rows by hand: 5a + 2b = 16, 2a + 10b = 21.
    expect(5 * a + 2 * b).toBeCloseTo(16, 10);
    expect(2 * a + 10 * b).toBeCloseTo(21, 10);
    const inverse = inverseCrossProduct(invertTriangle(triangle, 2));
    expect(inverse[0]?.[0]).toBeCloseTo(10 / 46, 12);
    expect(inverse[0]?.[1]).toBeCloseTo(-2 / 46, 12);
    expect(inverse[1]?.[1]).toBeCloseTo(5 / 46, 12);
  });
});

describe('centred column', () => {
  it('has no mean and length one', () => {
    fc.assert(
      fc.property(fc.array(entry, { minLength: 2, maxLength: 30 }), entry, (values, shift) => {
        const { mean, norm, unit } = centredColumn(
          Float64Array.from(values, (value) => value + 1e6 * shift),
          true,
        );
        if (norm === 0) return;
        expect(unit.reduce((sum, value) => sum + value * value, 0)).toBeCloseTo(1, 10);
        expect(mean + norm * (unit[0] as number)).toBeCloseTo((values[0] as number) + 1e6 * shift, 6);
      }),
      { seed },
    );
  });

  it('knows a constant column whatever its size, and a small spread from rounding', () => {
    expect(centredColumn(Float64Array.of(0.1, 0.1, 0.1), true).norm).toBe(0);
    expect(centredColumn(new Float64Array(1000).fill(1e17 / 3), true).norm).toBe(0);
    expect(centredColumn(Float64Array.of(1e9, 1e9 + 1e-3), true).norm).toBeGreaterThan(0);
    expect(centredColumn(Float64Array.of(1e300, 3e300), true).norm).toBeGreaterThan(1e300);
  });

  it('can be left where it is', () => {
    expect(centredColumn(Float64Array.of(3, 4), false)).toMatchObject({ mean: 0, norm: 5 });
    expect(correctedMean(Float64Array.of(1, 2, 6))).toBe(3);
  });
});

describe('symmetric solver', () => {
  it('solves what a table determines and answers nothing where it does not', () => {
    fc.assert(
      fc.property(columnsOf(6, 3), fc.array(entry, { minLength: 3, maxLength: 3 }), (columns, x) => {
        const matrix = columns.map((a) => columns.map((b) => dot(a, b)));
        const right = matrix.map((row) => row.reduce((sum, value, j) => sum + value * (x[j] as number), 0));
        const solved = symmetricSolver(matrix)?.solve(right);
        if (solved === undefined) return;
        const back = matrix.map((row) => row.reduce((sum, value, j) => sum + value * (solved[j] as number), 0));
        back.forEach((value, i) => expect(value).toBeCloseTo(right[i] as number, 5));
      }),
      { seed },
    );
    expect(
      symmetricSolver([
        [1, 2],
        [2, 4],
      ]),
    ).toBeUndefined();
    expect(symmetricSolver([[0]])).toBeUndefined();
    expect(symmetricSolver([[-1]])).toBeUndefined();
  });

  it('inverts and gives the determinant', () => {
    const solver = symmetricSolver([
      [4, 2],
      [2, 3],
    ]);
    expect(solver?.logDeterminant).toBeCloseTo(Math.log(8), 12);
    expect(solver?.inverse()[0]?.[0]).toBeCloseTo(3 / 8, 12);
    expect(solver?.inverse()[1]?.[0]).toBeCloseTo(-2 / 8, 12);
  });
});
