import { discreteFourierTransform } from '@spinassay/numerics';
import { binFrequencyHz } from './conventions.ts';
import { fourTermTaper } from './four-term-taper.ts';

/** A leakage-suppressed power spectrum in rising frequency: for noise and for finding signals, never for amounts. */
export interface TaperedSpectrum {
  /** (binCount) Hz from the carrier, rising. */
  readonly frequencyHz: Float64Array;
  /** (binCount) interleaved complex bins, scaled so that white noise keeps its standard deviation per component. */
  readonly bins: Float64Array;
  readonly binCount: number;
  readonly binSpacingHz: number;
}

/** Transform the samples from `firstSampleIndex` on under the four-term taper. */
export function taperedSpectrum(
  samples: Float64Array,
  firstSampleIndex: number,
  dwellSeconds: number,
): TaperedSpectrum {
  const binCount = samples.length / 2 - firstSampleIndex;
  const taper = fourTermTaper(binCount);
  let energy = 0;
  for (const weight of taper) energy += weight * weight;
  const scale = 1 / Math.sqrt(energy);
  const stretch = samples.slice(2 * firstSampleIndex);
  for (let n = 0; n < binCount; n += 1) {
    stretch[2 * n] *= scale * taper[n];
    stretch[2 * n + 1] *= scale * taper[n];
  }
  const transformed = discreteFourierTransform(stretch);
  const frequencyHz = new Float64Array(binCount);
  const bins = new Float64Array(2 * binCount);
  const firstNegative = Math.ceil(binCount / 2);
  for (let place = 0; place < binCount; place += 1) {
    const bin = (place + firstNegative) % binCount;
    frequencyHz[place] = binFrequencyHz(bin, binCount, dwellSeconds);
    bins[2 * place] = transformed[2 * bin];
    bins[2 * place + 1] = transformed[2 * bin + 1];
  }
  return { frequencyHz, bins, binCount, binSpacingHz: 1 / (binCount * dwellSeconds) };
}
