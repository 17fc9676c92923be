import { createEigenWorkspace, type EigenWorkspace } from '@spinassay/numerics';
import type { CompiledSpinTopology } from './compile-spin-topology.ts';

/** Eigenvalues and eigenvectors of one block, and how parameters turn them. */
export interface BlockSolution {
  /** (sizeMax) */
  readonly values: Float64Array;
  /** (size x size at the front) eigenvectors as rows. */
  readonly vectors: Float64Array;
  /** (P x size) dE/dp. */
  readonly valueDerivative: Float64Array;
  /** (P x size x size) X with d(vector j)/dp = sum_k X_kj vector k. */
  readonly rotation: Float64Array;
}

/** Scratch of one topology; opaque to callers, not shared between threads. */
export interface TransitionWorkspace {
  readonly upper: BlockSolution;
  readonly lower: BlockSolution;
  readonly matrix: Float64Array;
  readonly product: Float64Array;
  /** (groups x size x size) I_g- among eigenvectors, then their sum. */
  readonly moments: Float64Array;
  readonly momentSum: Float64Array;
  readonly eigen: EigenWorkspace;
  /** (spins) shifts in the frame of the component. */
  readonly spinShifts: Float64Array;
}

/** Scratch for evaluating this topology. */
export function createTransitionWorkspace(compiled: CompiledSpinTopology): TransitionWorkspace {
  const { sizeMax, parameterCount, topology } = compiled;
  const square = sizeMax * sizeMax;
  const solution = (): BlockSolution => ({
    values: new Float64Array(sizeMax),
    vectors: new Float64Array(square),
    valueDerivative: new Float64Array(parameterCount * sizeMax),
    rotation: new Float64Array(parameterCount * square),
  });
  return {
    upper: solution(),
    lower: solution(),
    matrix: new Float64Array(square),
    product: new Float64Array(square),
    moments: new Float64Array(topology.groupCount * square),
    momentSum: new Float64Array(square),
    eigen: createEigenWorkspace(sizeMax),
    spinShifts: new Float64Array(topology.spins.length),
  };
}
