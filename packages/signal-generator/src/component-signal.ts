import { adjoint, type ComplexMatrix, multiplyInto, propagator, zeroMatrix } from './complex-matrix.ts';

/** One connected spin system of spins-1/2, every molecule alike; equivalent protons are written out one by one. */
export interface GeneratedIsotopologue {
  /** Signal of one proton at time zero, with full response. */
  readonly amount: number;
  readonly spins: readonly { readonly shiftHz: number; readonly group: number }[];
  readonly couplings: readonly { readonly a: number; readonly b: number; readonly couplingHz: number }[];
  readonly groups: readonly { readonly responseFactor: number; readonly decayPerSecond: number }[];
}

/** Most spins the dense propagator takes: blocks of 20 states, 2 s for a FID of 16,384 samples (one of two cores, shared, 2026-12-01). */
export const SPIN_COUNT_MAX = 6;

/** When the samples are taken: sample n at (n - timeZeroSamples) dwellSeconds. */
export interface GeneratedSampling {
  readonly sampleCount: number;
  readonly dwellSeconds: number;
  readonly timeZeroSamples: number;
}

/**
 * Add the FID of one isotopologue by stepping the density operator: M(t + dt) = U M(t) U', M(0) = F-, S_g = Tr[I_g+ M].
 *
 * U is block diagonal in total Iz, so M keeps one block between each pair of neighbours; each step is two products a block.
 *
 * @param component checked by `checkMeasurement`
 * @param signal    (2 sampleCount) interleaved, added to
 */
export function addComponentSignal(
  component: GeneratedIsotopologue,
  sampling: GeneratedSampling,
  signal: Float64Array,
): void {
  const spinCount = component.spins.length;
  const blocks = statesByDownCount(spinCount);
  const angle = 2 * Math.PI * sampling.dwellSeconds;
  const hamiltonians = blocks.map((states) => blockHamiltonian(component, states));
  const steps = blocks.map((states, b) => propagator(states.length, hamiltonians[b], angle));
  const starts = blocks.map((states, b) =>
    propagator(states.length, hamiltonians[b], -angle * sampling.timeZeroSamples),
  );
  const pairs = blocks.slice(1).map((lower, b) => {
    const density = loweringBlock(spinCount, blocks[b], lower);
    return {
      density: turned(density, starts[b + 1], adjoint(starts[b])),
      left: steps[b + 1],
      right: adjoint(steps[b]),
      scratch: zeroMatrix(lower.length, blocks[b].length),
      detectors: detectors(component, blocks[b], lower),
    };
  });
  // Tr[I_i+ I_i-] = 2^(n-1): divided out, a proton of full response starts at 1.
  const scale = component.amount / (1 << (spinCount - 1));
  for (let n = 0; n < sampling.sampleCount; n += 1) {
    const seconds = (n - sampling.timeZeroSamples) * sampling.dwellSeconds;
    const factors = component.groups.map(
      (group) => scale * group.responseFactor * Math.exp(-group.decayPerSecond * seconds),
    );
    for (const { density, detectors: list } of pairs) {
      for (const { place, group } of list) {
        signal[2 * n] += factors[group] * density.data[2 * place];
        signal[2 * n + 1] += factors[group] * density.data[2 * place + 1];
      }
    }
    for (const { density, left, right, scratch } of pairs) {
      multiplyInto(left, density, scratch);
      multiplyInto(scratch, right, density);
    }
  }
}

/** States as bit patterns (bit set: spin down), by the number of spins down. */
function statesByDownCount(spinCount: number): number[][] {
  const blocks: number[][] = Array.from({ length: spinCount + 1 }, () => []);
  for (let state = 0; state < 1 << spinCount; state += 1) {
    let down = 0;
    for (let spin = 0; spin < spinCount; spin += 1) down += (state >> spin) & 1;
    blocks[down].push(state);
  }
  return blocks;
}

/** sum nu_i I_iz + sum J_ij I_i.I_j among the states of one block, Hz, row-major. */
function blockHamiltonian({ spins, couplings }: GeneratedIsotopologue, states: readonly number[]): Float64Array {
  const size = states.length;
  const place = new Map(states.map((state, index) => [state, index]));
  const matrix = new Float64Array(size * size);
  const iz = (state: number, spin: number): number => 0.5 - ((state >> spin) & 1);
  states.forEach((state, row) => {
    let diagonal = 0;
    spins.forEach((spin, i) => {
      diagonal += spin.shiftHz * iz(state, i);
    });
    for (const { a, b, couplingHz } of couplings) {
      diagonal += couplingHz * iz(state, a) * iz(state, b);
      if (iz(state, a) === iz(state, b)) continue;
      const column = place.get(state ^ (1 << a) ^ (1 << b));
      if (column !== undefined) matrix[row * size + column] += couplingHz / 2;
    }
    matrix[row * size + row] += diagonal;
  });
  return matrix;
}

/** F- from one block (columns) to the next lower one (rows). */
function loweringBlock(spinCount: number, upper: readonly number[], lower: readonly number[]): ComplexMatrix {
  const matrix = zeroMatrix(lower.length, upper.length);
  upper.forEach((state, column) => {
    for (let spin = 0; spin < spinCount; spin += 1) {
      if (((state >> spin) & 1) === 1) continue;
      matrix.data[2 * (lower.indexOf(state | (1 << spin)) * upper.length + column)] = 1;
    }
  });
  return matrix;
}

/** Elements of the density block that I_g+ picks, with their groups. */
function detectors(
  { spins }: GeneratedIsotopologue,
  upper: readonly number[],
  lower: readonly number[],
): { place: number; group: number }[] {
  return upper.flatMap((state, column) =>
    spins.flatMap((spin, s) =>
      ((state >> s) & 1) === 1
        ? []
        : [{ place: lower.indexOf(state | (1 << s)) * upper.length + column, group: spin.group }],
    ),
  );
}

function turned(density: ComplexMatrix, left: ComplexMatrix, right: ComplexMatrix): ComplexMatrix {
  const half = zeroMatrix(density.rows, density.columns);
  const out = zeroMatrix(density.rows, density.columns);
  multiplyInto(left, density, half);
  multiplyInto(half, right, out);
  return out;
}
