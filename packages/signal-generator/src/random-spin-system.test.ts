import { describe, expect, it } from 'vitest';
import { RANDOM_SYSTEM_RANGES, randomComponent, randomSpinSystem } from './random-spin-system.ts';

const SEEDS = Array.from({ length: 300 }, (_, i) => i + 1);
const SPIN_COUNTS = [1, 2, 3, 4, 5, 6];

function isWithin(value: number, { low, high }: { readonly low: number; readonly high: number }): boolean {
  return value >= low && value <= high;
}

describe('randomSpinSystem', () => {
  it('keeps every value within the ranges written down', () => {
    const ranges = RANDOM_SYSTEM_RANGES;
    const couplingRanges = {
      geminal: ranges.geminalHz,
      vicinal: ranges.vicinalHz,
      'long-range': ranges.longRangeHz,
    };
    const shifts = { low: ranges.shiftPpm.low, high: ranges.shiftPpm.high + ranges.geminalSeparationPpm.high };
    for (const seed of SEEDS) {
      const system = randomSpinSystem(seed, SPIN_COUNTS[seed % 6]);
      expect(system.shiftsPpm).toHaveLength(SPIN_COUNTS[seed % 6]);
      expect(system.shiftsPpm.every((shift) => isWithin(shift, shifts))).toBe(true);
      expect(isWithin(system.linewidthHz, ranges.linewidthHz)).toBe(true);
      for (const { a, b, kind, couplingHz } of system.couplings) {
        expect(isWithin(couplingHz, couplingRanges[kind])).toBe(true);
        expect(b - a === 1 || b - a === 2).toBe(true);
        if (kind === 'geminal')
          expect(isWithin(system.shiftsPpm[b] - system.shiftsPpm[a], ranges.geminalSeparationPpm)).toBe(true);
      }
    }
  });

  it('couples each proton to its neighbours and next neighbours once', () => {
    for (const spinCount of SPIN_COUNTS) {
      const pairs = randomSpinSystem(17, spinCount).couplings.map(({ a, b }) => `${a}-${b}`);
      expect(new Set(pairs).size).toBe(pairs.length);
      expect(pairs).toHaveLength(Math.max(0, spinCount - 1) + Math.max(0, spinCount - 2));
    }
  });

  it('makes every kind of coupling often enough to matter', () => {
    const kinds = SEEDS.flatMap((seed) => randomSpinSystem(seed, 5).couplings.map(({ kind }) => kind));
    // By hand, the rarest: geminal at the four places of neighbours with 0.3, 0.21, 0.237, 0.229, so 0.976 of 7 couplings (14 %); a tenth
    // of 2,100 lies over five standard deviations below.
    for (const kind of ['geminal', 'vicinal', 'long-range'])
      expect(kinds.filter((k) => k === kind).length).toBeGreaterThan(kinds.length / 10);
  });

  it('is the same for the same seed', () => {
    expect(randomSpinSystem(5, 4)).toEqual(randomSpinSystem(5, 4));
    expect(randomSpinSystem(5, 4)).not.toEqual(randomSpinSystem(6, 4));
  });
});

describe('randomComponent', () => {
  it('places shifts above the carrier at positive frequencies and widths as decays', () => {
    const system = { shiftsPpm: [5.7, 3.7], couplings: [], linewidthHz: 1.5 };
    const { spins, groups, amount } = randomComponent(system, { amount: 2, hertzPerPpm: 500, carrierPpm: 4.7 });
    // By hand: +-1 ppm at 500 Hz/ppm; R = pi w.
    expect(spins[0].shiftHz).toBeCloseTo(500, 9);
    expect(spins[1].shiftHz).toBeCloseTo(-500, 9);
    expect(spins.map(({ group }) => group)).toEqual([0, 1]);
    expect(groups.map(({ decayPerSecond }) => decayPerSecond)).toEqual([1.5 * Math.PI, 1.5 * Math.PI]);
    expect(amount).toBe(2);
  });
});
