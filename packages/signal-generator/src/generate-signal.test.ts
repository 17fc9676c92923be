import { describe, expect, it } from 'vitest';
import type { GeneratedMeasurement } from './generate-measurement.ts';
import { generateSignal } from './generate-signal.ts';
import type { GeneratedComponent } from './isotopologues.ts';

const plain = {
  sampleCount: 400,
  dwellSeconds: 1 / 2000,
  timeZeroSamples: 0,
  phaseRadians: 0,
  noiseSdPerComponent: 0,
  seed: 1,
};
const group = { responseFactor: 1, decayPerSecond: 3 };

function make(component: GeneratedComponent, change: Partial<GeneratedMeasurement> = {}): Float64Array {
  return generateSignal({ ...plain, ...change, components: [component] });
}

describe('generateSignal', () => {
  it('makes a damped exponential of an isolated proton, phase and time zero included', () => {
    const signal = make(
      { amount: 2, spins: [{ shiftHz: -123.4, group: 0 }], couplings: [], groups: [group] },
      { phaseRadians: 0.7, timeZeroSamples: 0.3 },
    );
    for (let n = 0; n < plain.sampleCount; n += 1) {
      const seconds = (n - 0.3) * plain.dwellSeconds;
      const size = 2 * Math.exp(-3 * seconds);
      const angle = 2 * Math.PI * -123.4 * seconds + 0.7;
      expect(
        Math.hypot(signal[2 * n] - size * Math.cos(angle), signal[2 * n + 1] - size * Math.sin(angle)),
      ).toBeLessThan(1e-10);
    }
  });

  it('makes the four lines of the AB closed form', () => {
    // REFERENCE section 1: A 110, B 100, J 8, amplitudes divided by 2 to count protons.
    const lines = [
      [94.5969, 0.3753],
      [102.5969, 1.6247],
      [107.4031, 1.6247],
      [115.4031, 0.3753],
    ];
    const signal = make({
      amount: 1,
      spins: [
        { shiftHz: 110, group: 0 },
        { shiftHz: 100, group: 0 },
      ],
      couplings: [{ a: 0, b: 1, couplingHz: 8 }],
      groups: [group],
    });
    for (let n = 0; n < plain.sampleCount; n += 1) {
      const seconds = n * plain.dwellSeconds;
      let re = 0;
      for (const [frequency, amplitude] of lines)
        re += (amplitude / 2) * Math.cos(2 * Math.PI * frequency * seconds) * Math.exp(-3 * seconds);
      // Lines are published to 1e-4 Hz: 2 pi 1e-4 t, t up to 0.2 s, four lines.
      expect(Math.abs(signal[2 * n] - re)).toBeLessThan(5e-4);
    }
  });

  it('starts at the protons of each group times its response, whatever is coupled', () => {
    const signal = make({
      amount: 1,
      spins: [0, 0, 0, 1, 2].map((g, s) => ({ shiftHz: 40 * s, group: g })),
      couplings: [
        { a: 0, b: 3, couplingHz: 7 },
        { a: 3, b: 4, couplingHz: -12 },
      ],
      groups: [group, { ...group, responseFactor: 0.5 }, { ...group, responseFactor: 0.25 }],
    });
    expect(signal[0]).toBeCloseTo(3.75, 12);
    expect(signal[1]).toBeCloseTo(0, 12);
  });

  it('adds noise of the level asked for and the same for the same seed', () => {
    const component = { amount: 0, spins: [{ shiftHz: 0, group: 0 }], couplings: [], groups: [group] };
    const noise = (seed: number): Float64Array => make(component, { sampleCount: 10000, noiseSdPerComponent: 2, seed });
    const square = noise(5).reduce((sum, x) => sum + x * x, 0) / 20000;
    // Five standard errors of a mean of 20,000 squares.
    expect(Math.abs(square / 4 - 1)).toBeLessThan(5 * Math.sqrt(2 / 20000));
    expect(noise(5)).toEqual(noise(5));
    expect(noise(5)).not.toEqual(noise(6));
  });

  it('leaves the signal alone when a shim copy carries no share', () => {
    const component = { amount: 1, spins: [{ shiftHz: 50, group: 0 }], couplings: [], groups: [group] };
    expect(make(component, { faults: { shim: [{ share: 0, offsetHz: 3, extraDecayPerSecond: 1 }] } })).toEqual(
      make(component),
    );
  });

  it('refuses seven spins, naming the limit', () => {
    const spins = Array.from({ length: 7 }, () => ({ shiftHz: 0, group: 0 }));
    expect(() => make({ amount: 1, spins, couplings: [], groups: [group] })).toThrow('1 to 6 spins');
  });
});
