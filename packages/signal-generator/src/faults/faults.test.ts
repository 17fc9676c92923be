import { describe, expect, it } from 'vitest';
import { createSeededDraws } from '../seeded-draws.ts';
import { digitise } from './digitise.ts';
import { applyFieldDrift } from './field-drift.ts';
import { spoilFirstSamples } from './first-samples.ts';
import { addReceiverOffset } from './receiver-offset.ts';
import { applyShim } from './shim.ts';
import { addWhiteNoise } from './white-noise.ts';

const SAMPLING = { sampleCount: 500, dwellSeconds: 1 / 1000, timeZeroSamples: 0.25 };
const secondsOf = (n: number) => (n - SAMPLING.timeZeroSamples) * SAMPLING.dwellSeconds;

/** A line, by its closed form. */
function line(hertz: number, decayPerSecond: number, amplitude = 1): Float64Array {
  return Float64Array.from({ length: 2 * SAMPLING.sampleCount }, (_, i) => {
    const seconds = secondsOf(i >> 1);
    const angle = 2 * Math.PI * hertz * seconds;
    return amplitude * Math.exp(-decayPerSecond * seconds) * (i % 2 === 0 ? Math.cos(angle) : Math.sin(angle));
  });
}

function largestDifference(a: Float64Array, b: Float64Array): number {
  return a.reduce((worst, value, i) => Math.max(worst, Math.abs(value - b[i])), 0);
}

describe('applyShim', () => {
  it('makes of each line the line and its shifted, broadened copies', () => {
    const signal = line(40, 2).map((value, i) => value + 0.5 * line(-90, 3)[i]);
    applyShim(
      signal,
      [
        { share: 0.2, offsetHz: 0.8, extraDecayPerSecond: 1 },
        { share: 0.1, offsetHz: -1.5, extraDecayPerSecond: 4 },
      ],
      SAMPLING,
    );
    const parts = [
      line(40, 2, 0.7),
      line(40.8, 3, 0.2),
      line(38.5, 6, 0.1),
      line(-90, 3, 0.35),
      line(-89.2, 4, 0.1),
      line(-91.5, 7, 0.05),
    ];
    const expected = signal.map((_, i) => parts.reduce((sum, part) => sum + part[i], 0));
    expect(largestDifference(signal, expected)).toBeLessThan(1e-13);
  });
});

describe('applyFieldDrift', () => {
  it('moves the frequency of a line at the rate asked for', () => {
    const signal = line(10, 0);
    applyFieldDrift(signal, { hertzPerSecond: 30, scanRangeHz: 0 }, SAMPLING);
    // By hand: the phase gained between two neighbours is 2 pi dt times the frequency half way, 10 Hz + 30 Hz/s t.
    for (let n = 1; n < SAMPLING.sampleCount; n += 1) {
      const [a, b, c, d] = signal.subarray(2 * n - 2, 2 * n + 2);
      const gained = Math.atan2(a * d - b * c, a * c + b * d);
      const hertz = gained / (2 * Math.PI * SAMPLING.dwellSeconds);
      expect(hertz).toBeCloseTo(10 + 30 * (secondsOf(n) - SAMPLING.dwellSeconds / 2), 9);
    }
  });

  it('is the mean over scans that are spread evenly', () => {
    const signal = line(10, 2);
    applyFieldDrift(signal, { hertzPerSecond: 0, scanRangeHz: 6 }, SAMPLING);
    const scanCount = 2000;
    const mean = new Float64Array(signal.length);
    for (let scan = 0; scan < scanCount; scan += 1) {
      line(7 + (6 * (scan + 0.5)) / scanCount, 2).forEach((value, i) => {
        mean[i] += value / scanCount;
      });
    }
    // Midpoint rule over 6 Hz at t up to 0.5 s: (2 pi t 6 / 2000)^2 / 24 = 4e-6.
    expect(largestDifference(signal, mean)).toBeLessThan(4e-6);
  });

  it('leaves a signal alone to the bit when nothing drifts', () => {
    const signal = line(10, 2);
    applyFieldDrift(signal, { hertzPerSecond: 0, scanRangeHz: 0 }, SAMPLING);
    expect(largestDifference(signal, line(10, 2))).toBe(0);
  });
});

