import type { SeededDraws } from './seeded-draws.ts';

/** White complex Gaussian noise of the given sd per component, in place. */
export function addWhiteNoise(signal: Float64Array, sdPerComponent: number, draws: SeededDraws): void {
  for (let i = 0; i < signal.length; i += 1) signal[i] += sdPerComponent * draws.normal();
}

/** A part of the sample in a field that is off: a copy of every line, shifted and broadened. */
export interface ShimCopy {
  readonly share: number;
  readonly offsetHz: number;
  readonly extraDecayPerSecond: number;
}

/** Multiply the FID by (1 - sum share) + sum share exp((2 pi i offset - extra) t): one lineshape error for all lines, in place. */
export function applyShim(
  signal: Float64Array,
  copies: readonly ShimCopy[],
  sampling: { readonly dwellSeconds: number; readonly timeZeroSamples: number },
): void {
  const rest = 1 - copies.reduce((sum, copy) => sum + copy.share, 0);
  for (let n = 0; n < signal.length / 2; n += 1) {
    const seconds = (n - sampling.timeZeroSamples) * sampling.dwellSeconds;
    let re = rest;
    let im = 0;
    for (const { share, offsetHz, extraDecayPerSecond } of copies) {
      const size = share * Math.exp(-extraDecayPerSecond * seconds);
      re += size * Math.cos(2 * Math.PI * offsetHz * seconds);
      im += size * Math.sin(2 * Math.PI * offsetHz * seconds);
    }
    const value = signal[2 * n];
    signal[2 * n] = value * re - signal[2 * n + 1] * im;
    signal[2 * n + 1] = value * im + signal[2 * n + 1] * re;
  }
}

/** The transient of a digital filter: the first samples are off by a falling share of the rms signal (REAL-DATA section 2), in place. */
export function spoilFirstSamples(signal: Float64Array, shares: readonly number[], draws: SeededDraws): void {
  let square = 0;
  for (const value of signal.subarray(0, 2048)) square += value * value;
  const rms = Math.sqrt((2 * square) / Math.min(2048, signal.length));
  shares.forEach((share, n) => {
    const angle = draws.uniform(0, 2 * Math.PI);
    signal[2 * n] += share * rms * Math.cos(angle);
    signal[2 * n + 1] += share * rms * Math.sin(angle);
  });
}

/** Round to whole counts and hold at the converter's full scale, in place. Returns how many components were clipped. */
export function digitise(signal: Float64Array, fullScaleCounts: number): number {
  let clipped = 0;
  for (let i = 0; i < signal.length; i += 1) {
    const count = Math.round(signal[i]);
    if (Math.abs(count) > fullScaleCounts) clipped += 1;
    signal[i] = Math.max(-fullScaleCounts, Math.min(fullScaleCounts, count));
  }
  return clipped;
}
