import { describe, expect, it } from 'vitest';
import { compileSpinTopology } from './compile-spin-topology.ts';
import { computeTransitionsWithDerivativesInto } from './compute-transitions.ts';
import { LINE_WEIGHT_MIN } from './conventions.ts';
import { createTransitionDerivatives, type TransitionDerivatives } from './transition-table.ts';
import { createTransitionWorkspace } from './transition-workspace.ts';

/** Two protons, each its own group and shift, J 8 Hz; derivatives by shift A, shift B, J. */
function pair(shiftA: number, shiftB: number, lineWeightMin: number): TransitionDerivatives {
  const compiled = compileSpinTopology(
    {
      spins: [0, 1].map((s) => ({ protonCount: 1, groupIndex: s, shiftIndex: s })),
      groupCount: 2,
      shiftCount: 2,
      couplingCount: 1,
      couplings: [{ spinA: 0, spinB: 1, couplingIndex: 0 }],
    },
    { lineWeightMin },
  );
  const out = createTransitionDerivatives(compiled);
  const workspace = createTransitionWorkspace(compiled);
  computeTransitionsWithDerivativesInto(compiled, Float64Array.of(shiftA, shiftB), Float64Array.of(8), workspace, out);
  return out;
}

/**
 * d/dp of sum_l w_lA f_l, the first moment of group A. The coupling commutes with the total spin, so the moment is the shift of A
 * and its slopes by shift A, shift B, J are 1, 0, 0 (trace method, Van Vleck, Phys. Rev. 74 (1948) 1168, applied to one group).
 */
function momentSlopes({ lineCount, ...out }: TransitionDerivatives): number[] {
  return [0, 1, 2].map((p) => {
    let sum = 0;
    for (let l = 0; l < lineCount; l += 1) {
      sum += out.groupWeightDerivative[2 * l * 3 + p] * out.frequencyHz[l];
      sum += out.groupWeight[2 * l] * out.frequencyDerivative[l * 3 + p];
    }
    return sum;
  });
}

function expectOwnShift(slopes: readonly number[]): void {
  [1, 0, 0].forEach((expected, p) => {
    expect(Math.abs(slopes[p] - expected)).toBeLessThan(1e-6);
  });
}

describe('slopes of lines below the weight limit', () => {
  it('are not needed where shifts differ: each group moves with its own shift', () => {
    expectOwnShift(momentSlopes(pair(50, 60, LINE_WEIGHT_MIN)));
    expectOwnShift(momentSlopes(pair(50, 50.1, LINE_WEIGHT_MIN)));
  });

  it('are there at equal shifts when no line is dropped', () => {
    expectOwnShift(momentSlopes(pair(50, 50, 0)));
  });

  it('cancel over the groups at equal shifts: the whole signal turns as 2 pi i t exp(2 pi i nu t), half the slope of both', () => {
    const { lineCount, ...out } = pair(50, 50, LINE_WEIGHT_MIN);
    for (const time of [0, 0.01, 0.1, 0.37, 1]) {
      let re = 0;
      let im = 0;
      for (let l = 0; l < lineCount; l += 1) {
        const weight = out.groupWeight[2 * l] + out.groupWeight[2 * l + 1];
        const weightSlope = out.groupWeightDerivative[2 * l * 3] + out.groupWeightDerivative[(2 * l + 1) * 3];
        const turn = 2 * Math.PI * time * out.frequencyHz[l];
        const turnSlope = 2 * Math.PI * time * out.frequencyDerivative[l * 3];
        re += weightSlope * Math.cos(turn) - weight * turnSlope * Math.sin(turn);
        im += weightSlope * Math.sin(turn) + weight * turnSlope * Math.cos(turn);
      }
      expect(Math.abs(re + 2 * Math.PI * time * Math.sin(100 * Math.PI * time))).toBeLessThan(1e-9);
      expect(Math.abs(im - 2 * Math.PI * time * Math.cos(100 * Math.PI * time))).toBeLessThan(1e-9);
    }
  });

  // The trouble: at exactly equal shifts an outer line has weight 0 for each group, but crosses zero there with a slope. It is
  // dropped by its weight, and its slope with it. It shows only where groups have response factors or decays of their own.
  it.fails('are kept by group at equal shifts', () => {
    expectOwnShift(momentSlopes(pair(50, 50, LINE_WEIGHT_MIN)));
  });
});
