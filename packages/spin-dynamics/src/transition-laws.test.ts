import { createRandomStream, type RandomStream } from '@spinassay/numerics';
import { describe, expect, it } from 'vitest';
import { compileSpinTopology } from './compile-spin-topology.ts';
import { computeTransitionsInto, computeTransitionsWithDerivativesInto } from './compute-transitions.ts';
import type { SpinTopology } from './spin-topology.ts';
import {
  createTransitionDerivatives,
  createTransitionTable,
  type TransitionDerivatives,
  type TransitionTable,
} from './transition-table.ts';
import { createTransitionWorkspace } from './transition-workspace.ts';

/** A system of composite spins, each its own group and shift, every pair coupled. */
interface System {
  readonly counts: readonly number[];
  readonly shifts: readonly number[];
  /** (spins x spins) symmetric, Hz. */
  readonly couplings: readonly (readonly number[])[];
}

function drawSystem(counts: readonly number[], random: RandomStream): System {
  const couplings = counts.map(() => counts.map(() => 0));
  counts.forEach((_, a) => {
    for (let b = 0; b < a; b += 1) {
      couplings[a][b] = 30 * random.nextUniform() - 15;
      couplings[b][a] = couplings[a][b];
    }
  });
  return { counts, shifts: counts.map(() => 300 * random.nextUniform() - 150), couplings };
}

function prepare({ counts, shifts, couplings }: System): {
  topology: SpinTopology;
  shiftsHz: Float64Array;
  couplingsHz: Float64Array;
} {
  const pairs = counts.flatMap((_, spinA) => counts.slice(0, spinA).map((__, spinB) => ({ spinA, spinB })));
  return {
    topology: {
      spins: counts.map((protonCount, s) => ({ protonCount, groupIndex: s, shiftIndex: s })),
      groupCount: counts.length,
      shiftCount: counts.length,
      couplingCount: pairs.length,
      couplings: pairs.map((pair, couplingIndex) => ({ ...pair, couplingIndex })),
    },
    shiftsHz: Float64Array.from(shifts),
    couplingsHz: Float64Array.from(pairs, ({ spinA, spinB }) => couplings[spinA][spinB]),
  };
}

function allLines(system: System): TransitionTable {
  const { topology, shiftsHz, couplingsHz } = prepare(system);
  const compiled = compileSpinTopology(topology, { lineWeightMin: 0 });
  const table = createTransitionTable(compiled);
  computeTransitionsInto(compiled, shiftsHz, couplingsHz, createTransitionWorkspace(compiled), table);
  return table;
}

/** Weight of line l over all groups, protons. */
function lineWeight({ groupWeight }: TransitionTable, groupCount: number, line: number): number {
  let sum = 0;
  for (let g = 0; g < groupCount; g += 1) sum += groupWeight[line * groupCount + g];
  return sum;
}

