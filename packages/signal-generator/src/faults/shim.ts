import type { GeneratedSampling } from '../component-signal.ts';

/** A part of the sample in a field that is off: a copy of every line, shifted and broadened. */
export interface ShimCopy {
  /** Part of the sample, 0 to 1; what the copies leave stands in the right field. */
  readonly share: number;
  readonly offsetHz: number;
  readonly extraDecayPerSecond: number;
}

/** Multiply the FID by (1 - sum share) + sum share exp((2 pi i offset - extra) t): one lineshape error for all lines, in place. */
export function applyShim(
  signal: Float64Array,
  copies: readonly ShimCopy[],
  { dwellSeconds, timeZeroSamples }: GeneratedSampling,
): void {
  const rest = 1 - copies.reduce((sum, copy) => sum + copy.share, 0);
  for (let n = 0; n < signal.length / 2; n += 1) {
    const seconds = (n - timeZeroSamples) * dwellSeconds;
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
