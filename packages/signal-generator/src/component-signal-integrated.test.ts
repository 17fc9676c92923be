import { describe, expect, it } from 'vitest';
import { addComponentSignal, type GeneratedIsotopologue, type GeneratedSampling } from './component-signal.ts';

describe('addComponentSignal against a slow, obvious version', () => {
  it('agrees with the equation of motion integrated in small steps', () => {
    const component: GeneratedIsotopologue = {
      amount: 1.5,
      spins: [
        { shiftHz: 60, group: 1 },
        { shiftHz: -35, group: 0 },
        { shiftHz: 48, group: 1 },
      ],
      couplings: [
        { a: 0, b: 1, couplingHz: 9 },
        { a: 0, b: 2, couplingHz: -13 },
        { a: 2, b: 1, couplingHz: 3 },
      ],
      groups: [
        { responseFactor: 1, decayPerSecond: 4 },
        { responseFactor: 0.6, decayPerSecond: 1 },
      ],
    };
    const sampling = { sampleCount: 40, dwellSeconds: 1 / 1000, timeZeroSamples: 0 };
    const signal = new Float64Array(2 * sampling.sampleCount);
    addComponentSignal(component, sampling, signal);
    const slow = integratedSignal(component, sampling, 100);
    // Fourth order, 1e-5 s a step: (2 pi 75 Hz 1e-5 s)^4 2 pi 75 Hz 0.04 s / 120 = 8e-11, of 4.5 protons.
    expect(signal.reduce((worst, value, i) => Math.max(worst, Math.abs(value - slow[i])), 0)).toBeLessThan(1e-9);
  });
});

/** Pauli matrices over two, row-major, up first. I_y is imaginary: iy is i I_y, and I_y I_y = -(i I_y)(i I_y). */
const OPERATORS = {
  x: [0, 0.5, 0.5, 0],
  iy: [0, 0.5, -0.5, 0],
  z: [0.5, 0, 0, -0.5],
  raise: [0, 1, 0, 0],
  lower: [0, 0, 1, 0],
};
const ONE = [1, 0, 0, 1];

/** The signal by small steps on all 2^n states, nothing split off and nothing exponentiated. */
function integratedSignal(
  component: GeneratedIsotopologue,
  { sampleCount, dwellSeconds }: GeneratedSampling,
  stepCount: number,
): Float64Array {
  const { amount, spins, groups } = component;
  const size = 1 << spins.length;
  const hamiltonian = denseHamiltonian(component);
  let m: Complex = { re: new Float64Array(size * size), im: new Float64Array(size * size) };
  for (const s of spins.keys()) accumulate(m.re, 1, placed('lower', s, spins.length));
  const traceWithRaised = (matrix: Float64Array, s: number): number => {
    const seen = product(placed('raise', s, spins.length), matrix, size);
    return Array.from({ length: size }, (_, i) => seen[i * size + i]).reduce((sum, value) => sum + value, 0);
  };
  const signal = new Float64Array(2 * sampleCount);
  for (let n = 0; n < sampleCount; n += 1) {
    spins.forEach(({ group }, s) => {
      const { responseFactor, decayPerSecond } = groups[group];
      const scale = (amount * responseFactor * Math.exp(-decayPerSecond * n * dwellSeconds)) / (size / 2);
      signal[2 * n] += scale * traceWithRaised(m.re, s);
      signal[2 * n + 1] += scale * traceWithRaised(m.im, s);
    });
    for (let step = 0; step < stepCount; step += 1) m = rungeKuttaStep(hamiltonian, m, size, dwellSeconds / stepCount);
  }
  return signal;
}

interface Complex {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

/** Of one spin's operator times one on all other spins. */
function placed(kind: keyof typeof OPERATORS, at: number, spinCount: number): Float64Array {
  let all: Float64Array = Float64Array.of(1);
  for (let s = 0; s < spinCount; s += 1) all = kronecker(all, s === at ? OPERATORS[kind] : ONE);
  return all;
}

function denseHamiltonian({ spins, couplings }: GeneratedIsotopologue): Float64Array {
  const n = spins.length;
  const size = 1 << n;
  const hamiltonian = new Float64Array(size * size);
  for (const [s, { shiftHz }] of spins.entries()) accumulate(hamiltonian, shiftHz, placed('z', s, n));
  for (const { a, b, couplingHz } of couplings) {
    for (const kind of ['x', 'iy', 'z'] as const) {
      const sign = kind === 'iy' ? -1 : 1;
      accumulate(hamiltonian, sign * couplingHz, product(placed(kind, a, n), placed(kind, b, n), size));
    }
  }
  return hamiltonian;
}

/** One step of the classical fourth-order rule for dM/dt = -2 pi i [H, M]. */
function rungeKuttaStep(hamiltonian: Float64Array, m: Complex, size: number, h: number): Complex {
  const turned = (matrix: Float64Array): Float64Array => {
    const [left, right] = [product(hamiltonian, matrix, size), product(matrix, hamiltonian, size)];
    return left.map((value, i) => 2 * Math.PI * (value - right[i]));
  };
  const slope = ({ re, im }: Complex): Complex => ({ re: turned(im), im: turned(re).map((value) => -value) });
  const moved = (by: Complex, factor: number): Complex => ({
    re: m.re.map((value, k) => value + factor * by.re[k]),
    im: m.im.map((value, k) => value + factor * by.im[k]),
  });
  const k1 = slope(m);
  const k2 = slope(moved(k1, h / 2));
  const k3 = slope(moved(k2, h / 2));
  const k4 = slope(moved(k3, h));
  const mean = (part: 're' | 'im') =>
    k1[part].map((value, k) => (value + 2 * k2[part][k] + 2 * k3[part][k] + k4[part][k]) / 6);
  return moved({ re: mean('re'), im: mean('im') }, h);
}

function kronecker(a: Float64Array, two: readonly number[]): Float64Array {
  const size = Math.sqrt(a.length);
  const out = new Float64Array(4 * a.length);
  for (let i = 0; i < 2 * size; i += 1) {
    for (let j = 0; j < 2 * size; j += 1) {
      out[i * 2 * size + j] = a[(i >> 1) * size + (j >> 1)] * two[2 * (i & 1) + (j & 1)];
    }
  }
  return out;
}

function product(a: Float64Array, b: Float64Array, size: number): Float64Array {
  const out = new Float64Array(size * size);
  for (let i = 0; i < size; i += 1) {
    for (let k = 0; k < size; k += 1) {
      for (let j = 0; j < size; j += 1) out[i * size + j] += a[i * size + k] * b[k * size + j];
    }
  }
  return out;
}

function accumulate(out: Float64Array, factor: number, matrix: Float64Array): void {
  for (let i = 0; i < out.length; i += 1) out[i] += factor * matrix[i];
}
