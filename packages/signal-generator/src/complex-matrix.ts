/** Dense complex matrices, row-major and interleaved: [re, im] per element. Written for this room alone, so that nothing is shared with what fits. */
export interface ComplexMatrix {
  readonly rows: number;
  readonly columns: number;
  readonly data: Float64Array;
}

/** A matrix of zeros. */
export function zeroMatrix(rows: number, columns: number): ComplexMatrix {
  return { rows, columns, data: new Float64Array(2 * rows * columns) };
}

/** out = a b; out must not share memory with a or b. */
export function multiplyInto(a: ComplexMatrix, b: ComplexMatrix, out: ComplexMatrix): void {
  out.data.fill(0);
  for (let i = 0; i < a.rows; i += 1) {
    for (let k = 0; k < a.columns; k += 1) {
      const re = a.data[2 * (i * a.columns + k)];
      const im = a.data[2 * (i * a.columns + k) + 1];
      if (re === 0 && im === 0) continue;
      for (let j = 0; j < b.columns; j += 1) {
        const bRe = b.data[2 * (k * b.columns + j)];
        const bIm = b.data[2 * (k * b.columns + j) + 1];
        out.data[2 * (i * out.columns + j)] += re * bRe - im * bIm;
        out.data[2 * (i * out.columns + j) + 1] += re * bIm + im * bRe;
      }
    }
  }
}

/** The conjugate transpose. */
export function adjoint(a: ComplexMatrix): ComplexMatrix {
  const out = zeroMatrix(a.columns, a.rows);
  for (let i = 0; i < a.rows; i += 1) {
    for (let j = 0; j < a.columns; j += 1) {
      out.data[2 * (j * a.rows + i)] = a.data[2 * (i * a.columns + j)];
      out.data[2 * (j * a.rows + i) + 1] = -a.data[2 * (i * a.columns + j) + 1];
    }
  }
  return out;
}

/** Terms of the series once the norm is below 1/2: 2^-18 / 18! is below rounding. */
const TAYLOR_TERMS = 18;

/**
 * exp(-i angle H) of a real symmetric H by scaling and squaring of the Taylor series: no diagonalisation.
 *
 * @param hamiltonian (size x size) row-major, real
 * @source Moler & Van Loan, SIAM Review 45 (2003) 3, method 3
 */
export function propagator(size: number, hamiltonian: Float64Array, angle: number): ComplexMatrix {
  let norm = 0;
  for (let i = 0; i < size; i += 1) {
    let row = 0;
    for (let j = 0; j < size; j += 1) row += Math.abs(hamiltonian[i * size + j] * angle);
    norm = Math.max(norm, row);
  }
  let halvings = 0;
  for (let scaled = norm; scaled > 0.5; scaled /= 2) halvings += 1;
  let step = angle;
  for (let h = 0; h < halvings; h += 1) step /= 2;
  const generator = zeroMatrix(size, size);
  for (let i = 0; i < size * size; i += 1) generator.data[2 * i + 1] = -step * hamiltonian[i];
  let sum = identity(size);
  let term = identity(size);
  for (let n = 1; n <= TAYLOR_TERMS; n += 1) {
    const next = zeroMatrix(size, size);
    multiplyInto(term, generator, next);
    for (let i = 0; i < next.data.length; i += 1) {
      next.data[i] /= n;
      sum.data[i] += next.data[i];
    }
    term = next;
  }
  for (let h = 0; h < halvings; h += 1) {
    const square = zeroMatrix(size, size);
    multiplyInto(sum, sum, square);
    sum = square;
  }
  return sum;
}

function identity(size: number): ComplexMatrix {
  const out = zeroMatrix(size, size);
  for (let i = 0; i < size; i += 1) out.data[2 * (i * size + i)] = 1;
  return out;
}
