export { type GeneratedIsotopologue, type GeneratedSampling, SPIN_COUNT_MAX } from './component-signal.ts';
export { FAULT_RANGES } from './fault-ranges.ts';
export type { FieldDrift } from './faults/field-drift.ts';
export { FEEDBACK_STEP_COUNT_MAX, type RadiationDamping } from './faults/radiation-damping.ts';
export type { ReceiverOffset } from './faults/receiver-offset.ts';
export type { ShimCopy } from './faults/shim.ts';
export type { UnknownLine } from './faults/unknown-line.ts';
export { type GeneratedMeasurement, type GeneratedTruth, generateMeasurement } from './generate-measurement.ts';
export { generateSignal } from './generate-signal.ts';
export { type GeneratedComponent, type GeneratedSatellite, SATELLITE_COUNT_MAX } from './isotopologues.ts';
export { type FaultSetting, randomFaults } from './random-faults.ts';
export {
  RANDOM_SYSTEM_RANGES,
  type RandomSpinSystem,
  randomComponent,
  randomSpinSystem,
} from './random-spin-system.ts';
export { createSeededDraws, type SeededDraws } from './seeded-draws.ts';
export type { SignalFaults } from './signal-faults.ts';