describe('sum rules', () => {
  // REFERENCE section 2 (trace method: Anderson & Weiss 1953; Van Vleck, Phys. Rev. 74 (1948) 1168), per proton. A composite spin
  // counts as its protons; couplings among them never show.
  it.each([[[1, 1]], [[1, 1, 1, 1]], [[3, 2, 1]], [[2, 2, 2, 1]], [[1, 1, 1, 1, 1, 1, 1]], [[6, 1, 3]]])(
    'hold to 1e-9 for composite spins of %j protons',
    (counts) => {
      const system = drawSystem(counts, createRandomStream({ seed: 31n, purpose: 'sum rules', member: counts.length }));
      const { shifts, couplings } = system;
      const protons = counts.reduce((sum, count) => sum + count, 0);
      const expectedMean = counts.reduce((sum, count, s) => sum + count * shifts[s], 0) / protons;
      const moments = [0, 0, 0, 0, 0];
      const expected = [0, 0, 0, 0, 0];
      counts.forEach((count, a) => {
        let power = count / protons;
        for (let order = 0; order < 5; order += 1) {
          expected[order] += power;
          power *= shifts[a] - expectedMean;
        }
        for (let b = 0; b < a; b += 1) {
          const product = couplings[a][b] * (shifts[a] - shifts[b]);
          expected[4] += (count * counts[b] * product * product) / (2 * protons);
        }
      });
      const table = allLines(system);
      for (let l = 0; l < table.lineCount; l += 1) {
        let power = lineWeight(table, counts.length, l) / protons;
        for (let order = 0; order < 5; order += 1) {
          moments[order] += power;
          power *= table.frequencyHz[l] - expectedMean;
        }
      }
      // Moments of order n are measured against the size that shifts of some 100 Hz give them; order 1 is 0.
      let scale = 1;
      moments.forEach((moment, order) => {
        expect(Math.abs(moment - expected[order])).toBeLessThan(1e-9 * scale);
        scale *= 100;
      });
    },
  );

  it('holds the printed moments of the four-spin row to their digits when no line is dropped', () => {
    // REFERENCE section 2, last row: total 32, M1 77.625, central M2 1113.921875, M3 -2631.12891, M4 2002997.2900.
    const j = (pairs: [number, number, number][]): number[][] => {
      const matrix = [0, 1, 2, 3].map(() => [0, 0, 0, 0]);
      for (const [a, b, value] of pairs) {
        matrix[a][b] = value;
        matrix[b][a] = value;
      }
      return matrix;
    };
    const table = allLines({
      counts: [1, 1, 1, 1],
      shifts: [120, 97, 60.5, 33],
      couplings: j([
        [0, 1, 7],
        [0, 2, -12.5],
        [0, 3, 1.1],
        [1, 2, 4.4],
        [1, 3, 9.9],
        [2, 3, 15.2],
      ]),
    });
    const moment = (about: number, order: number): number => {
      let sum = 0;
      for (let l = 0; l < table.lineCount; l += 1) {
        let term = lineWeight(table, 4, l) * 8;
        for (let k = 0; k < order; k += 1) term *= table.frequencyHz[l] - about;
        sum += term;
      }
      return order === 0 ? sum : sum / 32;
    };
    expect(Math.abs(moment(0, 0) - 32)).toBeLessThan(1e-9);
    expect(Math.abs(moment(0, 1) - 77.625)).toBeLessThan(1e-9);
    expect(Math.abs(moment(77.625, 2) - 1113.921875)).toBeLessThan(1e-8);
    expect(Math.abs(moment(77.625, 3) + 2631.12891)).toBeLessThan(0.51e-5);
    expect(Math.abs(moment(77.625, 4) - 2002997.29)).toBeLessThan(0.51e-4);
  });
});

describe('labels and frames', () => {
  /** Lines as (frequency, weights in the order of `groups`), sorted, those within a rounding of each other merged. */
  function listed(table: TransitionTable, groups: readonly number[]): number[][] {
    const rows = Array.from({ length: table.lineCount }, (_, l) => [
      table.frequencyHz[l],
      ...groups.map((g) => table.groupWeight[l * groups.length + g]),
    ]).sort((a, b) => a[0] - b[0]);
    const merged: number[][] = [];
    for (const row of rows) {
      const last = merged.at(-1);
      if (last === undefined || row[0] - last[0] > 1e-7) merged.push(row);
      else
        row.slice(1).forEach((weight, g) => {
          last[g + 1] += weight;
        });
    }
    return merged.filter((row) => row.slice(1).some((weight) => Math.abs(weight) > 1e-7));
  }

  function expectSame(a: number[][], b: number[][], shift = 0): void {
    expect(a.length).toBe(b.length);
    a.forEach((row, l) => {
      row.forEach((value, k) => {
        expect(Math.abs(value - b[l][k] - (k === 0 ? shift : 0))).toBeLessThan(1e-8);
      });
    });
  }

  const system = drawSystem([1, 3, 2, 1], createRandomStream({ seed: 32n, purpose: 'permutation' }));

  it.each([[[3, 2, 1, 0]], [[1, 2, 3, 0]], [[0, 2, 1, 3]]])(
    'gives the same lines when spins are named in the order %j',
    (order) => {
      const renamed: System = {
        counts: order.map((s) => system.counts[s]),
        shifts: order.map((s) => system.shifts[s]),
        couplings: order.map((a) => order.map((b) => system.couplings[a][b])),
      };
      // Group k of the renamed system is group order[k] of the first.
      const back = system.counts.map((_, s) => order.indexOf(s));
      expectSame(listed(allLines(renamed), back), listed(allLines(system), [0, 1, 2, 3]));
    },
  );

  it('moves all lines by what all shifts move by, and turns them over with the sign of every shift', () => {
    const moved = { ...system, shifts: system.shifts.map((shift) => shift + 1234.5) };
    expectSame(listed(allLines(moved), [0, 1, 2, 3]), listed(allLines(system), [0, 1, 2, 3]), 1234.5);
    const mirrored = { ...system, shifts: system.shifts.map((shift) => -shift) };
    const turned = listed(allLines(mirrored), [0, 1, 2, 3])
      .map(([frequency, ...weights]) => [-frequency, ...weights])
      .reverse();
    expectSame(turned, listed(allLines(system), [0, 1, 2, 3]));
  });
});

