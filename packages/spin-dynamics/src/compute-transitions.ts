import { DimensionError, DomainError } from '@spinassay/numerics';
import type { CompiledComponent, CompiledSpinTopology } from './compile-spin-topology.ts';
import type { CompiledBlock } from './compiled-block.ts';
import { differentiateBlock, solveBlock } from './solve-block.ts';
import { appendDerivatives, appendLine, type TransitionDerivatives, type TransitionTable } from './transition-table.ts';
import type { BlockSolution, TransitionWorkspace } from './transition-workspace.ts';

/**
 * Frequencies and group weights of all lines at given shifts and couplings.
 *
 * @param shiftsHz (shiftCount) from any common origin; lines are given from the same one
 * @param couplingsHz (couplingCount)
 * @param out overwritten; its buffers grow when needed and are reused
 * @throws DimensionError for wrong lengths, DomainError for values that are not finite
 * @source Ernst, Bodenhausen & Wokaun (1987) ch. 2; weights: see conventions.ts
 */
export function computeTransitionsInto(
  compiled: CompiledSpinTopology,
  shiftsHz: Float64Array,
  couplingsHz: Float64Array,
  workspace: TransitionWorkspace,
  out: TransitionTable,
): void {
  evaluate(compiled, shiftsHz, couplingsHz, workspace, out, undefined);
}

/** The same with derivatives by every shift and coupling; see computeTransitionsInto. */
export function computeTransitionsWithDerivativesInto(
  compiled: CompiledSpinTopology,
  shiftsHz: Float64Array,
  couplingsHz: Float64Array,
  workspace: TransitionWorkspace,
  out: TransitionDerivatives,
): void {
  evaluate(compiled, shiftsHz, couplingsHz, workspace, out, out);
}

function evaluate(
  compiled: CompiledSpinTopology,
  shiftsHz: Float64Array,
  couplingsHz: Float64Array,
  workspace: TransitionWorkspace,
  table: TransitionTable,
  derivatives: TransitionDerivatives | undefined,
): void {
  const { topology } = compiled;
  if (shiftsHz.length !== topology.shiftCount || couplingsHz.length !== topology.couplingCount) {
    throw new DimensionError(
      `expected ${topology.shiftCount} shifts and ${topology.couplingCount} couplings, got ${shiftsHz.length} and ${couplingsHz.length}`,
    );
  }
  if (!shiftsHz.every(Number.isFinite) || !couplingsHz.every(Number.isFinite)) {
    throw new DomainError('expected finite shifts and couplings');
  }
  table.lineCount = 0;
  for (const component of compiled.components) {
    // The frame turns with the mean shift: small numbers keep their digits.
    let origin = 0;
    for (const shift of component.shiftOfSpin) origin += shiftsHz[shift] / component.shiftOfSpin.length;
    component.shiftOfSpin.forEach((shift, s) => {
      workspace.spinShifts[s] = shiftsHz[shift] - origin;
    });
    evaluateComponent({ compiled, component, couplingsHz, workspace, table, derivatives, origin });
  }
}

interface Evaluation {
  readonly compiled: CompiledSpinTopology;
  readonly component: CompiledComponent;
  readonly couplingsHz: Float64Array;
  readonly workspace: TransitionWorkspace;
  readonly table: TransitionTable;
  readonly derivatives: TransitionDerivatives | undefined;
  readonly origin: number;
}

function evaluateComponent(at: Evaluation): void {
  const { component, couplingsHz, workspace, derivatives, compiled } = at;
  const { shiftCount } = compiled.topology;
  const solve = (block: CompiledBlock, solution: BlockSolution): void => {
    solveBlock(component, block, couplingsHz, workspace, solution);
    if (derivatives !== undefined) differentiateBlock(component, block, shiftCount, workspace, solution);
  };
  // Multiplicity times 2^(1 - N): weights in protons.
  let share = 1;
  for (let n = 1; n < component.protonCount; n += 1) share /= 2;
  for (const { blocks, multiplicity } of component.sectors) {
    let upper = workspace.upper;
    let lower = workspace.lower;
    solve(blocks[0], upper);
    for (let b = 0; b + 1 < blocks.length; b += 1) {
      solve(blocks[b + 1], lower);
      momentsBetween(component, blocks[b], blocks[b + 1].size, { upper, lower }, workspace);
      emitLines(at, { upperSize: blocks[b].size, lowerSize: blocks[b + 1].size, upper, lower }, share * multiplicity);
      const held = upper;
      upper = lower;
      lower = held;
    }
  }
}

/** moments[g][a][b] = <a|I_g-|b> for lower eigenvectors a and upper ones b, and their sum over groups. */
function momentsBetween(
  component: CompiledComponent,
  block: CompiledBlock,
  lowerSize: number,
  { upper, lower }: { upper: BlockSolution; lower: BlockSolution },
  workspace: TransitionWorkspace,
): void {
  const upperSize = block.size;
  const area = lowerSize * upperSize;
  const { moments, momentSum, product } = workspace;
  momentSum.fill(0, 0, area);
  for (let g = 0; g < component.groups.length; g += 1) {
    // product[row][b] = sum over columns of the sparse operator times the upper vectors
    product.fill(0, 0, area);
    for (let e = 0; e < block.lowerRow.length; e += 1) {
      if (block.lowerGroup[e] !== g) continue;
      const row = block.lowerRow[e] * upperSize;
      const column = block.lowerColumn[e];
      const coefficient = block.lowerCoefficient[e];
      for (let b = 0; b < upperSize; b += 1) product[row + b] += coefficient * upper.vectors[b * upperSize + column];
    }
    const start = g * area;
    moments.fill(0, start, start + area);
    for (let a = 0; a < lowerSize; a += 1) {
      for (let r = 0; r < lowerSize; r += 1) {
        const factor = lower.vectors[a * lowerSize + r];
        if (factor === 0) continue;
        for (let b = 0; b < upperSize; b += 1)
          moments[start + a * upperSize + b] += factor * product[r * upperSize + b];
      }
    }
    for (let i = 0; i < area; i += 1) momentSum[i] += moments[start + i];
  }
}

