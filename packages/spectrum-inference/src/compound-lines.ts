import {
  type CompiledSpinTopology,
  compileSpinTopology,
  computeTransitionsInto,
  computeTransitionsWithDerivativesInto,
  createTransitionDerivatives,
  createTransitionTable,
  createTransitionWorkspace,
  type SpinTopology,
  type TransitionDerivatives,
  type TransitionTable,
  type TransitionWorkspace,
} from '@spinassay/spin-dynamics';
import type { SpinSystemQuestion } from './spectrum-question.ts';

/** One share of the molecules: the system with one group's shift moved by half a coupling to a rare isotope. */
interface Isotopologue {
  readonly weight: number;
  readonly groupIndex: number;
  readonly offsetHz: number;
}

/** Everything that turns shifts and couplings of one spin system into lines; one per system, made once. */
export interface SystemLines {
  readonly system: SpinSystemQuestion;
  readonly isotopologues: readonly Isotopologue[];
  /** The lines of isotopologue i at the shifts and couplings given. */
  lines(isotopologue: number, at: SystemPoint): TransitionTable;
  /** The same with derivatives by every shift, then every coupling. */
  linesWithDerivatives(isotopologue: number, at: SystemPoint): TransitionDerivatives;
}

/** Where a system is evaluated, and the weight, in protons, below which its lines are dropped. */
export interface SystemPoint {
  readonly shiftsHz: Float64Array;
  readonly couplingsHz: Float64Array;
  readonly lineWeightMin: number;
}

/** Compile a spin system. Throws SystemTooLargeError beyond the limit of the exact engine. */
export function createSystemLines(system: SpinSystemQuestion): SystemLines {
  const compiled: CompiledSpinTopology = compileSpinTopology(topologyOf(system));
  const workspace: TransitionWorkspace = createTransitionWorkspace(compiled);
  const table = createTransitionTable(compiled);
  const derivatives = createTransitionDerivatives(compiled);
  const shifted = new Float64Array(system.groups.length);
  const isotopologues = isotopologuesOf(system);
  const move = (isotopologue: number, shiftsHz: Float64Array): Float64Array => {
    shifted.set(shiftsHz);
    const { groupIndex, offsetHz } = isotopologues[isotopologue];
    if (groupIndex >= 0) shifted[groupIndex] += offsetHz;
    return shifted;
  };
  return {
    system,
    isotopologues,
    lines(isotopologue, { shiftsHz, couplingsHz, lineWeightMin }) {
      const shifts = move(isotopologue, shiftsHz);
      computeTransitionsInto(compiled, shifts, couplingsHz, workspace, table, lineWeightMin);
      return table;
    },
    linesWithDerivatives(isotopologue, { shiftsHz, couplingsHz, lineWeightMin }) {
      const shifts = move(isotopologue, shiftsHz);
      computeTransitionsWithDerivativesInto(compiled, shifts, couplingsHz, workspace, derivatives, lineWeightMin);
      return derivatives;
    },
  };
}

function topologyOf(system: SpinSystemQuestion): SpinTopology {
  return {
    spins: system.groups.flatMap((group, g) =>
      group.spins.map((spin) => ({ protonCount: spin.protonCount, groupIndex: g, shiftIndex: g })),
    ),
    shiftCount: system.groups.length,
    groupCount: system.groups.length,
    couplingCount: system.couplings.length,
    couplings: system.couplings.flatMap((coupling, c) =>
      coupling.pairs.map(([spinA, spinB]) => ({ spinA, spinB, couplingIndex: c })),
    ),
  };
}

function isotopologuesOf(system: SpinSystemQuestion): Isotopologue[] {
  const rare = system.satellites.reduce((sum, satellite) => sum + satellite.abundanceFraction, 0);
  return [
    { weight: 1 - rare, groupIndex: -1, offsetHz: 0 },
    ...system.satellites.flatMap(({ groupIndex, couplingHz, abundanceFraction }) =>
      [0.5, -0.5].map((side) => ({ weight: abundanceFraction / 2, groupIndex, offsetHz: side * couplingHz })),
    ),
  ];
}