describe('derivatives', () => {
  function derive(system: System, lineWeightMin: number): { out: TransitionDerivatives; parameterCount: number } {
    const { topology, shiftsHz, couplingsHz } = prepare(system);
    const compiled = compileSpinTopology(topology, { lineWeightMin });
    const out = createTransitionDerivatives(compiled);
    computeTransitionsWithDerivativesInto(compiled, shiftsHz, couplingsHz, createTransitionWorkspace(compiled), out);
    return { out, parameterCount: compiled.parameterCount };
  }

  const counts = [2, 1, 3, 1];
  const system = drawSystem(counts, createRandomStream({ seed: 33n, purpose: 'derivative laws' }));

  it("keep every group's protons, and its mean frequency moves with its own shift alone when summed over groups", () => {
    const { out, parameterCount } = derive(system, 0);
    const groupCount = counts.length;
    for (let p = 0; p < parameterCount; p += 1) {
      const change = counts.map(() => 0);
      let meanChange = 0;
      for (let l = 0; l < out.lineCount; l += 1) {
        for (let g = 0; g < groupCount; g += 1) {
          const slope = out.groupWeightDerivative[(l * groupCount + g) * parameterCount + p];
          change[g] += slope;
          meanChange += slope * out.frequencyHz[l];
        }
        meanChange += lineWeight(out, groupCount, l) * out.frequencyDerivative[l * parameterCount + p];
      }
      for (const value of change) expect(Math.abs(value)).toBeLessThan(1e-9);
      // Sum of weight times frequency is sum of protons times shift (first sum rule): its slope by shift p is that spin's protons.
      expect(Math.abs(meanChange - (p < groupCount ? counts[p] : 0))).toBeLessThan(1e-7);
    }
  });

  it('move every line by one when all shifts move by one, and no weight', () => {
    const { out, parameterCount } = derive(system, 0);
    for (let l = 0; l < out.lineCount; l += 1) {
      let sum = 0;
      for (let s = 0; s < counts.length; s += 1) sum += out.frequencyDerivative[l * parameterCount + s];
      expect(Math.abs(sum - 1)).toBeLessThan(1e-10);
      for (let g = 0; g < counts.length; g += 1) {
        let slope = 0;
        for (let s = 0; s < counts.length; s += 1) {
          slope += out.groupWeightDerivative[(l * counts.length + g) * parameterCount + s];
        }
        expect(Math.abs(slope)).toBeLessThan(1e-10);
      }
    }
  });

  it('come with the frequencies and weights that are given without them, bit for bit', () => {
    const { out } = derive(system, 0);
    const table = allLines(system);
    const groupCount = counts.length;
    expect(out.lineCount).toBe(table.lineCount);
    expect(out.frequencyHz.subarray(0, out.lineCount)).toEqual(table.frequencyHz.subarray(0, table.lineCount));
    expect(out.groupWeight.subarray(0, out.lineCount * groupCount)).toEqual(
      table.groupWeight.subarray(0, table.lineCount * groupCount),
    );
  });

  it('are the same bytes from a used workspace and table', () => {
    const { topology, shiftsHz, couplingsHz } = prepare(system);
    const compiled = compileSpinTopology(topology);
    const workspace = createTransitionWorkspace(compiled);
    const out = createTransitionDerivatives(compiled);
    const run = (shifts: Float64Array, couplings: Float64Array): Float64Array[] => {
      computeTransitionsWithDerivativesInto(compiled, shifts, couplings, workspace, out);
      const lines = out.lineCount;
      const width = topology.groupCount * compiled.parameterCount;
      return [
        out.frequencyHz.slice(0, lines),
        out.groupWeight.slice(0, lines * topology.groupCount),
        out.frequencyDerivative.slice(0, lines * compiled.parameterCount),
        out.groupWeightDerivative.slice(0, lines * width),
      ];
    };
    const first = run(shiftsHz, couplingsHz);
    run(
      new Float64Array(shiftsHz.length),
      couplingsHz.map((value) => 3 * value + 1),
    );
    expect(run(shiftsHz, couplingsHz)).toEqual(first);
  });
});
