export { type GeneratedComponent, type GeneratedSampling, SPIN_COUNT_MAX } from './component-signal.ts';
export type { ShimCopy } from './faults.ts';
export { type GeneratedMeasurement, generateSignal } from './generate-signal.ts';
export {
  RANDOM_SYSTEM_RANGES,
  type RandomSpinSystem,
  randomComponent,
  randomSpinSystem,
} from './random-spin-system.ts';
export { createSeededDraws, type SeededDraws } from './seeded-draws.ts';
