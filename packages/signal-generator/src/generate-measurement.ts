import { checkMeasurement } from './check-measurement.ts';
import { addComponentSignal, type GeneratedSampling } from './component-signal.ts';
import { digitise } from './faults/digitise.ts';
import { applyFieldDrift } from './faults/field-drift.ts';
import { spoilFirstSamples } from './faults/first-samples.ts';
import { feedBack, type RadiationDamping } from './faults/radiation-damping.ts';
import { addReceiverOffset } from './faults/receiver-offset.ts';
import { applyShim } from './faults/shim.ts';
import { unknownLineComponent } from './faults/unknown-line.ts';
import { addWhiteNoise } from './faults/white-noise.ts';
import { type GeneratedComponent, isotopologuesOf } from './isotopologues.ts';
import { createSeededDraws } from './seeded-draws.ts';
import type { SignalFaults } from './signal-faults.ts';

/** A whole measurement: what is in the tube, how it is sampled, and what goes wrong. */
export interface GeneratedMeasurement extends GeneratedSampling {
  readonly components: readonly GeneratedComponent[];
  readonly phaseRadians: number;
  /** sd of each component of each sample; 0: no noise. */
  readonly noiseSdPerComponent: number;
  readonly seed: number;
  readonly faults?: SignalFaults;
}

/** What a fit cannot know. */
export interface GeneratedTruth {
  /** (2 sampleCount) interleaved: the same without faults and noise; phase and time zero are no faults. */
  readonly faultlessSamples: Float64Array;
  /** Signal at time zero of each group of each component: amount times protons times response. */
  readonly groupStarts: readonly (readonly number[])[];
  /** How many components of samples the converter held at full scale. */
  readonly clippedCount: number;
}

/**
 * A FID made step by step in time, by a way that shares nothing with what fits it, beside its truth. Conventions: S(t) ~
 * exp(+2 pi i nu t), a positive offset is a higher ppm; H = sum nu I_z + sum J I.I in Hz.
 *
 * Faults come as they do in a laboratory: in the tube (unknown lines, radiation damping), in the magnet (shim, drift), in the
 * receiver (first samples, offset, noise, converter).
 *
 * @returns samples (2 sampleCount) interleaved
 * @throws RangeError when the measurement cannot be made
 */
export function generateMeasurement(measurement: GeneratedMeasurement): {
  samples: Float64Array;
  truth: GeneratedTruth;
} {
  checkMeasurement(measurement);
  const { phaseRadians, noiseSdPerComponent, faults = {} } = measurement;
  const draws = createSeededDraws(measurement.seed);
  const faultlessSamples = freeSignal(measurement.components, measurement);
  const samples = tubeSignal(measurement, faultlessSamples);
  turnPhase(faultlessSamples, phaseRadians);
  turnPhase(samples, phaseRadians);
  if (faults.shim !== undefined) applyShim(samples, faults.shim, measurement);
  if (faults.fieldDrift !== undefined) applyFieldDrift(samples, faults.fieldDrift, measurement);
  if (faults.firstSampleErrors !== undefined) spoilFirstSamples(samples, faults.firstSampleErrors, draws);
  if (faults.receiverOffset !== undefined) addReceiverOffset(samples, faults.receiverOffset, measurement.dwellSeconds);
  if (noiseSdPerComponent > 0) addWhiteNoise(samples, noiseSdPerComponent, draws);
  const clippedCount = faults.fullScaleCounts === undefined ? 0 : digitise(samples, faults.fullScaleCounts);
  return { samples, truth: { faultlessSamples, groupStarts: measurement.components.map(groupStarts), clippedCount } };
}

/** The signal of the tube: the faultless one, unless there is something unknown in it or it feeds back. */
function tubeSignal(measurement: GeneratedMeasurement, faultless: Float64Array): Float64Array {
  const { unknownLines = [], radiationDamping } = measurement.faults ?? {};
  const components = [...measurement.components, ...unknownLines.map(unknownLineComponent)];
  if (radiationDamping !== undefined) return dampedSignal(components, measurement, radiationDamping);
  return unknownLines.length === 0 ? faultless.slice() : freeSignal(components, measurement);
}

function dampedSignal(
  components: readonly GeneratedComponent[],
  { sampleCount, dwellSeconds, timeZeroSamples }: GeneratedSampling,
  damping: RadiationDamping,
): Float64Array {
  const { stepsPerSample } = damping;
  const fine = { sampleCount: sampleCount * stepsPerSample, dwellSeconds: dwellSeconds / stepsPerSample };
  const free = freeSignal(components, { ...fine, timeZeroSamples: timeZeroSamples * stepsPerSample });
  const answer = timeZeroSamples === 0 ? free : freeSignal(components, { ...fine, timeZeroSamples: 0 });
  const steps = feedBack(free, answer, damping, fine.dwellSeconds);
  return Float64Array.from({ length: 2 * sampleCount }, (_, i) => steps[i + 2 * (i >> 1) * (stepsPerSample - 1)]);
}

function freeSignal(components: readonly GeneratedComponent[], sampling: GeneratedSampling): Float64Array {
  const signal = new Float64Array(2 * sampling.sampleCount);
  for (const isotopologue of components.flatMap(isotopologuesOf)) addComponentSignal(isotopologue, sampling, signal);
  return signal;
}

function groupStarts({ amount, spins, groups }: GeneratedComponent): number[] {
  return groups.map(({ responseFactor }, g) => amount * responseFactor * spins.filter((s) => s.group === g).length);
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
