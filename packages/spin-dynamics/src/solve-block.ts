import { symmetricEigenInto } from '@spinassay/numerics';
import type { CompiledComponent } from './compile-spin-topology.ts';
import type { CompiledBlock } from './compiled-block.ts';
import type { BlockSolution, TransitionWorkspace } from './transition-workspace.ts';

/**
 * Levels closer than this turn into each other without limit under a perturbation: their mutual rotation is d / (d^2 + this^2).
 * Between levels that close the lines coincide within any linewidth, and the turn cancels in their sum.
 */
const DEGENERATE_HZ = 1e-6;

/** Diagonalise one block at the shifts in the workspace and the couplings given. */
export function solveBlock(
  component: CompiledComponent,
  block: CompiledBlock,
  couplingsHz: Float64Array,
  workspace: TransitionWorkspace,
  solution: BlockSolution,
): void {
  const { size, iz } = block;
  const { matrix, spinShifts } = workspace;
  const spinCount = component.shiftOfSpin.length;
  const { couplingOfTerm, spinAOfTerm, spinBOfTerm } = component;
  matrix.fill(0, 0, size * size);
  for (let i = 0; i < size; i += 1) {
    let diagonal = 0;
    for (let s = 0; s < spinCount; s += 1) diagonal += spinShifts[s] * iz[i * spinCount + s];
    for (let t = 0; t < couplingOfTerm.length; t += 1) {
      diagonal +=
        couplingsHz[couplingOfTerm[t]] * iz[i * spinCount + spinAOfTerm[t]] * iz[i * spinCount + spinBOfTerm[t]];
    }
    matrix[i * size + i] = diagonal;
  }
  for (let o = 0; o < block.offRow.length; o += 1) {
    const value = couplingsHz[couplingOfTerm[block.offCoupling[o]]] * block.offCoefficient[o];
    matrix[block.offRow[o] * size + block.offColumn[o]] += value;
    matrix[block.offColumn[o] * size + block.offRow[o]] += value;
  }
  symmetricEigenInto(size, matrix, solution.values, solution.vectors, workspace.eigen);
}

/**
 * First-order change of values and vectors by each parameter of the component: B = V dH V', dE_k = B_kk,
 * X_kj = B_kj d / (d^2 + delta^2) with d = E_j - E_k. Rayleigh-Schroedinger perturbation theory.
 */
export function differentiateBlock(
  component: CompiledComponent,
  block: CompiledBlock,
  shiftCount: number,
  workspace: TransitionWorkspace,
  solution: BlockSolution,
): void {
  const { size } = block;
  const { values, vectors, valueDerivative, rotation } = solution;
  const { product } = workspace;
  for (let place = 0; place < component.parameters.length; place += 1) {
    // product = V dH, row by row
    applyDerivative(component, block, component.parameters[place], shiftCount, vectors, product);
    const square = place * size * size;
    for (let k = 0; k < size; k += 1) {
      for (let j = k; j < size; j += 1) {
        let sum = 0;
        for (let i = 0; i < size; i += 1) sum += product[k * size + i] * vectors[j * size + i];
        if (j === k) {
          valueDerivative[place * size + k] = sum;
          rotation[square + k * size + k] = 0;
          continue;
        }
        const gap = values[j] - values[k];
        const turn = (sum * gap) / (gap * gap + DEGENERATE_HZ * DEGENERATE_HZ);
        rotation[square + k * size + j] = turn;
        rotation[square + j * size + k] = -turn;
      }
    }
  }
}

/** product = vectors times dH/dp for one parameter. */
function applyDerivative(
  component: CompiledComponent,
  block: CompiledBlock,
  parameter: number,
  shiftCount: number,
  vectors: Float64Array,
  product: Float64Array,
): void {
  const { size, iz } = block;
  const { shiftOfSpin, couplingOfTerm, spinAOfTerm, spinBOfTerm } = component;
  const spinCount = shiftOfSpin.length;
  for (let i = 0; i < size; i += 1) {
    let diagonal = 0;
    if (parameter < shiftCount) {
      for (let s = 0; s < spinCount; s += 1) if (shiftOfSpin[s] === parameter) diagonal += iz[i * spinCount + s];
    } else {
      for (let t = 0; t < couplingOfTerm.length; t += 1) {
        if (couplingOfTerm[t] + shiftCount !== parameter) continue;
        diagonal += iz[i * spinCount + spinAOfTerm[t]] * iz[i * spinCount + spinBOfTerm[t]];
      }
    }
    for (let k = 0; k < size; k += 1) product[k * size + i] = vectors[k * size + i] * diagonal;
  }
  if (parameter < shiftCount) return;
  for (let o = 0; o < block.offRow.length; o += 1) {
    if (couplingOfTerm[block.offCoupling[o]] + shiftCount !== parameter) continue;
    const row = block.offRow[o];
    const column = block.offColumn[o];
    const coefficient = block.offCoefficient[o];
    for (let k = 0; k < size; k += 1) {
      product[k * size + row] += vectors[k * size + column] * coefficient;
      product[k * size + column] += vectors[k * size + row] * coefficient;
    }
  }
}
