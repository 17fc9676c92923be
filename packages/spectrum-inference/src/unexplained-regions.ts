import { type SignalRegion, signalRegions, taperedSpectrum } from '@spinassay/signal-processing';

/** Signal that neither the model nor an excluded region accounts for. */
export interface UnexplainedRegion {
  readonly lowHz: number;
  readonly highHz: number;
  /** Largest bin over the noise and the allowed model error there. */
  readonly significanceSigma: number;
}

/** A tapered bin beyond this many sd is signal: among 65,000 bins of noise alone one in 1,000 spectra shows such a bin. */
const THRESHOLD_SIGMA = 6;
/** The model may be wrong by this share of itself without being called incomplete (REAL-DATA step 13). */
const MODEL_ERROR_SHARE = 0.05;
/** The allowance reaches this far about the model's own lines, Hz: the feet of a shim error (INTERVALS section 2: 3 Hz). */
const ALLOWANCE_REACH_HZ = 4;
/** Stretches closer than this are reported as one. */
const GAP_HZ = 10;

/**
 * Look for signal the model leaves over, all over the spectrum: the residual FID under the four-term taper, bin by bin,
 * against noise and a share of the local model.
 *
 * @param residual (2 sampleCount) interleaved FID less model
 * @param model (2 sampleCount) interleaved model FID
 * @param isExcluded true for frequencies that are nobody's to explain
 */
export function unexplainedRegions(
  residual: Float64Array,
  model: Float64Array,
  at: { firstSampleIndex: number; dwellSeconds: number; noiseSd: number },
  isExcluded: (frequencyHz: number) => boolean,
): UnexplainedRegion[] {
  const left = taperedSpectrum(residual, at.firstSampleIndex, at.dwellSeconds);
  const known = taperedSpectrum(model, at.firstSampleIndex, at.dwellSeconds);
  const reach = Math.max(1, Math.round(ALLOWANCE_REACH_HZ / known.binSpacingHz));
  const allowance = runningMaximum(magnitudes(known.bins), reach);
  const relative = new Float64Array(left.bins.length);
  for (let place = 0; place < left.binCount; place += 1) {
    if (isExcluded(left.frequencyHz[place])) continue;
    const sd = Math.hypot(at.noiseSd, MODEL_ERROR_SHARE * allowance[place]);
    relative[2 * place] = left.bins[2 * place] / sd;
    relative[2 * place + 1] = left.bins[2 * place + 1] / sd;
  }
  return signalRegions({ ...left, bins: relative }, 1, { threshold: THRESHOLD_SIGMA, gapHz: GAP_HZ }).map(toRegion);
}

function toRegion({ lowHz, highHz, peakOverNoise }: SignalRegion): UnexplainedRegion {
  return { lowHz, highHz, significanceSigma: peakOverNoise };
}

function magnitudes(bins: Float64Array): Float64Array {
  return Float64Array.from({ length: bins.length / 2 }, (_, k) => Math.hypot(bins[2 * k], bins[2 * k + 1]));
}

function runningMaximum(values: Float64Array, reach: number): Float64Array {
  return values.map((_, k) => {
    let largest = 0;
    for (let i = Math.max(0, k - reach); i <= Math.min(values.length - 1, k + reach); i += 1) {
      largest = Math.max(largest, values[i]);
    }
    return largest;
  });
}
