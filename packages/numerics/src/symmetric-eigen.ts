import { ConvergenceError, DimensionError, DomainError } from './errors.ts';

/** Scratch of one matrix size; made once, opaque to callers. */
export interface EigenWorkspace {
  readonly sizeMax: number;
  /** Sub-diagonal of the tridiagonal form. */
  readonly offDiagonal: Float64Array;
}

/** QL needs 1 to 2 sweeps an eigenvalue; this many mean it never ends (Wilkinson & Reinsch 1971 allow 30). */
const SWEEPS_MAX = 60;

/** Scratch for matrices up to `sizeMax` rows. */
export function createEigenWorkspace(sizeMax: number): EigenWorkspace {
  return { sizeMax, offDiagonal: new Float64Array(Math.max(1, sizeMax)) };
}

/**
 * Eigenvalues and eigenvectors of a symmetric matrix: Householder to tridiagonal form, implicit QL.
 *
 * @param size n
 * @param matrix (n x n) row-major, both triangles; unchanged unless it is `vectors`
 * @param values (>= n) out, not sorted
 * @param vectors (n x n at the front) out, row k holds eigenvector k; may be `matrix`
 * @throws ConvergenceError when QL does not settle; DomainError for a matrix with values that are not finite
 * @cost about 9 n^3, no allocation
 * @source Martin, Reinsch & Wilkinson, Numer. Math. 11 (1968) 181 (tred2); Bowdler et al., ibid. 293 (tql2), rows for columns
 */
export function symmetricEigenInto(
  size: number,
  matrix: Float64Array,
  values: Float64Array,
  vectors: Float64Array,
  workspace: EigenWorkspace,
): void {
  if (size > workspace.sizeMax || matrix.length < size * size || vectors.length < size * size || values.length < size) {
    throw new DimensionError(`expected buffers for ${size} rows`, { size, sizeMax: workspace.sizeMax });
  }
  if (size === 0) return;
  if (vectors !== matrix) for (let i = 0; i < size * size; i += 1) vectors[i] = matrix[i];
  if (size === 1) {
    checkFinite(vectors[0]);
    values[0] = vectors[0];
    vectors[0] = 1;
    return;
  }
  tridiagonalise(size, vectors, values, workspace.offDiagonal);
  implicitQl(size, vectors, values, workspace.offDiagonal);
}

/**
 * Householder reduction. On return row k of `z` is column k of the orthogonal Q with A = Q T Q', `d` holds the diagonal of T and
 * `e` its sub-diagonal, e[i] between i - 1 and i. The matrix being symmetric, its rows serve as columns throughout.
 */
function tridiagonalise(n: number, z: Float64Array, d: Float64Array, e: Float64Array): void {
  for (let i = n - 1; i > 0; i -= 1) {
    const l = i - 1;
    let h = 0;
    let scale = 0;
    // Element (row i, column k) is z[k * n + i] in this layout.
    if (l > 0) for (let k = 0; k <= l; k += 1) scale += Math.abs(z[k * n + i]);
    if (scale === 0) {
      e[i] = z[l * n + i];
      d[i] = 0;
      continue;
    }
    for (let k = 0; k <= l; k += 1) {
      z[k * n + i] /= scale;
      h += z[k * n + i] * z[k * n + i];
    }
    const f = z[l * n + i];
    const g = f >= 0 ? -Math.sqrt(h) : Math.sqrt(h);
    e[i] = scale * g;
    h -= f * g;
    z[l * n + i] = f - g;
    let sum = 0;
    for (let j = 0; j <= l; j += 1) {
      z[i * n + j] = z[j * n + i] / h;
      let dot = 0;
      for (let k = 0; k <= j; k += 1) dot += z[k * n + j] * z[k * n + i];
      for (let k = j + 1; k <= l; k += 1) dot += z[j * n + k] * z[k * n + i];
      e[j] = dot / h;
      sum += e[j] * z[j * n + i];
    }
    const half = sum / (h + h);
    for (let j = 0; j <= l; j += 1) {
      const fj = z[j * n + i];
      e[j] -= half * fj;
      const gj = e[j];
      for (let k = 0; k <= j; k += 1) z[k * n + j] -= fj * e[k] + gj * z[k * n + i];
    }
    d[i] = h;
  }
  d[0] = 0;
  e[0] = 0;
  for (let i = 0; i < n; i += 1) {
    if (d[i] !== 0) {
      for (let j = 0; j < i; j += 1) {
        let dot = 0;
        for (let k = 0; k < i; k += 1) dot += z[k * n + i] * z[j * n + k];
        for (let k = 0; k < i; k += 1) z[j * n + k] -= dot * z[i * n + k];
      }
    }
    d[i] = z[i * n + i];
    z[i * n + i] = 1;
    for (let j = 0; j < i; j += 1) {
      z[j * n + i] = 0;
      z[i * n + j] = 0;
    }
  }
}

/** Implicit QL with rotations applied to rows k and k + 1 of `z`, which are eigenvectors at the end. */
function implicitQl(n: number, z: Float64Array, d: Float64Array, e: Float64Array): void {
  for (let i = 1; i < n; i += 1) e[i - 1] = e[i];
  e[n - 1] = 0;
  // Against the size of the whole matrix, as tql2 does: beside a zero eigenvalue nothing is small relative to its neighbours.
  let norm = 0;
  for (let i = 0; i < n; i += 1) norm = Math.max(norm, Math.abs(d[i]) + Math.abs(e[i]));
  // One value that is not finite has reached every later row of the tridiagonal form by now.
  checkFinite(norm);
  const negligible = Number.EPSILON * norm;
  for (let l = 0; l < n; l += 1) {
    for (let sweep = 0; ; sweep += 1) {
      let m = l;
      while (m < n - 1 && Math.abs(e[m]) > negligible) m += 1;
      if (m === l) break;
      if (sweep === SWEEPS_MAX) throw new ConvergenceError('QL did not settle', { row: l, sweeps: sweep });
      qlSweep(n, z, d, e, l, m);
    }
  }
}

function checkFinite(norm: number): void {
  if (!Number.isFinite(norm))
    throw new DomainError(`expected a matrix of finite values, got a norm of ${norm}`, { norm });
}

function qlSweep(n: number, z: Float64Array, d: Float64Array, e: Float64Array, l: number, m: number): void {
  let g = (d[l + 1] - d[l]) / (2 * e[l]);
  let r = Math.sqrt(g * g + 1);
  g = d[m] - d[l] + e[l] / (g + (g >= 0 ? r : -r));
  let s = 1;
  let c = 1;
  let p = 0;
  for (let i = m - 1; i >= l; i -= 1) {
    let f = s * e[i];
    const b = c * e[i];
    r = Math.sqrt(f * f + g * g);
    e[i + 1] = r;
    if (r === 0) {
      d[i + 1] -= p;
      e[m] = 0;
      return;
    }
    s = f / r;
    c = g / r;
    g = d[i + 1] - p;
    r = (d[i] - g) * s + 2 * c * b;
    p = s * r;
    d[i + 1] = g + p;
    g = c * r - b;
    const upper = (i + 1) * n;
    const lower = i * n;
    for (let k = 0; k < n; k += 1) {
      f = z[upper + k];
      z[upper + k] = s * z[lower + k] + c * f;
      z[lower + k] = c * z[lower + k] - s * f;
    }
  }
  d[l] -= p;
  e[l] = g;
  e[m] = 0;
}
