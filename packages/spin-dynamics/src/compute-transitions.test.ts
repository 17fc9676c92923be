import { createRandomStream } from '@spinassay/numerics';
import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { compileSpinTopology } from './compile-spin-topology.ts';
import { computeTransitionsInto, computeTransitionsWithDerivativesInto } from './compute-transitions.ts';
import { type SpinTopology, SystemTooLargeError } from './spin-topology.ts';
import { createTransitionDerivatives, createTransitionTable, type TransitionTable } from './transition-table.ts';
import { createTransitionWorkspace } from './transition-workspace.ts';

const random = createRandomStream({ seed: 21n, purpose: 'transitions test' });

/** Every spin its own group and shift, every pair coupled. */
function fullTopology(protonCounts: readonly number[]): SpinTopology {
  const couplings = protonCounts.flatMap((_, a) => protonCounts.slice(0, a).map((__, b) => ({ spinA: a, spinB: b })));
  return {
    spins: protonCounts.map((protonCount, s) => ({ protonCount, groupIndex: s, shiftIndex: s })),
    groupCount: protonCounts.length,
    shiftCount: protonCounts.length,
    couplingCount: couplings.length,
    couplings: couplings.map((coupling, c) => ({ ...coupling, couplingIndex: c })),
  };
}

function draw(topology: SpinTopology): { shifts: Float64Array; couplings: Float64Array } {
  return {
    shifts: Float64Array.from({ length: topology.shiftCount }, () => 200 * random.nextUniform() - 100),
    couplings: Float64Array.from({ length: topology.couplingCount }, () => 24 * random.nextUniform() - 12),
  };
}

function transitions(
  topology: SpinTopology,
  shifts: Float64Array,
  couplings: Float64Array,
  lineWeightMin = 1e-9,
): TransitionTable {
  const compiled = compileSpinTopology(topology, { lineWeightMin });
  const table = createTransitionTable(compiled);
  computeTransitionsInto(compiled, shifts, couplings, createTransitionWorkspace(compiled), table);
  return table;
}

/** S_g(t) of every group at some times, Hz and seconds. */
function signal(table: TransitionTable, groupCount: number, times: readonly number[]): number[] {
  return times.flatMap((time) =>
    Array.from({ length: groupCount }, (_, g) => {
      let re = 0;
      let im = 0;
      for (let l = 0; l < table.lineCount; l += 1) {
        const weight = table.groupWeight[l * groupCount + g];
        re += weight * Math.cos(2 * Math.PI * table.frequencyHz[l] * time);
        im += weight * Math.sin(2 * Math.PI * table.frequencyHz[l] * time);
      }
      return [re, im];
    }).flat(),
  );
}

/** The slow, obvious way: the dense 2^n Hamiltonian of single protons by ml-matrix, Tr[I_g+(t) F-] from all pairs of states. */
function denseSignal(
  protonCounts: readonly number[],
  shifts: Float64Array,
  couplings: Float64Array,
  times: readonly number[],
): number[] {
  const groupOf = protonCounts.flatMap((count, s) => Array.from({ length: count }, () => s));
  const n = groupOf.length;
  const size = 1 << n;
  const hamiltonian = Matrix.zeros(size, size);
  const bit = (state: number, spin: number): number => (state >> spin) & 1;
  let index = 0;
  const couplingOf = new Map<string, number>();
  for (let a = 0; a < protonCounts.length; a += 1) {
    for (let b = 0; b < a; b += 1) couplingOf.set(`${b}-${a}`, couplings[index++]);
  }
  for (let state = 0; state < size; state += 1) {
    let diagonal = 0;
    for (let i = 0; i < n; i += 1) {
      diagonal += shifts[groupOf[i]] * (0.5 - bit(state, i));
      for (let j = 0; j < i; j += 1) {
        if (groupOf[i] === groupOf[j]) continue;
        const value = couplingOf.get([groupOf[i], groupOf[j]].sort((x, y) => x - y).join('-')) ?? 0;
        diagonal += value * (0.5 - bit(state, i)) * (0.5 - bit(state, j));
        if (bit(state, i) !== bit(state, j)) {
          const other = state ^ (1 << i) ^ (1 << j);
          hamiltonian.set(state, other, hamiltonian.get(state, other) + value / 2);
        }
      }
    }
    hamiltonian.set(state, state, hamiltonian.get(state, state) + diagonal);
  }
  const eigen = new EigenvalueDecomposition(hamiltonian, { assumeSymmetric: true });
  const vectors = eigen.eigenvectorMatrix;
  const lowering = protonCounts.map((_, g) => {
    const operator = Matrix.zeros(size, size);
    for (let state = 0; state < size; state += 1) {
      for (let i = 0; i < n; i += 1)
        if (groupOf[i] === g && bit(state, i) === 0) operator.set(state ^ (1 << i), state, 1);
    }
    return vectors.transpose().mmul(operator).mmul(vectors);
  });
  const total = lowering.reduce((sum, operator) => Matrix.add(sum, operator));
  return times.flatMap((time) =>
    lowering.flatMap((operator) => {
      let re = 0;
      let im = 0;
      for (let a = 0; a < size; a += 1) {
        for (let b = 0; b < size; b += 1) {
          const weight = (operator.get(a, b) * total.get(a, b)) / (size / 2);
          if (weight === 0) continue;
          const angle = 2 * Math.PI * (eigen.realEigenvalues[b] - eigen.realEigenvalues[a]) * time;
          re += weight * Math.cos(angle);
          im += weight * Math.sin(angle);
        }
      }
      return [re, im];
    }),
  );
}