interface BlockPair {
  readonly upperSize: number;
  readonly lowerSize: number;
  readonly upper: BlockSolution;
  readonly lower: BlockSolution;
}

function emitLines(at: Evaluation, pair: BlockPair, share: number): void {
  const { compiled, component, workspace, table, derivatives, origin } = at;
  const { upperSize, lowerSize, upper, lower } = pair;
  const { moments, momentSum } = workspace;
  const area = lowerSize * upperSize;
  const groupCount = compiled.topology.groupCount;
  const first = table.lineCount;
  for (let a = 0; a < lowerSize; a += 1) {
    for (let b = 0; b < upperSize; b += 1) {
      const cell = a * upperSize + b;
      let largest = 0;
      for (let g = 0; g < component.groups.length; g += 1) {
        largest = Math.max(largest, Math.abs(moments[g * area + cell] * momentSum[cell]) * share);
      }
      if (largest < compiled.lineWeightMin) continue;
      const line = appendLine(table, groupCount);
      table.frequencyHz[line] = upper.values[b] - lower.values[a] + origin;
      for (let g = 0; g < component.groups.length; g += 1) {
        table.groupWeight[line * groupCount + component.groups[g]] = moments[g * area + cell] * momentSum[cell] * share;
      }
      if (derivatives === undefined) continue;
      appendDerivatives(derivatives, line, groupCount, compiled.parameterCount);
    }
  }
  if (derivatives !== undefined && table.lineCount > first) emitDerivatives(at, derivatives, pair, share, first);
}

/** Derivatives of the lines just emitted, one parameter after the other: dT = X_lower' T + T X_upper. */
function emitDerivatives(
  at: Evaluation,
  derivatives: TransitionDerivatives,
  pair: BlockPair,
  share: number,
  first: number,
): void {
  const { compiled, component, workspace } = at;
  const { upperSize, lowerSize, upper, lower } = pair;
  const { moments, momentSum, momentSlopes, momentSlopeSum } = workspace;
  const area = lowerSize * upperSize;
  const { groupCount } = compiled.topology;
  const { parameterCount } = compiled;
  for (let place = 0; place < component.parameters.length; place += 1) {
    const parameter = component.parameters[place];
    momentSlopeSum.fill(0, 0, area);
    for (let g = 0; g < component.groups.length; g += 1) {
      slopeOfMoments(moments, momentSlopes, g * area, pair, place);
      for (let i = 0; i < area; i += 1) momentSlopeSum[i] += momentSlopes[g * area + i];
    }
    let line = first;
    for (let a = 0; a < lowerSize; a += 1) {
      for (let b = 0; b < upperSize; b += 1) {
        const cell = a * upperSize + b;
        let largest = 0;
        for (let g = 0; g < component.groups.length; g += 1) {
          largest = Math.max(largest, Math.abs(moments[g * area + cell] * momentSum[cell]) * share);
        }
        if (largest < compiled.lineWeightMin) continue;
        derivatives.frequencyDerivative[line * parameterCount + parameter] =
          upper.valueDerivative[place * upperSize + b] - lower.valueDerivative[place * lowerSize + a];
        for (let g = 0; g < component.groups.length; g += 1) {
          const entry = (line * groupCount + component.groups[g]) * parameterCount + parameter;
          derivatives.groupWeightDerivative[entry] =
            (momentSlopes[g * area + cell] * momentSum[cell] + moments[g * area + cell] * momentSlopeSum[cell]) * share;
        }
        line += 1;
      }
    }
  }
}

/** slopes[a][b] = sum_k X_ka^lower T_kb + sum_k T_ak X_kb^upper, for one group's moments at `start`. */
function slopeOfMoments(
  moments: Float64Array,
  slopes: Float64Array,
  start: number,
  pair: BlockPair,
  place: number,
): void {
  const { upperSize, lowerSize, upper, lower } = pair;
  const upperTurn = place * upperSize * upperSize;
  const lowerTurn = place * lowerSize * lowerSize;
  slopes.fill(0, start, start + lowerSize * upperSize);
  for (let a = 0; a < lowerSize; a += 1) {
    const row = start + a * upperSize;
    for (let k = 0; k < lowerSize; k += 1) {
      const turn = lower.rotation[lowerTurn + k * lowerSize + a];
      if (turn === 0) continue;
      const other = start + k * upperSize;
      for (let b = 0; b < upperSize; b += 1) slopes[row + b] += turn * moments[other + b];
    }
    for (let k = 0; k < upperSize; k += 1) {
      const moment = moments[row + k];
      if (moment === 0) continue;
      const turns = upperTurn + k * upperSize;
      for (let b = 0; b < upperSize; b += 1) slopes[row + b] += moment * upper.rotation[turns + b];
    }
  }
}
