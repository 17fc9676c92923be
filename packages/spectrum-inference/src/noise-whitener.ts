import { ConvergenceError } from '@spinassay/numerics';
import type { BinWindow, BinWindows } from './bin-windows.ts';

/**
 * Makes the noise of all windows white and takes the baseline out.
 *
 * Per window the covariance of one component is C = sigma^2 I + eps^2 diag(m) K diag(m): white noise, and a model error in
 * proportion to the local model m, correlated over a few Hz (INTERVALS section 2, row D). C = L L' is banded; a column x
 * becomes (1 - Q Q') L^-1 x, with Q an orthonormal basis of the whitened baseline: the flat-prior baseline marginalised.
 */
export interface NoiseWhitener {
  /** (2 binCount) column, in place. */
  whitenInPlace(column: Float64Array): void;
  /** log |C| over both components plus log |B' C^-1 B| of the complex baseline weights. */
  readonly logDeterminant: number;
}

interface WindowFactor {
  readonly offset: number;
  readonly binCount: number;
  readonly bandwidth: number;
  /** (binCount x (bandwidth + 1)) row k: L[k][k - j] at place j. */
  readonly factor: Float64Array;
  readonly termCount: number;
  /** (termCount x binCount) orthonormal. */
  readonly basis: Float64Array;
}

/** Support of the triangular correlation of the model error, Hz (INTERVALS section 2: support 3 Hz, over a line). */
export const MODEL_ERROR_SUPPORT_HZ = 3;

/** Independent noise of one standard deviation a window: for the search. */
export function createWhiteWhitener(bins: BinWindows, sdPerWindow: Float64Array): NoiseWhitener {
  return assemble(bins, (window, w) => ({
    bandwidth: 0,
    factor: new Float64Array(window.grid.binCount).fill(sdPerWindow[w]),
  }));
}

/** What the noise of every bin is made of, but for eps. */
export interface ProportionalNoise {
  readonly noiseSd: number;
  /** (binCount) rms magnitude of the model about each bin, one component's share. */
  readonly localModel: Float64Array;
}

/**
 * White noise and proportional, correlated model error.
 *
 * @param eps relative size of the model error
 * @throws ConvergenceError when a covariance is not positive definite
 */
export function createProportionalWhitener(bins: BinWindows, noise: ProportionalNoise, eps: number): NoiseWhitener {
  const { noiseSd, localModel } = noise;
  const support = MODEL_ERROR_SUPPORT_HZ / bins.binSpacingHz;
  return assemble(bins, (window) => {
    const bandwidth = eps > 0 ? Math.max(0, Math.ceil(support) - 1) : 0;
    const { binCount } = window.grid;
    const factor = new Float64Array(binCount * (bandwidth + 1));
    for (let k = 0; k < binCount; k += 1) {
      for (let j = 0; j <= Math.min(bandwidth, k); j += 1) {
        const error = eps * eps * localModel[window.offset + k] * localModel[window.offset + k - j];
        factor[k * (bandwidth + 1) + j] = error * (1 - j / support) + (j === 0 ? noiseSd * noiseSd : 0);
      }
    }
    bandedCholeskyInPlace(factor, binCount, bandwidth);
    return { bandwidth, factor };
  });
}

/** Root mean square of the model over bins within half a Hz, per component. */
export function localModelMagnitude(bins: BinWindows, model: Float64Array): Float64Array {
  const reach = Math.max(1, Math.round(0.5 / bins.binSpacingHz));
  const local = new Float64Array(bins.binCount);
  for (const { offset, grid } of bins.windows) {
    for (let k = 0; k < grid.binCount; k += 1) {
      const low = Math.max(0, k - reach);
      const high = Math.min(grid.binCount - 1, k + reach);
      let sum = 0;
      for (let i = offset + low; i <= offset + high; i += 1)
        sum += model[2 * i] * model[2 * i] + model[2 * i + 1] * model[2 * i + 1];
      local[offset + k] = Math.sqrt(sum / (2 * (high - low + 1)));
    }
  }
  return local;
}

