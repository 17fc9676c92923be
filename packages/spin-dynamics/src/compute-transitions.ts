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
 * @param lineWeightMin lines below this share of one proton in every group are dropped; by default that of the topology
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
  lineWeightMin = compiled.lineWeightMin,
): void {
  evaluate({ compiled, couplingsHz, workspace, table: out, derivatives: undefined, lineWeightMin }, shiftsHz);
}

/** The same with derivatives by every shift and coupling; see computeTransitionsInto. */
export function computeTransitionsWithDerivativesInto(
  compiled: CompiledSpinTopology,
  shiftsHz: Float64Array,
  couplingsHz: Float64Array,
  workspace: TransitionWorkspace,
  out: TransitionDerivatives,
  lineWeightMin = compiled.lineWeightMin,
): void {
  evaluate({ compiled, couplingsHz, workspace, table: out, derivatives: out, lineWeightMin }, shiftsHz);
}

function evaluate(at: Omit<Evaluation, 'component' | 'origin'>, shiftsHz: Float64Array): void {
  const { compiled, couplingsHz, workspace, table } = at;
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
    evaluateComponent({ ...at, component, origin });
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
  readonly lineWeightMin: number;
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
  const { compiled, component, workspace, table, derivatives, origin, lineWeightMin } = at;
  const { upperSize, lowerSize, upper, lower } = pair;
  const { moments, momentSum } = workspace;
  const area = lowerSize * upperSize;
  const groupCount = compiled.topology.groupCount;
  for (let a = 0; a < lowerSize; a += 1) {
    for (let b = 0; b < upperSize; b += 1) {
      const cell = a * upperSize + b;
      let largest = 0;
      for (let g = 0; g < component.groups.length; g += 1) {
        largest = Math.max(largest, Math.abs(moments[g * area + cell] * momentSum[cell]) * share);
      }
      if (largest < lineWeightMin) continue;
      const line = appendLine(table, groupCount);
      table.frequencyHz[line] = upper.values[b] - lower.values[a] + origin;
      for (let g = 0; g < component.groups.length; g += 1) {
        table.groupWeight[line * groupCount + component.groups[g]] = moments[g * area + cell] * momentSum[cell] * share;
      }
      if (derivatives !== undefined) emitDerivatives(at, derivatives, pair, { a, b, line, share });
    }
  }
}

interface EmittedLine {
  readonly a: number;
  readonly b: number;
  readonly line: number;
  readonly share: number;
}

/**
 * Derivatives of one line: dT = X_lower' T + T X_upper at its cell. Groups whose weight is below the limit keep zeros: whoever
 * leaves out their weight has no use for its slope.
 */
function emitDerivatives(
  { compiled, component, workspace, lineWeightMin }: Evaluation,
  derivatives: TransitionDerivatives,
  pair: BlockPair,
  { a, b, line, share }: EmittedLine,
): void {
  const { upperSize, lowerSize, upper, lower } = pair;
  const { moments, momentSum } = workspace;
  const { parameterCount } = compiled;
  const { groupCount } = compiled.topology;
  const area = lowerSize * upperSize;
  const cell = a * upperSize + b;
  appendDerivatives(derivatives, line, groupCount, parameterCount);
  for (let place = 0; place < component.parameters.length; place += 1) {
    const parameter = component.parameters[place];
    derivatives.frequencyDerivative[line * parameterCount + parameter] =
      upper.valueDerivative[place * upperSize + b] - lower.valueDerivative[place * lowerSize + a];
    const sumSlope = slopeAt(momentSum, 0, pair, place, a, b);
    for (let g = 0; g < component.groups.length; g += 1) {
      const moment = moments[g * area + cell];
      if (Math.abs(moment * momentSum[cell]) * share < lineWeightMin) continue;
      const slope = slopeAt(moments, g * area, pair, place, a, b);
      derivatives.groupWeightDerivative[(line * groupCount + component.groups[g]) * parameterCount + parameter] =
        (slope * momentSum[cell] + moment * sumSlope) * share;
    }
  }
}

/** sum_k X_ka^lower T_kb + sum_k T_ak X_kb^upper for the moments that start at `start`; X is antisymmetric, so rows serve. */
function slopeAt(moments: Float64Array, start: number, pair: BlockPair, place: number, a: number, b: number): number {
  const { upperSize, lowerSize, upper, lower } = pair;
  const lowerRow = place * lowerSize * lowerSize + a * lowerSize;
  const upperRow = place * upperSize * upperSize + b * upperSize;
  const row = start + a * upperSize;
  let slope = 0;
  for (let k = 0; k < lowerSize; k += 1) slope -= lower.rotation[lowerRow + k] * moments[start + k * upperSize + b];
  for (let k = 0; k < upperSize; k += 1) slope -= moments[row + k] * upper.rotation[upperRow + k];
  return slope;
}
