import { addComponentSignal, type GeneratedComponent, type GeneratedSampling } from './component-signal.ts';
import { addWhiteNoise, applyShim, digitise, type ShimCopy, spoilFirstSamples } from './faults.ts';
import { createSeededDraws } from './seeded-draws.ts';

/** A whole measurement: what is in the tube, how it is sampled, and what goes wrong. */
export interface GeneratedMeasurement extends GeneratedSampling {
  readonly components: readonly GeneratedComponent[];
  readonly phaseRadians: number;
  /** sd of each component of each sample; 0: no noise. */
  readonly noiseSdPerComponent: number;
  readonly seed: number;
  readonly shim?: readonly ShimCopy[];
  /** Shares of the rms signal by which the first samples are off. */
  readonly firstSampleErrors?: readonly number[];
  /** Full scale of the converter, counts; absent: not digitised. */
  readonly fullScaleCounts?: number;
}

/**
 * A FID made step by step in time, by a way that shares nothing with what fits it. Conventions: S(t) ~ exp(+2 pi i nu t), a
 * positive offset is a higher ppm; H = sum nu I_z + sum J I.I in Hz.
 *
 * @returns (2 sampleCount) interleaved
 */
export function generateSignal(measurement: GeneratedMeasurement): Float64Array {
  const { sampleCount, phaseRadians, noiseSdPerComponent } = measurement;
  const draws = createSeededDraws(measurement.seed);
  const signal = new Float64Array(2 * sampleCount);
  for (const component of measurement.components) addComponentSignal(component, measurement, signal);
  turnPhase(signal, phaseRadians);
  if (measurement.shim !== undefined) applyShim(signal, measurement.shim, measurement);
  if (measurement.firstSampleErrors !== undefined) spoilFirstSamples(signal, measurement.firstSampleErrors, draws);
  if (noiseSdPerComponent > 0) addWhiteNoise(signal, noiseSdPerComponent, draws);
  if (measurement.fullScaleCounts !== undefined) digitise(signal, measurement.fullScaleCounts);
  return signal;
}

function turnPhase(signal: Float64Array, phaseRadians: number): void {
  const cos = Math.cos(phaseRadians);
  const sin = Math.sin(phaseRadians);
  for (let n = 0; n < signal.length; n += 2) {
    const re = signal[n];
    signal[n] = re * cos - signal[n + 1] * sin;
    signal[n + 1] = re * sin + signal[n + 1] * cos;
  }
}