function assemble(
  bins: BinWindows,
  factorOf: (window: BinWindow, index: number) => { bandwidth: number; factor: Float64Array },
): NoiseWhitener {
  let logDeterminant = 0;
  const factors = bins.windows.map((window, w): WindowFactor => {
    const { binCount } = window.grid;
    const { bandwidth, factor } = factorOf(window, w);
    // Two components, each log|C| = 2 sum log L_kk.
    for (let k = 0; k < binCount; k += 1) logDeterminant += 4 * Math.log(factor[k * (bandwidth + 1)]);
    const basis = window.baseline.slice();
    for (let term = 0; term < window.baselineTermCount; term += 1) {
      solveRealInPlace(basis.subarray(term * binCount, (term + 1) * binCount), factor, bandwidth);
      logDeterminant += 4 * Math.log(orthonormaliseRow(basis, term, binCount));
    }
    return { offset: window.offset, binCount, bandwidth, factor, termCount: window.baselineTermCount, basis };
  });
  return {
    logDeterminant,
    whitenInPlace(column) {
      for (const factor of factors) whitenWindow(factor, column);
    },
  };
}

function whitenWindow(window: WindowFactor, column: Float64Array): void {
  const { offset, binCount, bandwidth, factor, termCount, basis } = window;
  const width = bandwidth + 1;
  for (let k = 0; k < binCount; k += 1) {
    const place = 2 * (offset + k);
    let re = column[place];
    let im = column[place + 1];
    const reach = Math.min(k, bandwidth);
    for (let j = 1; j <= reach; j += 1) {
      const weight = factor[k * width + j];
      re -= weight * column[place - 2 * j];
      im -= weight * column[place - 2 * j + 1];
    }
    const inverse = 1 / factor[k * width];
    column[place] = re * inverse;
    column[place + 1] = im * inverse;
  }
  for (let term = 0; term < termCount; term += 1) {
    let re = 0;
    let im = 0;
    for (let k = 0; k < binCount; k += 1) {
      const shape = basis[term * binCount + k];
      re += shape * column[2 * (offset + k)];
      im += shape * column[2 * (offset + k) + 1];
    }
    for (let k = 0; k < binCount; k += 1) {
      const shape = basis[term * binCount + k];
      column[2 * (offset + k)] -= re * shape;
      column[2 * (offset + k) + 1] -= im * shape;
    }
  }
}

function solveRealInPlace(row: Float64Array, factor: Float64Array, bandwidth: number): void {
  for (let k = 0; k < row.length; k += 1) {
    let value = row[k];
    for (let j = 1; j <= Math.min(bandwidth, k); j += 1) value -= factor[k * (bandwidth + 1) + j] * row[k - j];
    row[k] = value / factor[k * (bandwidth + 1)];
  }
}

/** Gram-Schmidt, twice for stability; returns the length that was left before scaling, squared root of the pivot. */
function orthonormaliseRow(basis: Float64Array, term: number, binCount: number): number {
  const row = basis.subarray(term * binCount, (term + 1) * binCount);
  for (let pass = 0; pass < 2; pass += 1) {
    for (let other = 0; other < term; other += 1) {
      let dot = 0;
      for (let k = 0; k < binCount; k += 1) dot += row[k] * basis[other * binCount + k];
      for (let k = 0; k < binCount; k += 1) row[k] -= dot * basis[other * binCount + k];
    }
  }
  let square = 0;
  for (let k = 0; k < binCount; k += 1) square += row[k] * row[k];
  const length = Math.sqrt(square);
  for (let k = 0; k < binCount; k += 1) row[k] /= length;
  return length;
}

/** Cholesky of a banded symmetric matrix, lower rows as in WindowFactor.factor. */
function bandedCholeskyInPlace(rows: Float64Array, size: number, bandwidth: number): void {
  const width = bandwidth + 1;
  for (let k = 0; k < size; k += 1) {
    for (let j = Math.min(bandwidth, k); j >= 0; j -= 1) {
      // Element (k, k - j): subtract the products of the parts of rows k and k - j to the left of it.
      let value = rows[k * width + j];
      const reach = Math.min(bandwidth, k) - j;
      for (let i = 1; i <= reach && i + j <= bandwidth; i += 1) {
        if (i > Math.min(bandwidth, k - j)) break;
        value -= rows[k * width + j + i] * rows[(k - j) * width + i];
      }
      if (j > 0) rows[k * width + j] = value / rows[(k - j) * width];
      else if (value > 0) rows[k * width] = Math.sqrt(value);
      else throw new ConvergenceError(`expected a positive definite noise covariance, got pivot ${value} at bin ${k}`);
    }
  }
}
