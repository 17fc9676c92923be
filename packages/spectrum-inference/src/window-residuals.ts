import type { BinWindows } from './bin-windows.ts';
import { createWhiteWhitener } from './noise-whitener.ts';

export interface WindowResidual {
  readonly lowHz: number;
  readonly highHz: number;
  readonly binCount: number;
  readonly baselineTermCount: number;
  /** |data - model - baseline| / |data - baseline| over the window's bins. */
  readonly residualFraction: number;
  /** |data - model - baseline|^2 over the noise, per degree of freedom. */
  readonly reducedChiSquare: number;
}

/**
 * How well the model explains each window, the baseline being the least-squares one of data less model.
 *
 * @param residual (2 binCount) data less model
 */
export function windowResiduals(bins: BinWindows, residual: Float64Array, noiseSd: number): WindowResidual[] {
  const flat = createWhiteWhitener(bins, new Float64Array(bins.windows.length).fill(1));
  const left = residual.slice();
  flat.whitenInPlace(left);
  return bins.windows.map(({ lowHz, highHz, offset, grid, baselineTermCount }) => {
    let residualSquare = 0;
    let dataSquare = 0;
    for (let k = 2 * offset; k < 2 * (offset + grid.binCount); k += 1) {
      residualSquare += left[k] * left[k];
      const signal = bins.data[k] - (residual[k] - left[k]);
      dataSquare += signal * signal;
    }
    const freedom = Math.max(1, 2 * (grid.binCount - baselineTermCount));
    return {
      lowHz,
      highHz,
      binCount: grid.binCount,
      baselineTermCount,
      residualFraction: Math.sqrt(residualSquare / dataSquare),
      reducedChiSquare: residualSquare / freedom / (noiseSd * noiseSd),
    };
  });
}
