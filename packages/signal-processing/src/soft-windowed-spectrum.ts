import { DimensionError, DomainError, discreteFourierTransform, type FourierPlan } from '@spinassay/numerics';

/** Which samples of a signal are transformed, and the soft window laid over them (0 for statistics). */
export interface SpectrumRequest {
  readonly firstSampleIndex: number;
  readonly sampleCount: number;
  readonly dwellSeconds: number;
  /** The sample at time t after the first one is weighted by exp(-softWindowPerSecond t). */
  readonly softWindowPerSecond: number;
}

/**
 * The unitary DFT of a stretch of a signal, not apodised but for the soft window of a search.
 *
 * @param samples interleaved complex signal
 * @param plan of sampleCount, where many stretches of one length are transformed
 * @returns (2 sampleCount) interleaved bins; see conventions.ts
 * @throws DimensionError when the stretch leaves the signal; DomainError when a time is not positive
 */
export function softWindowedSpectrum(
  samples: Float64Array,
  request: SpectrumRequest,
  plan?: FourierPlan,
): Float64Array {
  const { firstSampleIndex, sampleCount, dwellSeconds, softWindowPerSecond } = request;
  if (firstSampleIndex < 0 || sampleCount < 1 || 2 * (firstSampleIndex + sampleCount) > samples.length) {
    throw new DimensionError(
      `expected samples ${firstSampleIndex} to ${firstSampleIndex + sampleCount} inside a signal of ${samples.length / 2}`,
    );
  }
  if (!(dwellSeconds > 0)) throw new DomainError(`expected dwellSeconds > 0, got ${dwellSeconds}`);
  if (!(softWindowPerSecond >= 0)) {
    throw new DomainError(`expected softWindowPerSecond >= 0, got ${softWindowPerSecond}`);
  }
  const stretch = samples.slice(2 * firstSampleIndex, 2 * (firstSampleIndex + sampleCount));
  const scale = 1 / Math.sqrt(sampleCount);
  for (let n = 0; n < sampleCount; n += 1) {
    const weight = scale * Math.exp(-softWindowPerSecond * n * dwellSeconds);
    stretch[2 * n] *= weight;
    stretch[2 * n + 1] *= weight;
  }
  return plan === undefined ? discreteFourierTransform(stretch) : plan.transform(stretch);
}
