import { DomainError, median, quantile } from '@spinassay/numerics';
import type { TaperedSpectrum } from './tapered-spectrum.ts';

/** Width of the running median that decides whether a place is quiet. Measured: narrower ones follow multiplets. */
const QUIET_WIDTH_HZ = 60;
/** A place is quiet when its running median power is below this multiple of the lower quartile of all of them. */
const QUIET_FACTOR = 1.35;
/** Median of an exponential variate of unit mean: |noise|^2 of one complex bin. */
const EXPONENTIAL_MEDIAN = Math.LN2;
/** Fewer quiet bins than this say nothing. */
const QUIET_BINS_MIN = 64;

/** White-noise level of a signal, from the quiet bins of its tapered spectrum. */
export interface NoiseEstimate {
  readonly sdPerComponent: number;
  readonly quietBinCount: number;
  /** Largest over smallest level among eight parts of the spectrum that have quiet bins: filter roll-off shows here. */
  readonly flatnessRatio: number;
}

/**
 * Estimate the noise from signal-free bins. The tail of the FID is not used: on measured files it was up to 100 times too high.
 *
 * @throws DomainError when fewer than 64 quiet bins are found
 */
export function estimateNoise(spectrum: TaperedSpectrum): NoiseEstimate {
  const power = binPower(spectrum);
  const runningMedian = blockMedians(power, Math.max(8, Math.round(QUIET_WIDTH_HZ / spectrum.binSpacingHz)));
  const limit = QUIET_FACTOR * quantile(runningMedian, 0.25);
  const parts: number[][] = Array.from({ length: 8 }, () => []);
  const quiet: number[] = [];
  for (let place = 0; place < power.length; place += 1) {
    if (runningMedian[place] > limit) continue;
    quiet.push(power[place]);
    parts[Math.floor((8 * place) / power.length)].push(power[place]);
  }
  if (quiet.length < QUIET_BINS_MIN)
    throw new DomainError(`expected at least ${QUIET_BINS_MIN} quiet bins, got ${quiet.length}`);
  const levels = parts.filter((part) => part.length >= QUIET_BINS_MIN).map(sdFromPowers);
  return {
    sdPerComponent: sdFromPowers(quiet),
    quietBinCount: quiet.length,
    flatnessRatio: levels.length > 1 ? Math.max(...levels) / Math.min(...levels) : 1,
  };
}

function sdFromPowers(powers: readonly number[]): number {
  return Math.sqrt(median(powers) / (2 * EXPONENTIAL_MEDIAN));
}

function binPower(spectrum: TaperedSpectrum): Float64Array {
  const power = new Float64Array(spectrum.binCount);
  for (let place = 0; place < power.length; place += 1) {
    const re = spectrum.bins[2 * place];
    const im = spectrum.bins[2 * place + 1];
    power[place] = re * re + im * im;
  }
  return power;
}

/** The median of the block of `width` bins about each place, refreshed every eighth of a block: neighbours share it. */
function blockMedians(power: Float64Array, width: number): Float64Array {
  const stride = Math.max(1, Math.floor(width / 8));
  const medians = new Float64Array(power.length);
  for (let start = 0; start < power.length; start += stride) {
    const centre = start + stride / 2;
    const low = Math.max(0, Math.min(power.length - width, Math.round(centre - width / 2)));
    const value = median(power.subarray(low, Math.min(power.length, low + width)));
    medians.fill(value, start, Math.min(power.length, start + stride));
  }
  return medians;
}
