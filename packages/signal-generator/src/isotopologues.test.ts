import { describe, expect, it } from 'vitest';
import { generateSignal } from './generate-signal.ts';
import { type GeneratedComponent, isotopologuesOf } from './isotopologues.ts';

const SAMPLING = { sampleCount: 300, dwellSeconds: 1 / 1500, timeZeroSamples: 0 };
const group = { responseFactor: 1, decayPerSecond: 2 };

function largestDifference(
  component: GeneratedComponent,
  lines: readonly (readonly [hertz: number, amplitude: number])[],
) {
  const signal = generateSignal({
    ...SAMPLING,
    components: [component],
    phaseRadians: 0,
    noiseSdPerComponent: 0,
    seed: 1,
  });
  let worst = 0;
  for (let n = 0; n < SAMPLING.sampleCount; n += 1) {
    const seconds = n * SAMPLING.dwellSeconds;
    let re = signal[2 * n];
    let im = signal[2 * n + 1];
    for (const [hertz, amplitude] of lines) {
      re -= amplitude * Math.exp(-2 * seconds) * Math.cos(2 * Math.PI * hertz * seconds);
      im -= amplitude * Math.exp(-2 * seconds) * Math.sin(2 * Math.PI * hertz * seconds);
    }
    worst = Math.max(worst, Math.hypot(re, im));
  }
  return worst;
}

describe('isotopologuesOf', () => {
  it('puts 13C satellites where they were published for a methyl group at 1.91 ppm', () => {
    // REFERENCE section 6: J 127 Hz, 600.13 MHz, isotope shift -2 ppb: 2.01381 and 1.80219 ppm, 0.535 % each side; hertz from 1.91 ppm here.
    const component: GeneratedComponent = {
      amount: 3,
      spins: [{ shiftHz: 0, group: 0 }],
      couplings: [],
      groups: [group],
      satellites: [{ spins: [0], couplingHz: 127, abundanceFraction: 0.0107, isotopeShiftHz: -0.002 * 600.13 }],
    };
    const hertz = (ppm: number) => (ppm - 1.91) * 600.13;
    const lines = [
      [0, 3 * 0.9893],
      [hertz(2.01381), 3 * 0.00535],
      [hertz(1.80219), 3 * 0.00535],
    ] as const;
    // Places are printed to half of 1e-5 ppm: 2 pi 0.003 Hz 0.2 s of the satellites' 0.032.
    expect(largestDifference(component, lines)).toBeLessThan(2 * Math.PI * 0.5e-5 * 600.13 * 0.2 * 0.0321);
  });

  it('splits by two partners at once, doubly labelled molecules included', () => {
    // By hand: places are labelled independently; 1 - p or p/2 on each side, and the shifts add up.
    const [p, q] = [0.0467, 0.0107];
    const component: GeneratedComponent = {
      amount: 1,
      spins: [{ shiftHz: 30, group: 0 }],
      couplings: [],
      groups: [group],
      satellites: [
        { spins: [0], couplingHz: 6.6, abundanceFraction: p },
        { spins: [0], couplingHz: 118, abundanceFraction: q },
      ],
    };
    const lines = [-1, 0, 1].flatMap((first) =>
      [-1, 0, 1].map((second): [number, number] => [
        30 + 3.3 * first + 59 * second,
        (first === 0 ? 1 - p : p / 2) * (second === 0 ? 1 - q : q / 2),
      ]),
    );
    expect(largestDifference(component, lines)).toBeLessThan(1e-11);
  });

  it('makes two protons on either side of a rare carbon unlike, as in an ABX spectrum', () => {
    // REFERENCE section 1, ABX closed form: equal shifts (here d = 0), J(AB) 7, X couples to A alone by 140: at each state of X an AB pair
    // with d = +-70: D = sqrt(70^2 + 7^2); lines m +- (D + J)/2 and m +- (D - J)/2, amplitudes 1 -+ J/D, halved to count protons.
    const component: GeneratedComponent = {
      amount: 1,
      spins: [
        { shiftHz: 0, group: 0 },
        { shiftHz: 0, group: 0 },
      ],
      couplings: [{ a: 0, b: 1, couplingHz: 7 }],
      groups: [group],
      satellites: [{ spins: [0], couplingHz: 140, abundanceFraction: 1 }],
    };
    const distance = Math.hypot(70, 7);
    const lines = [35, -35].flatMap((mean) =>
      [1, -1].flatMap((side): [number, number][] => [
        [mean + (side * (distance + 7)) / 2, (1 - 7 / distance) / 4],
        [mean + (side * (distance - 7)) / 2, (1 + 7 / distance) / 4],
      ]),
    );
    expect(largestDifference(component, lines)).toBeLessThan(1e-11);
  });

  it('keeps the amount of the whole and hands a plain component on as it is', () => {
    const plain = { amount: 2, spins: [{ shiftHz: 1, group: 0 }], couplings: [], groups: [group] };
    expect(isotopologuesOf(plain)).toEqual([plain]);
    const satellites = [0.3, 0.2, 0.1].map((abundanceFraction) => ({ spins: [0], couplingHz: 5, abundanceFraction }));
    const copies = isotopologuesOf({ ...plain, satellites });
    expect(copies).toHaveLength(27);
    expect(copies.reduce((sum, { amount }) => sum + amount, 0)).toBeCloseTo(2, 14);
  });
});
