import { Matrix, QrDecomposition } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { ConvergenceError, DimensionError } from './errors.ts';
import { householderLeastSquares } from './householder-least-squares.ts';
import { invertSymmetricPositive } from './invert-symmetric-positive.ts';
import { createRandomStream } from './random-stream.ts';

const random = createRandomStream({ seed: 8n, purpose: 'least squares test' });

describe('householderLeastSquares', () => {
  it('draws the line through three points done by hand', () => {
    // y = 1, 2, 4 at x = 0, 1, 2: slope 3/2, intercept 5/6, residual 1/6, -1/3, 1/6.
    const matrix = Float64Array.of(1, 0, 1, 1, 1, 2);
    const { solution, residualNorm } = householderLeastSquares({
      rowCount: 3,
      columnCount: 2,
      matrix,
      right: Float64Array.of(1, 2, 4),
    });
    expect(solution[0]).toBeCloseTo(5 / 6, 14);
    expect(solution[1]).toBeCloseTo(3 / 2, 14);
    expect(residualNorm).toBeCloseTo(1 / Math.sqrt(6), 14);
    expect([...matrix]).toEqual([1, 0, 1, 1, 1, 2]);
  });

  it('keeps nine digits on the Longley data, whose columns nearly depend on each other', () => {
    const { solution, residualNorm } = householderLeastSquares(longley());
    LONGLEY_CERTIFIED.forEach((expected, k) => {
      expect(Math.abs(solution[k] / expected - 1)).toBeLessThan(1e-9);
    });
    // Residual standard deviation on 16 - 7 degrees of freedom, certified with the same data.
    expect(Math.abs(residualNorm / 3 / 304.854073561965 - 1)).toBeLessThan(1e-9);
  });

  it.each([
    [1, 1],
    [4, 4],
    [30, 6],
    [200, 25],
  ])('agrees with ml-matrix for %d rows and %d columns', (rowCount, columnCount) => {
    const matrix = Float64Array.from({ length: rowCount * columnCount }, () => random.nextNormal());
    const right = Float64Array.from({ length: rowCount }, () => random.nextNormal());
    const oracle = new QrDecomposition(Matrix.from1DArray(rowCount, columnCount, matrix)).solve(
      Matrix.columnVector(right),
    );
    const { solution } = householderLeastSquares({ rowCount, columnCount, matrix, right });
    solution.forEach((value, k) => {
      // Random square matrices of four rows have condition numbers of some tens; 1e-11 leaves three digits of room.
      expect(Math.abs(value - oracle.get(k, 0))).toBeLessThan(1e-11 * Math.max(1, Math.abs(value)));
    });
  });

  it("returns R with R'R = A'A, at any scale", () => {
    for (const scale of [1, 1e-9, 1e9]) {
      const matrix = Float64Array.from({ length: 40 }, () => scale * random.nextNormal());
      const problem = { rowCount: 10, columnCount: 4, matrix, right: new Float64Array(10) };
      const { triangle, solution } = householderLeastSquares(problem);
      const product = (x: Float64Array, rows: number, i: number, j: number): number => {
        let sum = 0;
        for (let r = 0; r < rows; r += 1) sum += x[r * 4 + i] * x[r * 4 + j];
        return sum;
      };
      for (let i = 0; i < 4; i += 1) {
        for (let j = 0; j < 4; j += 1) {
          const gap = product(triangle, 4, i, j) - product(matrix, 10, i, j);
          expect(Math.abs(gap)).toBeLessThan(1e-13 * scale * scale * 40);
          if (j < i) expect(triangle[i * 4 + j]).toBe(0);
        }
      }
      expect([...solution].every((value) => value === 0)).toBe(true);
    }
  });

  it('refuses columns that depend on each other, values that are no numbers, and too few rows', () => {
    const solve = (rowCount: number, columnCount: number, matrix: number[]) => () =>
      householderLeastSquares({
        rowCount,
        columnCount,
        matrix: Float64Array.from(matrix),
        right: new Float64Array(rowCount),
      });
    expect(solve(3, 2, [1, 2, 2, 4, 3, 6])).toThrow(ConvergenceError);
    expect(solve(3, 2, [1, 0, 2, 0, 3, 0])).toThrow(ConvergenceError);
    expect(solve(2, 1, [1, Number.NaN])).toThrow(ConvergenceError);
    expect(solve(1, 2, [1, 2])).toThrow(DimensionError);
    expect(solve(3, 2, [1, 2, 3])).toThrow(DimensionError);
  });
});

