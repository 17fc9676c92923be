import { ConvergenceError, DimensionError } from './errors.ts';

/**
 * Factor a symmetric positive definite matrix: A = L L'.
 *
 * @param size n
 * @param matrix (n x n) row-major; only the lower triangle is read
 * @param factor (n x n) out, L with zeros above the diagonal; may be `matrix`
 * @throws ConvergenceError when a pivot is not positive
 * @cost n^3 / 6, no allocation
 */
export function choleskyInto(size: number, matrix: Float64Array, factor: Float64Array): void {
  checkLengths(size, matrix, factor);
  for (let i = 0; i < size; i += 1) {
    for (let j = 0; j <= i; j += 1) {
      let value = matrix[i * size + j];
      for (let k = 0; k < j; k += 1) value -= factor[i * size + k] * factor[j * size + k];
      if (j < i) factor[i * size + j] = value / factor[j * size + j];
      else if (value > 0) factor[i * size + i] = Math.sqrt(value);
      else throw new ConvergenceError(`expected a positive pivot in row ${i}, got ${value}`, { row: i, pivot: value });
    }
    for (let j = i + 1; j < size; j += 1) factor[i * size + j] = 0;
  }
}

/**
 * Solve L L' x = b.
 *
 * @param factor (n x n) from choleskyInto
 * @param right (n) b
 * @param solution (n) out, x; may be `right`
 */
export function choleskySolveInto(
  size: number,
  factor: Float64Array,
  right: Float64Array,
  solution: Float64Array,
): void {
  if (right.length !== size || solution.length !== size || factor.length !== size * size) {
    throw new DimensionError(`expected vectors of ${size}, got ${right.length} and ${solution.length}`);
  }
  for (let i = 0; i < size; i += 1) {
    let value = right[i];
    for (let k = 0; k < i; k += 1) value -= factor[i * size + k] * solution[k];
    solution[i] = value / factor[i * size + i];
  }
  for (let i = size - 1; i >= 0; i -= 1) {
    let value = solution[i];
    for (let k = i + 1; k < size; k += 1) value -= factor[k * size + i] * solution[k];
    solution[i] = value / factor[i * size + i];
  }
}

/** log |A| from the factor of A. */
export function choleskyLogDeterminant(size: number, factor: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < size; i += 1) sum += Math.log(factor[i * size + i]);
  return 2 * sum;
}

function checkLengths(size: number, matrix: Float64Array, factor: Float64Array): void {
  if (matrix.length !== size * size || factor.length !== size * size) {
    throw new DimensionError(`expected ${size} x ${size} matrices, got ${matrix.length} and ${factor.length} entries`);
  }
}