describe('spoilFirstSamples', () => {
  it('moves the first samples by their share of the rms and no other', () => {
    // By hand: an undamped line of amplitude 2 has rms 2.
    const signal = line(33, 0, 2);
    spoilFirstSamples(signal, [1.2, 0.2, 0.05], createSeededDraws(4));
    const clean = line(33, 0, 2);
    const moved = Array.from({ length: SAMPLING.sampleCount }, (_, n) =>
      Math.hypot(signal[2 * n] - clean[2 * n], signal[2 * n + 1] - clean[2 * n + 1]),
    );
    [2.4, 0.4, 0.1].forEach((size, n) => {
      expect(moved[n]).toBeCloseTo(size, 12);
    });
    expect(moved.slice(3).every((size) => size === 0)).toBe(true);
  });
});

describe('addReceiverOffset', () => {
  it('adds a constant and its drift from the first sample on', () => {
    const signal = new Float64Array(6);
    addReceiverOffset(signal, { re: 0.5, im: -0.25, driftRePerSecond: 2, driftImPerSecond: 4 }, 0.125);
    expect([...signal]).toEqual([0.5, -0.25, 0.75, 0.25, 1, 0.75]);
  });
});

describe('addWhiteNoise', () => {
  it('adds circular noise of the level asked for, without memory', () => {
    const count = 20000;
    const noise = new Float64Array(2 * count);
    addWhiteNoise(noise, 3, createSeededDraws(8));
    const mean = (of: (n: number) => number) =>
      Array.from({ length: count }, (_, n) => of(n)).reduce((a, b) => a + b) / count;
    const [re, im] = [0, 1].map((part) => (n: number) => noise[2 * (n % count) + part]);
    // Five standard errors each: of means (3 / sqrt n), of squares (9 sqrt(2 / n)), of products (9 / sqrt n).
    const error = 5 / Math.sqrt(count);
    for (const part of [re, im]) {
      expect(Math.abs(mean(part))).toBeLessThan(3 * error);
      expect(Math.abs(mean((n) => part(n) * part(n)) - 9)).toBeLessThan(9 * Math.SQRT2 * error);
      expect(Math.abs(mean((n) => part(n) * part(n + 1)))).toBeLessThan(9 * error);
    }
    expect(Math.abs(mean((n) => re(n) * im(n)))).toBeLessThan(9 * error);
    // Kurtosis 3, as of a normal law: variance of x^4 is 96 sd^8.
    expect(Math.abs(mean((n) => (re(n) / 3) ** 4) - 3)).toBeLessThan(Math.sqrt(96) * error);
  });
});

describe('digitise', () => {
  it('rounds to counts, holds at full scale and counts what it clipped', () => {
    const signal = Float64Array.of(1.4, -1.6, 99, -250);
    expect(digitise(signal, 100)).toBe(1);
    expect([...signal]).toEqual([1, -2, 99, -100]);
  });

  it('adds an error even over one count: variance 1/12', () => {
    // Widrow, IRE Trans. Circuit Theory 3 (1956) 266 (from memory). Variance of the squared even error: 1/180.
    const draws = createSeededDraws(2);
    const exact = Float64Array.from({ length: 20000 }, () => draws.uniform(-1000, 1000));
    const signal = exact.slice();
    digitise(signal, 32767);
    const variance = signal.reduce((sum, value, i) => sum + (value - exact[i]) ** 2, 0) / exact.length;
    expect(Math.abs(variance - 1 / 12)).toBeLessThan(5 / Math.sqrt(180 * exact.length));
  });
});