describe('invertSymmetricPositive', () => {
  it('inverts the Hilbert matrix of three rows, whose inverse is whole (Choi, Am. Math. Mon. 90 (1983) 301)', () => {
    const hilbert = Float64Array.from({ length: 9 }, (_, k) => 1 / (Math.floor(k / 3) + (k % 3) + 1));
    const exact = [9, -36, 30, -36, 192, -180, 30, -180, 180];
    // Condition number 524: a few hundred roundings of the largest element.
    invertSymmetricPositive(3, hilbert).forEach((value, k) => {
      expect(Math.abs(value - exact[k])).toBeLessThan(524 * 192 * Number.EPSILON);
    });
  });

  it('is symmetric to the last bit and leaves its input alone', () => {
    const root = Float64Array.from({ length: 64 }, () => random.nextNormal());
    const matrix = new Float64Array(64);
    for (let i = 0; i < 8; i += 1) {
      for (let j = 0; j < 8; j += 1) {
        for (let k = 0; k < 8; k += 1) matrix[i * 8 + j] += root[i * 8 + k] * root[j * 8 + k];
      }
      matrix[i * 9] += 1;
    }
    const before = matrix.slice();
    const inverse = invertSymmetricPositive(8, matrix);
    for (let i = 0; i < 8; i += 1) {
      for (let j = 0; j < 8; j += 1) {
        expect(inverse[i * 8 + j]).toBe(inverse[j * 8 + i]);
        let sum = 0;
        for (let k = 0; k < 8; k += 1) sum += matrix[i * 8 + k] * inverse[k * 8 + j];
        expect(sum).toBeCloseTo(i === j ? 1 : 0, 11);
      }
    }
    expect(matrix).toEqual(before);
  });

  it('refuses a matrix that is not positive definite', () => {
    expect(() => invertSymmetricPositive(2, Float64Array.of(1, 2, 2, 1))).toThrow(ConvergenceError);
  });
});

/** Longley, J. Am. Stat. Assoc. 62 (1967) 819; coefficients certified by NIST's statistical reference datasets; both from memory. */
const LONGLEY_CERTIFIED = [
  -3482258.63459582, 15.0618722713733, -0.035819179292591, -2.02022980381683, -1.03322686717359, -0.0511041056535807,
  1829.15146461355,
] as const;

function longley(): Parameters<typeof householderLeastSquares>[0] {
  const rows = [
    [60323, 83, 234289, 2356, 1590, 107608],
    [61122, 88.5, 259426, 2325, 1456, 108632],
    [60171, 88.2, 258054, 3682, 1616, 109773],
    [61187, 89.5, 284599, 3351, 1650, 110929],
    [63221, 96.2, 328975, 2099, 3099, 112075],
    [63639, 98.1, 346999, 1932, 3594, 113270],
    [64989, 99, 365385, 1870, 3547, 115094],
    [63761, 100, 363112, 3578, 3350, 116219],
    [66019, 101.2, 397469, 2904, 3048, 117388],
    [67857, 104.6, 419180, 2822, 2857, 118734],
    [68169, 108.4, 442769, 2936, 2798, 120445],
    [66513, 110.8, 444546, 4681, 2637, 121950],
    [68655, 112.6, 482704, 3813, 2552, 123366],
    [69564, 114.2, 502601, 3931, 2514, 125368],
    [69331, 115.7, 518173, 4806, 2572, 127852],
    [70551, 116.9, 554894, 4007, 2827, 130081],
  ];
  return {
    rowCount: 16,
    columnCount: 7,
    matrix: Float64Array.from(rows.flatMap(([, ...x], k) => [1, ...x, 1947 + k])),
    right: Float64Array.from(rows, ([employed]) => employed),
  };
}
