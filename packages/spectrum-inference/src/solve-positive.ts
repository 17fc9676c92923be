import { choleskyInto, choleskySolveInto } from '@spinassay/numerics';

/**
 * Solve A x = b for a symmetric positive definite A.
 *
 * @param matrix (n x n) row-major, unchanged
 * @param right (n) b, overwritten by x
 * @throws ConvergenceError when A is not positive definite
 */
export function solvePositive(matrix: Float64Array, right: Float64Array): void {
  const size = right.length;
  if (size === 0) return;
  const factor = new Float64Array(size * size);
  choleskyInto(size, matrix, factor);
  choleskySolveInto(size, factor, right, right);
}
