import { describe, expect, it } from 'vitest';
import { type GeneratedMeasurement, generateMeasurement } from './generate-measurement.ts';
import { generateSignal } from './generate-signal.ts';
import { randomFaults } from './random-faults.ts';

const group = { responseFactor: 0.5, decayPerSecond: 3 };
const plain: GeneratedMeasurement = {
  components: [
    {
      amount: 4,
      spins: [
        { shiftHz: 30, group: 0 },
        { shiftHz: -50, group: 1 },
        { shiftHz: -50, group: 1 },
      ],
      couplings: [
        { a: 0, b: 1, couplingHz: 7 },
        { a: 0, b: 2, couplingHz: 7 },
      ],
      groups: [group, { ...group, responseFactor: 1 }],
    },
    { amount: 9, spins: [{ shiftHz: 0, group: 0 }], couplings: [], groups: [{ ...group, responseFactor: 1 }] },
  ],
  sampleCount: 256,
  dwellSeconds: 1 / 1000,
  timeZeroSamples: 0,
  phaseRadians: 0,
  noiseSdPerComponent: 0,
  seed: 1,
};
const everyFault = {
  ...randomFaults({ seed: 9, protonSignal: 4, lowHz: -200, highHz: 200, stepsPerSample: 2 }),
  fullScaleCounts: 12,
};

function largestDifference(a: Float64Array, b: Float64Array): number {
  return a.reduce((worst, value, i) => Math.max(worst, Math.abs(value - b[i])), 0);
}

describe('generateMeasurement', () => {
  it('says what each group starts at: amount times protons times response', () => {
    const { samples, truth } = generateMeasurement(plain);
    // By hand: 4 x 1 x 0.5, 4 x 2 x 1; 9 x 1 x 1.
    expect(truth.groupStarts).toEqual([[2, 8], [9]]);
    expect(samples[0]).toBeCloseTo(19, 12);
    expect(samples[1]).toBeCloseTo(0, 12);
  });

  it('keeps the faultless signal beside the faulty one', () => {
    const faultless = { ...plain, phaseRadians: 0.4, timeZeroSamples: 0.2 };
    const { samples, truth } = generateMeasurement({ ...faultless, noiseSdPerComponent: 0.1, faults: everyFault });
    expect(truth.faultlessSamples).toEqual(generateSignal(faultless));
    expect(largestDifference(samples, truth.faultlessSamples)).toBeGreaterThan(1);
    expect(generateMeasurement(faultless).samples).toEqual(truth.faultlessSamples);
  });

  it('hands over whole counts within full scale, and says how many were clipped', () => {
    const { samples, truth } = generateMeasurement({ ...plain, faults: everyFault });
    expect(samples.every((value) => Number.isInteger(value) && Math.abs(value) <= 12)).toBe(true);
    const { fullScaleCounts: _, ...open } = everyFault;
    const unclipped = generateMeasurement({ ...plain, faults: open });
    expect(truth.clippedCount).toBe(unclipped.samples.filter((value) => Math.abs(Math.round(value)) > 12).length);
    expect(truth.clippedCount).toBeGreaterThan(0);
    expect(unclipped.truth.clippedCount).toBe(0);
  });

  it('adds an unknown singlet and an unknown doublet that start where the known lines do', () => {
    const unknownLines = [
      { amount: 0.3, shiftHz: 80, decayPerSecond: 4 },
      { amount: 0.2, shiftHz: -120, splittingHz: 6, decayPerSecond: 2 },
    ];
    const { samples, truth } = generateMeasurement({ ...plain, phaseRadians: 0.5, faults: { unknownLines } });
    for (let n = 0; n < plain.sampleCount; n += 1) {
      const seconds = n * plain.dwellSeconds;
      const angle = (hertz: number) => 2 * Math.PI * hertz * seconds + 0.5;
      const [one, two] = [0.3 * Math.exp(-4 * seconds), 0.1 * Math.exp(-2 * seconds)];
      // Closed form: one line, and two of half the amount 6 Hz apart.
      const re = one * Math.cos(angle(80)) + two * (Math.cos(angle(-117)) + Math.cos(angle(-123)));
      const im = one * Math.sin(angle(80)) + two * (Math.sin(angle(-117)) + Math.sin(angle(-123)));
      expect(Math.abs(samples[2 * n] - truth.faultlessSamples[2 * n] - re)).toBeLessThan(1e-11);
      expect(Math.abs(samples[2 * n + 1] - truth.faultlessSamples[2 * n + 1] - im)).toBeLessThan(1e-11);
    }
  });

  it('makes the same bytes for the same seed, every fault at once, and leaves what it was given', () => {
    const measurement = { ...plain, noiseSdPerComponent: 0.1, faults: everyFault };
    const before = structuredClone(measurement);
    expect(generateMeasurement(measurement)).toEqual(generateMeasurement(measurement));
    expect(measurement).toEqual(before);
    expect(generateSignal({ ...measurement, seed: 2 })).not.toEqual(generateSignal(measurement));
  });
});
