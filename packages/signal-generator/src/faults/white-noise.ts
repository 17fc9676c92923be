import type { SeededDraws } from '../seeded-draws.ts';

/** White complex Gaussian noise, in place: each component of each sample gets a draw of its own of the given sd. */
export function addWhiteNoise(signal: Float64Array, sdPerComponent: number, draws: SeededDraws): void {
  for (let i = 0; i < signal.length; i += 1) signal[i] += sdPerComponent * draws.normal();
}
