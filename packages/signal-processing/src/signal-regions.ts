import type { TaperedSpectrum } from './tapered-spectrum.ts';

/** A stretch of the spectrum that holds something beyond noise. */
export interface SignalRegion {
  readonly lowHz: number;
  readonly highHz: number;
  readonly peakHz: number;
  /** Largest magnitude over the noise of one component. */
  readonly peakOverNoise: number;
  /** sum over bins of |bin|^2 / (2 sigma^2), less the count of bins: energy beyond noise. */
  readonly excessEnergy: number;
}

/**
 * Find the stretches whose bins rise above a threshold; those closer than `gapHz` are one.
 *
 * @param threshold in units of the noise of one component; for pure noise a bin exceeds it with chance exp(-threshold^2 / 2)
 */
export function signalRegions(
  spectrum: TaperedSpectrum,
  noiseSd: number,
  options: { threshold: number; gapHz: number },
): SignalRegion[] {
  const regions: SignalRegion[] = [];
  let open: { low: number; high: number; peak: number; size: number; energy: number } | undefined;
  const close = (): void => {
    if (open === undefined) return;
    regions.push({
      lowHz: spectrum.frequencyHz[open.low],
      highHz: spectrum.frequencyHz[open.high],
      peakHz: spectrum.frequencyHz[open.peak],
      peakOverNoise: open.size,
      excessEnergy: open.energy,
    });
    open = undefined;
  };
  for (let place = 0; place < spectrum.binCount; place += 1) {
    const size = Math.hypot(spectrum.bins[2 * place], spectrum.bins[2 * place + 1]) / noiseSd;
    if (!(size > options.threshold)) continue;
    if (open !== undefined && spectrum.frequencyHz[place] - spectrum.frequencyHz[open.high] > options.gapHz) close();
    open ??= { low: place, high: place, peak: place, size: 0, energy: 0 };
    open.high = place;
    open.energy += (size * size) / 2 - 1;
    if (size > open.size) {
      open.size = size;
      open.peak = place;
    }
  }
  close();
  return regions;
}
