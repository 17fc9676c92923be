import { SPIN_COUNT_MAX } from './component-signal.ts';
import { FEEDBACK_STEP_COUNT_MAX } from './faults/radiation-damping.ts';
import type { GeneratedMeasurement } from './generate-measurement.ts';
import { type GeneratedComponent, SATELLITE_COUNT_MAX } from './isotopologues.ts';

/** Refuse a measurement that cannot be made. @throws RangeError saying what was expected and what came */
export function checkMeasurement(measurement: GeneratedMeasurement): void {
  const { sampleCount, dwellSeconds, timeZeroSamples, phaseRadians, noiseSdPerComponent, faults = {} } = measurement;
  demand(Number.isInteger(sampleCount) && sampleCount > 0, 'sampleCount a whole number > 0', sampleCount);
  demand(Number.isFinite(dwellSeconds) && dwellSeconds > 0, 'dwellSeconds > 0', dwellSeconds);
  demand(Number.isFinite(timeZeroSamples), 'finite timeZeroSamples', timeZeroSamples);
  demand(Number.isFinite(phaseRadians), 'finite phaseRadians', phaseRadians);
  demand(noiseSdPerComponent >= 0 && noiseSdPerComponent < Infinity, 'noiseSdPerComponent >= 0', noiseSdPerComponent);
  for (const component of measurement.components) checkComponent(component);
  checkFaults(faults, sampleCount);
}

function checkComponent({ amount, spins, couplings, groups, satellites = [] }: GeneratedComponent): void {
  const spinCount = spins.length;
  demand(spinCount >= 1 && spinCount <= SPIN_COUNT_MAX, `1 to ${SPIN_COUNT_MAX} spins in a component`, spinCount);
  demand(Number.isFinite(amount), 'a finite amount', amount);
  for (const { shiftHz, group } of spins) {
    demand(Number.isFinite(shiftHz), 'finite shiftHz', shiftHz);
    demand(isIndex(group, groups.length), `group 0 to ${groups.length - 1}`, group);
  }
  for (const { a, b, couplingHz } of couplings) {
    for (const spin of [a, b]) demand(isIndex(spin, spinCount), `a coupled spin 0 to ${spinCount - 1}`, spin);
    demand(a !== b, 'a coupling between two spins', `${a} and ${b}`);
    demand(Number.isFinite(couplingHz), 'finite couplingHz', couplingHz);
  }
  for (const { responseFactor, decayPerSecond } of groups) {
    demand(Number.isFinite(responseFactor), 'a finite responseFactor', responseFactor);
    demand(decayPerSecond >= 0 && decayPerSecond < Infinity, 'decayPerSecond >= 0', decayPerSecond);
  }
  const satelliteCount = satellites.length;
  demand(satelliteCount <= SATELLITE_COUNT_MAX, `at most ${SATELLITE_COUNT_MAX} satellites`, satelliteCount);
  for (const { spins: split, couplingHz, abundanceFraction, isotopeShiftHz = 0 } of satellites) {
    for (const spin of split) demand(isIndex(spin, spinCount), `a split spin 0 to ${spinCount - 1}`, spin);
    demand(Number.isFinite(couplingHz), 'finite couplingHz of a satellite', couplingHz);
    demand(Number.isFinite(isotopeShiftHz), 'finite isotopeShiftHz', isotopeShiftHz);
    demand(abundanceFraction >= 0 && abundanceFraction <= 1, 'abundanceFraction 0 to 1', abundanceFraction);
  }
}

function checkFaults(faults: NonNullable<GeneratedMeasurement['faults']>, sampleCount: number): void {
  const { firstSampleErrors = [], fullScaleCounts = 1, radiationDamping, fieldDrift } = faults;
  const errorCount = firstSampleErrors.length;
  demand(errorCount <= sampleCount, `at most ${sampleCount} first samples spoiled`, errorCount);
  demand(Number.isInteger(fullScaleCounts) && fullScaleCounts > 0, 'fullScaleCounts whole and > 0', fullScaleCounts);
  const rangeHz = fieldDrift?.scanRangeHz ?? 0;
  demand(rangeHz >= 0, 'scanRangeHz >= 0', rangeHz);
  if (radiationDamping === undefined) return;
  const { stepsPerSample, ofSignal } = radiationDamping;
  demand(Number.isInteger(stepsPerSample) && stepsPerSample > 0, 'stepsPerSample whole and > 0', stepsPerSample);
  demand(Number.isFinite(ofSignal) && ofSignal > 0, 'ofSignal > 0', ofSignal);
  const stepCount = stepsPerSample * sampleCount;
  demand(stepCount <= FEEDBACK_STEP_COUNT_MAX, `at most ${FEEDBACK_STEP_COUNT_MAX} steps of feedback`, stepCount);
}

function isIndex(value: number, count: number): boolean {
  return Number.isInteger(value) && value >= 0 && value < count;
}

function demand(isTrue: boolean, expected: string, got: number | string): void {
  if (!isTrue) throw new RangeError(`expected ${expected}, got ${got}`);
}
