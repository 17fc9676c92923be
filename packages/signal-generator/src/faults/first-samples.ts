import type { SeededDraws } from '../seeded-draws.ts';

/** How many samples the rms is taken over: where the signal of every line is still there. */
const RMS_SAMPLE_COUNT = 1024;

/**
 * The transient of a digital filter, in place: sample n is off by shares[n] of the rms of the first samples, at a random phase.
 *
 * @param shares one per spoiled sample from the first on; measured ones are near 1, then 0.2, then fall to 0.03 by the sixteenth
 */
export function spoilFirstSamples(signal: Float64Array, shares: readonly number[], draws: SeededDraws): void {
  const count = Math.min(RMS_SAMPLE_COUNT, signal.length / 2);
  let square = 0;
  for (const value of signal.subarray(0, 2 * count)) square += value * value;
  const rms = Math.sqrt(square / count);
  shares.forEach((share, n) => {
    const angle = draws.uniform(0, 2 * Math.PI);
    signal[2 * n] += share * rms * Math.cos(angle);
    signal[2 * n + 1] += share * rms * Math.sin(angle);
  });
}