const TIMES = [0, 0.003, 0.02, 0.11, 0.4];

describe('computeTransitionsInto', () => {
  it.each([[[1]], [[1, 1]], [[2, 1]], [[3, 2]], [[1, 1, 1, 1]], [[3, 1, 1]], [[2, 2, 1]], [[1, 1, 1, 1, 1, 1]]])(
    'gives the signal of the dense Hamiltonian for composite spins of %j protons',
    (counts) => {
      const topology = fullTopology(counts);
      const { shifts, couplings } = draw(topology);
      const expected = denseSignal(counts, shifts, couplings, TIMES);
      signal(transitions(topology, shifts, couplings), counts.length, TIMES).forEach((value, i) => {
        expect(Math.abs(value - expected[i])).toBeLessThan(1e-6);
      });
    },
  );

  it('gives every group as many protons as it has', () => {
    const counts = [3, 2, 1, 1, 1];
    const topology = fullTopology(counts);
    const { shifts, couplings } = draw(topology);
    const table = transitions(topology, shifts, couplings, 0);
    counts.forEach((count, g) => {
      let sum = 0;
      for (let l = 0; l < table.lineCount; l += 1) sum += table.groupWeight[l * counts.length + g];
      expect(sum).toBeCloseTo(count, 9);
    });
  });

  it('gives uncoupled components as they would be alone', () => {
    const joint: SpinTopology = {
      spins: [0, 1, 2].map((s) => ({ protonCount: 1, groupIndex: s, shiftIndex: s })),
      groupCount: 3,
      shiftCount: 3,
      couplingCount: 1,
      couplings: [{ spinA: 0, spinB: 1, couplingIndex: 0 }],
    };
    const table = transitions(joint, Float64Array.of(10, 30, -50), Float64Array.of(7));
    const single = Array.from({ length: table.lineCount }, (_, l) => l).filter(
      (l) => table.groupWeight[3 * l + 2] !== 0,
    );
    expect(single.map((l) => [table.frequencyHz[l], table.groupWeight[3 * l + 2]])).toEqual([[-50, 1]]);
  });

  it('leaves its inputs alone and gives the same bytes from a used workspace', () => {
    const topology = fullTopology([2, 1, 1]);
    const compiled = compileSpinTopology(topology);
    const workspace = createTransitionWorkspace(compiled);
    const { shifts, couplings } = draw(topology);
    const copy = [shifts.slice(), couplings.slice()];
    const run = (s: Float64Array, c: Float64Array): TransitionTable => {
      const table = createTransitionTable(compiled);
      computeTransitionsInto(compiled, s, c, workspace, table);
      return table;
    };
    const first = run(shifts, couplings);
    run(Float64Array.of(0, 0, 0), Float64Array.of(1e9, 0, -1e-9));
    expect(run(shifts, couplings)).toEqual(first);
    expect([shifts, couplings]).toEqual(copy);
  });

  it('takes ten protons and refuses eleven in one component, naming both numbers', () => {
    const chain = (count: number): SpinTopology => ({
      spins: Array.from({ length: count }, (_, s) => ({ protonCount: 1, groupIndex: 0, shiftIndex: s })),
      groupCount: 1,
      shiftCount: count,
      couplingCount: 1,
      couplings: Array.from({ length: count - 1 }, (_, s) => ({ spinA: s, spinB: s + 1, couplingIndex: 0 })),
    });
    expect(compileSpinTopology(chain(10)).sizeMax).toBe(252);
    expect(() => compileSpinTopology(chain(11))).toThrow(SystemTooLargeError);
    expect(() => compileSpinTopology(chain(11))).toThrow(/at most 10 protons .* got 11/);
  });

  it('refuses values that are not finite', () => {
    const topology = fullTopology([1, 1]);
    expect(() => transitions(topology, Float64Array.of(1, Number.NaN), Float64Array.of(7))).toThrow('finite');
  });
});

