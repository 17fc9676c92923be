import { createRandomStream } from '@spinassay/numerics';
import { CholeskyDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { cutBinWindows } from './bin-windows.ts';
import { createProportionalWhitener, localModelMagnitude, MODEL_ERROR_SUPPORT_HZ } from './noise-whitener.ts';
import { dot } from './spectrum-fit.ts';

const random = createRandomStream({ seed: 11n, purpose: 'whitener test' });
const sampling = {
  sampleCount: 1000,
  dwellSeconds: 1 / 700,
  firstSampleIndex: 16,
  softWindowPerSecond: 0,
  lineWeightMin: 0,
  valueReachHz: 1e9,
};
const spectrum = Float64Array.from({ length: 2000 }, () => random.nextNormal());
const bins = cutBinWindows(spectrum, sampling, [
  { lowHz: -20, highHz: 3, baselineTermCount: 2 },
  { lowHz: 40, highHz: 61, baselineTermCount: 3 },
]);
const local = Float64Array.from({ length: bins.binCount }, (_, k) => 5 + 4 * Math.sin(k / 3));
const SIGMA = 0.7;
const EPS = 0.2;

/** The slow, obvious way: dense covariance, dense generalised least squares of the baseline. */
function denseChiSquare(column: Float64Array): { chiSquare: number; logDeterminant: number } {
  let chiSquare = 0;
  let logDeterminant = 0;
  for (const window of bins.windows) {
    const n = window.grid.binCount;
    const covariance = Matrix.zeros(n, n);
    for (let i = 0; i < n; i += 1) {
      for (let j = 0; j < n; j += 1) {
        const correlation = Math.max(0, 1 - (Math.abs(i - j) * bins.binSpacingHz) / MODEL_ERROR_SUPPORT_HZ);
        const size = local[window.offset + Math.min(i, j)] * local[window.offset + Math.max(i, j)];
        covariance.set(i, j, EPS * EPS * size * correlation + (i === j ? SIGMA * SIGMA : 0));
      }
    }
    const cholesky = new CholeskyDecomposition(covariance);
    const basis = new Matrix(
      Array.from({ length: n }, (_, k) =>
        Array.from({ length: window.baselineTermCount }, (__, term) => window.baseline[term * n + k]),
      ),
    );
    const inner = basis.transpose().mmul(cholesky.solve(basis));
    // Rounding leaves the product a last bit off symmetry.
    inner.add(inner.transpose()).mul(0.5);
    const innerCholesky = new CholeskyDecomposition(inner);
    for (let component = 0; component < 2; component += 1) {
      const data = Matrix.columnVector(
        Array.from({ length: n }, (_, k) => column[2 * (window.offset + k) + component]),
      );
      const solved = cholesky.solve(data);
      const projected = basis.transpose().mmul(solved);
      chiSquare +=
        data.transpose().mmul(solved).get(0, 0) - projected.transpose().mmul(innerCholesky.solve(projected)).get(0, 0);
      logDeterminant += 2 * cholesky.lowerTriangularMatrix.diagonal().reduce((sum, x) => sum + Math.log(x), 0);
      logDeterminant += 2 * innerCholesky.lowerTriangularMatrix.diagonal().reduce((sum, x) => sum + Math.log(x), 0);
    }
  }
  return { chiSquare, logDeterminant };
}

describe('createProportionalWhitener', () => {
  it('gives the chi-square and determinant of the dense covariance with the baseline marginalised', () => {
    const whitener = createProportionalWhitener(bins, { noiseSd: SIGMA, localModel: local }, EPS);
    const column = bins.data.slice();
    whitener.whitenInPlace(column);
    const dense = denseChiSquare(bins.data);
    expect(dot(column, column)).toBeCloseTo(dense.chiSquare, 8);
    expect(whitener.logDeterminant).toBeCloseTo(dense.logDeterminant, 8);
  });

  it('takes any baseline of its own shapes out whole', () => {
    const whitener = createProportionalWhitener(bins, { noiseSd: SIGMA, localModel: local }, EPS);
    const column = new Float64Array(2 * bins.binCount);
    for (const window of bins.windows) {
      for (let k = 0; k < window.grid.binCount; k += 1) {
        for (let term = 0; term < window.baselineTermCount; term += 1) {
          column[2 * (window.offset + k)] += (term + 2) * window.baseline[term * window.grid.binCount + k];
          column[2 * (window.offset + k) + 1] -= (3 - term) * window.baseline[term * window.grid.binCount + k];
        }
      }
    }
    const size = dot(column, column);
    whitener.whitenInPlace(column);
    expect(dot(column, column)).toBeLessThan(1e-20 * size);
  });

  it('has the local magnitude of a constant model equal to that constant', () => {
    const constant = new Float64Array(2 * bins.binCount).fill(3);
    expect(Math.max(...localModelMagnitude(bins, constant).map((m) => Math.abs(m - 3)))).toBeLessThan(1e-12);
  });
});
