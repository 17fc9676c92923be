import { type BinGrid, createBinGrid, legendreBaseline } from '@spinassay/signal-processing';

/** One window: a run of bins with its baseline shapes. */
export interface BinWindow {
  readonly lowHz: number;
  readonly highHz: number;
  readonly grid: BinGrid;
  /** Bin of the whole spectrum that the window starts with; negative ones count from the end. */
  readonly firstBin: number;
  /** Place of the window's first bin among the bins of all windows. */
  readonly offset: number;
  readonly baselineTermCount: number;
  /** (baselineTermCount x binCount) row-major Legendre shapes. */
  readonly baseline: Float64Array;
}

/** All windows of one spectrum, one after the other in one column of complex bins. */
export interface BinWindows {
  readonly windows: readonly BinWindow[];
  readonly binCount: number;
  readonly binSpacingHz: number;
  /** Lines of less weight, in protons, are left out of these bins. */
  readonly lineWeightMin: number;
  /** Lines further from a window than this are left to its baseline, Hz. */
  readonly valueReachHz: number;
  /** n0: index in the FID of the first sample used. */
  readonly firstSampleIndex: number;
  /** (2 binCount) interleaved data. */
  readonly data: Float64Array;
}

export interface WindowRange {
  readonly lowHz: number;
  readonly highHz: number;
  readonly baselineTermCount: number;
}

/** How the spectrum was sampled; see BinGrid. */
export interface SpectrumSampling {
  readonly sampleCount: number;
  readonly dwellSeconds: number;
  readonly firstSampleIndex: number;
  readonly softWindowPerSecond: number;
  readonly lineWeightMin: number;
  /** See BinWindows. */
  readonly valueReachHz: number;
}

/**
 * Cut windows out of a spectrum.
 *
 * @param spectrum (2 sampleCount) interleaved unitary DFT bins
 * @param ranges disjoint, in rising order, inside the spectral width
 */
export function cutBinWindows(
  spectrum: Float64Array,
  sampling: SpectrumSampling,
  ranges: readonly WindowRange[],
): BinWindows {
  const { sampleCount, dwellSeconds } = sampling;
  const spacing = 1 / (sampleCount * dwellSeconds);
  const windows: BinWindow[] = [];
  let offset = 0;
  for (const range of ranges) {
    const firstBin = Math.ceil(range.lowHz / spacing);
    const binCount = Math.floor(range.highHz / spacing) - firstBin + 1;
    const terms = Math.max(0, Math.min(range.baselineTermCount, Math.floor(binCount / 2)));
    if (binCount < 1) continue;
    windows.push({
      lowHz: range.lowHz,
      highHz: range.highHz,
      grid: createBinGrid({ firstBin, binCount, ...sampling }),
      firstBin,
      offset,
      baselineTermCount: terms,
      baseline: legendreBaseline(binCount, terms),
    });
    offset += binCount;
  }
  const { firstSampleIndex, lineWeightMin, valueReachHz } = sampling;
  const bins = { windows, binCount: offset, binSpacingHz: spacing, firstSampleIndex, lineWeightMin, valueReachHz };
  return { ...bins, data: pickBins(bins, spectrum) };
}

/** The bins of all windows, picked from a whole spectrum: (2 binCount). */
export function pickBins(bins: Pick<BinWindows, 'windows' | 'binCount'>, spectrum: Float64Array): Float64Array {
  const sampleCount = spectrum.length / 2;
  const picked = new Float64Array(2 * bins.binCount);
  for (const { offset, firstBin, grid } of bins.windows) {
    for (let k = 0; k < grid.binCount; k += 1) {
      const bin = (((firstBin + k) % sampleCount) + sampleCount) % sampleCount;
      picked[2 * (offset + k)] = spectrum[2 * bin];
      picked[2 * (offset + k) + 1] = spectrum[2 * bin + 1];
    }
  }
  return picked;
}
