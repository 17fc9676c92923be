import { ConvergenceError, DimensionError } from './errors.ts';

/** What is asked: min |A x - b|. */
export interface LeastSquaresProblem {
  readonly rowCount: number;
  readonly columnCount: number;
  /** (rowCount x columnCount) A, row-major. */
  readonly matrix: Float64Array;
  /** (rowCount) b. */
  readonly right: Float64Array;
}

export interface LeastSquaresSolution {
  /** (columnCount) x. */
  readonly solution: Float64Array;
  /** |A x - b|. */
  readonly residualNorm: number;
  /** (columnCount x columnCount) R of A = Q R, zeros below the diagonal: (R'R)^-1 is the covariance at unit variance. */
  readonly triangle: Float64Array;
}

/**
 * Least squares by Householder reflections; no normal equations, so half the digits are not lost.
 *
 * @param problem unchanged
 * @throws DimensionError for lengths that do not fit or fewer rows than columns
 * @throws ConvergenceError when a column depends on those before it, to rounding, or holds a value that is not finite
 * @cost 2 n^2 (m - n / 3)
 * @source Golub, Numer. Math. 7 (1965) 206; Businger & Golub, ibid. 269
 */
export function householderLeastSquares(problem: LeastSquaresProblem): LeastSquaresSolution {
  const { rowCount, columnCount } = problem;
  checkShape(problem);
  const a = problem.matrix.slice();
  const b = problem.right.slice();
  const triangle = new Float64Array(columnCount * columnCount);
  for (let k = 0; k < columnCount; k += 1) {
    const whole = columnNorm(problem.matrix, k, 0, problem);
    const rest = columnNorm(a, k, k, problem);
    // A column is lost when what is left of it is no more than the rounding of rowCount products.
    if (!(rest > Number.EPSILON * rowCount * whole)) {
      throw new ConvergenceError(`expected column ${k} to be independent of those before it`, {
        column: k,
        rest,
        whole,
      });
    }
    reflect(a, b, k, rest, problem);
    for (let j = k; j < columnCount; j += 1) triangle[k * columnCount + j] = a[k * columnCount + j];
  }
  const solution = backSubstitute(triangle, b, columnCount);
  let residual = 0;
  for (let i = columnCount; i < rowCount; i += 1) residual = Math.hypot(residual, b[i]);
  return { solution, residualNorm: residual, triangle };
}

function checkShape({ rowCount, columnCount, matrix, right }: LeastSquaresProblem): void {
  if (rowCount < columnCount || matrix.length !== rowCount * columnCount || right.length !== rowCount) {
    throw new DimensionError(
      `expected ${rowCount} x ${columnCount} with no fewer rows than columns and ${rowCount} values, got ${matrix.length} and ${right.length}`,
      { rowCount, columnCount },
    );
  }
}

/** Length of column k from row `from` on, scaled against overflow. */
function columnNorm(a: Float64Array, k: number, from: number, { rowCount, columnCount }: LeastSquaresProblem): number {
  let scale = 0;
  for (let i = from; i < rowCount; i += 1) scale = Math.max(scale, Math.abs(a[i * columnCount + k]));
  if (scale === 0) return 0;
  let sum = 0;
  for (let i = from; i < rowCount; i += 1) {
    const part = a[i * columnCount + k] / scale;
    sum += part * part;
  }
  return scale * Math.sqrt(sum);
}

/** Turn column k onto its diagonal by H = I - v v' / beta, v in the column's own place, and everything right of it along. */
function reflect(
  a: Float64Array,
  b: Float64Array,
  k: number,
  norm: number,
  { rowCount, columnCount }: LeastSquaresProblem,
): void {
  const corner = k * columnCount + k;
  // The sign that adds up: no cancellation in v.
  const target = a[corner] > 0 ? -norm : norm;
  for (let i = k; i < rowCount; i += 1) a[i * columnCount + k] /= norm;
  const lead = a[corner] - target / norm;
  a[corner] = lead;
  const beta = Math.abs(lead);
  for (let j = k + 1; j < columnCount; j += 1) {
    let dot = 0;
    for (let i = k; i < rowCount; i += 1) dot += a[i * columnCount + k] * a[i * columnCount + j];
    for (let i = k; i < rowCount; i += 1) a[i * columnCount + j] -= (dot / beta) * a[i * columnCount + k];
  }
  let dot = 0;
  for (let i = k; i < rowCount; i += 1) dot += a[i * columnCount + k] * b[i];
  for (let i = k; i < rowCount; i += 1) b[i] -= (dot / beta) * a[i * columnCount + k];
  a[corner] = target;
}

function backSubstitute(triangle: Float64Array, b: Float64Array, size: number): Float64Array {
  const solution = new Float64Array(size);
  for (let i = size - 1; i >= 0; i -= 1) {
    let value = b[i];
    for (let j = i + 1; j < size; j += 1) value -= triangle[i * size + j] * solution[j];
    solution[i] = value / triangle[i * size + i];
  }
  return solution;
}
