import type { CompiledSpinTopology } from './compile-spin-topology.ts';

/** Lines of a spin system. Buffers grow when needed and are reused from call to call. */
export interface TransitionTable {
  lineCount: number;
  /** (lineCount) Hz. */
  frequencyHz: Float64Array;
  /** (lineCount x groupCount) row-major, in protons. */
  groupWeight: Float64Array;
}

/** Lines with their derivatives by every shift, then every coupling (P of them). */
export interface TransitionDerivatives extends TransitionTable {
  /** (lineCount x P) */
  frequencyDerivative: Float64Array;
  /** (lineCount x groupCount x P) */
  groupWeightDerivative: Float64Array;
}

const LINES_AT_FIRST = 64;

/** An empty table for lines of this system. */
export function createTransitionTable({ topology }: CompiledSpinTopology): TransitionTable {
  return {
    lineCount: 0,
    frequencyHz: new Float64Array(LINES_AT_FIRST),
    groupWeight: new Float64Array(LINES_AT_FIRST * topology.groupCount),
  };
}

/** An empty table for lines and derivatives of this system. */
export function createTransitionDerivatives(compiled: CompiledSpinTopology): TransitionDerivatives {
  const { parameterCount, topology } = compiled;
  return {
    ...createTransitionTable(compiled),
    frequencyDerivative: new Float64Array(LINES_AT_FIRST * parameterCount),
    groupWeightDerivative: new Float64Array(LINES_AT_FIRST * topology.groupCount * parameterCount),
  };
}

/** Make room for one line more; the row it gets holds zeros. Returns its index. */
export function appendLine(table: TransitionTable, groupCount: number): number {
  const line = table.lineCount;
  if (line === table.frequencyHz.length) {
    table.frequencyHz = doubled(table.frequencyHz);
    table.groupWeight = doubled(table.groupWeight);
  }
  table.groupWeight.fill(0, line * groupCount, (line + 1) * groupCount);
  table.lineCount = line + 1;
  return line;
}

/** The same for derivative rows, after appendLine. */
export function appendDerivatives(
  table: TransitionDerivatives,
  line: number,
  groupCount: number,
  parameterCount: number,
): void {
  while ((line + 1) * parameterCount > table.frequencyDerivative.length) {
    table.frequencyDerivative = doubled(table.frequencyDerivative);
    table.groupWeightDerivative = doubled(table.groupWeightDerivative);
  }
  table.frequencyDerivative.fill(0, line * parameterCount, (line + 1) * parameterCount);
  const width = groupCount * parameterCount;
  table.groupWeightDerivative.fill(0, line * width, (line + 1) * width);
}

function doubled(buffer: Float64Array): Float64Array {
  const larger = new Float64Array(Math.max(1, 2 * buffer.length));
  larger.set(buffer);
  return larger;
}
