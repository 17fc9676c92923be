export { type CompiledSpinTopology, compileSpinTopology } from './compile-spin-topology.ts';
export { computeTransitionsInto, computeTransitionsWithDerivativesInto } from './compute-transitions.ts';
export { LINE_WEIGHT_MIN, PROTON_COUNT_MAX } from './conventions.ts';
export { type SpinTopology, SystemTooLargeError } from './spin-topology.ts';
export {
  createTransitionDerivatives,
  createTransitionTable,
  type TransitionDerivatives,
  type TransitionTable,
} from './transition-table.ts';
export { createTransitionWorkspace, type TransitionWorkspace } from './transition-workspace.ts';
