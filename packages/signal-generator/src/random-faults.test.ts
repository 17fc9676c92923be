import { describe, expect, it } from 'vitest';
import { FAULT_RANGES } from './fault-ranges.ts';
import { randomFaults } from './random-faults.ts';

const SETTING = { protonSignal: 1000, lowHz: -1500, highHz: -200, stepsPerSample: 2 };
const SEEDS = Array.from({ length: 200 }, (_, i) => i + 1);

function expectWithin(value: number | undefined, { low, high }: { readonly low: number; readonly high: number }): void {
  expect(value).toBeGreaterThanOrEqual(low);
  expect(value).toBeLessThanOrEqual(high);
}

describe('randomFaults', () => {
  it('keeps every fault within the ranges written down', () => {
    const ranges = FAULT_RANGES;
    const scaled = ({ low, high }: { low: number; high: number }) => ({ low: 1000 * low, high: 1000 * high });
    for (const seed of SEEDS) {
      const faults = randomFaults({ ...SETTING, seed });
      expectWithin(faults.unknownLines?.length, { low: 1, high: ranges.unknownLineCountMax });
      for (const { amount, shiftHz, splittingHz, decayPerSecond } of faults.unknownLines ?? []) {
        expectWithin(amount, scaled(ranges.unknownLineAmount));
        expectWithin(shiftHz, { low: -1500, high: -200 });
        expectWithin(decayPerSecond, ranges.unknownDecayPerSecond);
        if (splittingHz !== undefined) expectWithin(splittingHz, ranges.unknownSplittingHz);
      }
      const damping = faults.radiationDamping;
      expectWithin(damping?.decayPerSecond, ranges.radiationDecayPerSecond);
      expectWithin(Number(damping?.pullRadPerSecond) / Number(damping?.decayPerSecond), ranges.radiationPullPerDecay);
      expect(damping?.ofSignal).toBe(1000);
      expect(faults.shim).toHaveLength(ranges.shimCopyCount);
      for (const { share, offsetHz, extraDecayPerSecond } of faults.shim ?? []) {
        expectWithin(share, ranges.shimShare);
        expectWithin(offsetHz, ranges.shimOffsetHz);
        expectWithin(extraDecayPerSecond, ranges.shimExtraDecayPerSecond);
      }
      expectWithin(faults.fieldDrift?.hertzPerSecond, ranges.driftHertzPerSecond);
      expectWithin(faults.fieldDrift?.scanRangeHz, ranges.driftScanRangeHz);
      const errors = ranges.firstSampleErrors.flatMap((range) => Array.from({ length: range.count }, () => range));
      expect(faults.firstSampleErrors).toHaveLength(16);
      for (const [n, range] of errors.entries()) expectWithin(faults.firstSampleErrors?.[n], range);
      for (const part of ['re', 'im'] as const)
        expectWithin(faults.receiverOffset?.[part], scaled(ranges.receiverOffset));
      for (const part of ['driftRePerSecond', 'driftImPerSecond'] as const)
        expectWithin(faults.receiverOffset?.[part], scaled(ranges.receiverDriftPerSecond));
    }
  });

  it('draws singlets and doublets alike, and one to three of them', () => {
    const lines = SEEDS.map((seed) => randomFaults({ ...SETTING, seed }).unknownLines ?? []);
    expect(new Set(lines.map(({ length }) => length))).toEqual(new Set([1, 2, 3]));
    const all = lines.flat();
    const doublets = all.filter(({ splittingHz }) => splittingHz !== undefined).length;
    // Half of them, five standard errors of a binomial count.
    expect(Math.abs(doublets - all.length / 2)).toBeLessThan(2.5 * Math.sqrt(all.length));
  });

  it('is the same for the same seed', () => {
    expect(randomFaults({ ...SETTING, seed: 3 })).toEqual(randomFaults({ ...SETTING, seed: 3 }));
    expect(randomFaults({ ...SETTING, seed: 3 })).not.toEqual(randomFaults({ ...SETTING, seed: 4 }));
  });
});