describe('computeTransitionsWithDerivativesInto', () => {
  /** AA'MM'XX': three groups of two protons, shifts and couplings tied by symmetry. */
  const tied: SpinTopology = {
    spins: [0, 0, 1, 1, 2, 2].map((group) => ({ protonCount: 1, groupIndex: group, shiftIndex: group })),
    groupCount: 3,
    shiftCount: 3,
    couplingCount: 5,
    couplings: [
      [0, 2, 0],
      [1, 3, 0],
      [0, 3, 1],
      [1, 2, 1],
      [0, 1, 2],
      [2, 3, 3],
      [4, 5, 4],
      [0, 4, 0],
      [1, 5, 0],
      [0, 5, 1],
      [1, 4, 1],
    ].map(([spinA, spinB, couplingIndex]) => ({ spinA, spinB, couplingIndex })),
  };
  const cases: [string, SpinTopology, Float64Array, Float64Array][] = [
    ['three protons', fullTopology([1, 1, 1]), Float64Array.of(0, 15, 40), Float64Array.of(7, -12, 3)],
    ['a methyl and two protons', fullTopology([3, 1, 1]), Float64Array.of(0, 90, 100), Float64Array.of(7, 2, 15)],
    ['tied symmetric protons', tied, Float64Array.of(0, 200, 550), Float64Array.of(6, 9.2, -13, -12, -14)],
    ['near degenerate shifts', fullTopology([1, 1, 1]), Float64Array.of(0, 0.01, 30), Float64Array.of(7, 5, 6)],
    ['couplings of zero', fullTopology([1, 1, 1]), Float64Array.of(0, 20, 30), Float64Array.of(0, 0, 0)],
  ];

  it.each(cases)(
    'has the derivatives of the signal that central differences show, for %s',
    (_, topology, shifts, couplings) => {
      const compiled = compileSpinTopology(topology, { lineWeightMin: 0 });
      const workspace = createTransitionWorkspace(compiled);
      const derivatives = createTransitionDerivatives(compiled);
      computeTransitionsWithDerivativesInto(compiled, shifts, couplings, workspace, derivatives);
      const { groupCount } = topology;
      const step = 1e-4;
      for (let p = 0; p < compiled.parameterCount; p += 1) {
        const at = (sign: number): number[] => {
          const s = shifts.slice();
          const c = couplings.slice();
          if (p < topology.shiftCount) s[p] += sign * step;
          else c[p - topology.shiftCount] += sign * step;
          return signal(transitions(topology, s, c, 0), groupCount, TIMES);
        };
        const [up, down] = [at(1), at(-1)];
        let i = 0;
        for (const time of TIMES) {
          for (let g = 0; g < groupCount; g += 1) {
            let re = 0;
            let im = 0;
            for (let l = 0; l < derivatives.lineCount; l += 1) {
              const weight = derivatives.groupWeight[l * groupCount + g];
              const weightSlope = derivatives.groupWeightDerivative[(l * groupCount + g) * compiled.parameterCount + p];
              const turn = 2 * Math.PI * time;
              const turnSlope = turn * derivatives.frequencyDerivative[l * compiled.parameterCount + p];
              const cos = Math.cos(turn * derivatives.frequencyHz[l]);
              const sin = Math.sin(turn * derivatives.frequencyHz[l]);
              re += weightSlope * cos - weight * turnSlope * sin;
              im += weightSlope * sin + weight * turnSlope * cos;
            }
            expect(Math.abs(re - (up[i] - down[i]) / (2 * step))).toBeLessThan(2e-5);
            expect(Math.abs(im - (up[i + 1] - down[i + 1]) / (2 * step))).toBeLessThan(2e-5);
            i += 2;
          }
        }
      }
    },
  );
});
