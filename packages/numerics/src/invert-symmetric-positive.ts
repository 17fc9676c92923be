import { choleskyInto, choleskySolveInto } from './cholesky.ts';

/**
 * Inverse of a symmetric positive definite matrix, symmetric to the last bit.
 *
 * @param size n
 * @param matrix (n x n) row-major; only the lower triangle is read; unchanged
 * @returns (n x n) new
 * @throws DimensionError for another length; ConvergenceError when the matrix is not positive definite
 * @cost about n^3
 */
export function invertSymmetricPositive(size: number, matrix: Float64Array): Float64Array {
  const factor = new Float64Array(size * size);
  choleskyInto(size, matrix, factor);
  const inverse = new Float64Array(size * size);
  const column = new Float64Array(size);
  for (let k = 0; k < size; k += 1) {
    column.fill(0);
    column[k] = 1;
    choleskySolveInto(size, factor, column, column);
    for (let i = k; i < size; i += 1) {
      inverse[i * size + k] = column[i];
      inverse[k * size + i] = column[i];
    }
  }
  return inverse;
}
