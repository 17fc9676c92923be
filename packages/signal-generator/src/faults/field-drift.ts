import type { GeneratedSampling } from '../component-signal.ts';

/** A field that does not stand still. Over a ppm range of protons all lines move by nearly the same Hz: one envelope for all. */
export interface FieldDrift {
  /** Within one acquisition all lines move at this rate. */
  readonly hertzPerSecond: number;
  /** Over the summed scans their place runs evenly over a range of this width, centred on the declared one; >= 0. */
  readonly scanRangeHz: number;
}

/**
 * Multiply the FID by exp(pi i rate t^2) sin(pi range t) / (pi range t), in place; t counts from time zero.
 *
 * The first factor is the phase of a frequency that moves, the second the mean of exp(2 pi i f t) over f even in +-range/2 (many
 * scans); both are elementary integrals.
 */
export function applyFieldDrift(
  signal: Float64Array,
  { hertzPerSecond, scanRangeHz }: FieldDrift,
  { dwellSeconds, timeZeroSamples }: GeneratedSampling,
): void {
  for (let n = 0; n < signal.length / 2; n += 1) {
    const seconds = (n - timeZeroSamples) * dwellSeconds;
    const phase = Math.PI * hertzPerSecond * seconds * seconds;
    const half = Math.PI * scanRangeHz * seconds;
    const size = half === 0 ? 1 : Math.sin(half) / half;
    const re = size * Math.cos(phase);
    const im = size * Math.sin(phase);
    const value = signal[2 * n];
    signal[2 * n] = value * re - signal[2 * n + 1] * im;
    signal[2 * n + 1] = value * im + signal[2 * n + 1] * re;
  }
}
