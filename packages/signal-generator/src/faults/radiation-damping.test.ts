import { describe, expect, it } from 'vitest';
import { generateSignal } from '../generate-signal.ts';
import { feedBack } from './radiation-damping.ts';

const LINES = [
  { amount: 3, shiftHz: -20, decayPerSecond: 2 },
  { amount: 2, shiftHz: 15, decayPerSecond: 3 },
  { amount: 1, shiftHz: 22, decayPerSecond: 4 },
];
const RECORD = { sampleCount: 300, dwellSeconds: 1 / 1000 };

type Lines = typeof LINES;
type Gain = { readonly decayPerSecond: number; readonly pullRadPerSecond: number };

function damped(lines: Lines, gain: Gain, stepsPerSample: number, timeZeroSamples = 0): Float64Array {
  return generateSignal({
    ...RECORD,
    components: lines.map(({ amount, shiftHz, decayPerSecond }) => ({
      amount,
      spins: [{ shiftHz, group: 0 }],
      couplings: [],
      groups: [{ responseFactor: 1, decayPerSecond }],
    })),
    timeZeroSamples,
    phaseRadians: 0,
    noiseSdPerComponent: 0,
    seed: 1,
    faults: { radiationDamping: { ...gain, ofSignal: 2, stepsPerSample } },
  });
}

/** The law as it stands, line by line, by the classical fourth-order rule: 20 steps a sample. */
function integrated(lines: Lines, gain: Gain, timeZeroSamples: number): Float64Array {
  const [kRe, kIm] = [gain.decayPerSecond / 2, gain.pullRadPerSecond / 2];
  const first = -timeZeroSamples * RECORD.dwellSeconds;
  let state = lines.flatMap(({ amount, shiftHz, decayPerSecond }) => {
    const size = amount * Math.exp(-decayPerSecond * first);
    return [size * Math.cos(2 * Math.PI * shiftHz * first), size * Math.sin(2 * Math.PI * shiftHz * first)];
  });
  const sum = (from: readonly number[], part: number) =>
    from.reduce((all, value, i) => (i % 2 === part ? all + value : all), 0);
  const slope = (at: readonly number[]) => {
    const [re, im] = [sum(at, 0), sum(at, 1)];
    return lines.flatMap(({ amount, shiftHz, decayPerSecond }, l) => {
      const [x, y, w] = [at[2 * l], at[2 * l + 1], 2 * Math.PI * shiftHz];
      return [
        -decayPerSecond * x - w * y - amount * (kRe * re - kIm * im),
        -decayPerSecond * y + w * x - amount * (kRe * im + kIm * re),
      ];
    });
  };
  const moved = (by: readonly number[], factor: number) => state.map((value, i) => value + factor * by[i]);
  const h = RECORD.dwellSeconds / 20;
  const signal: number[] = [];
  for (let n = 0; n < RECORD.sampleCount; n += 1) {
    signal.push(sum(state, 0), sum(state, 1));
    for (let step = 0; step < 20; step += 1) {
      const k1 = slope(state);
      const k2 = slope(moved(k1, h / 2));
      const k3 = slope(moved(k2, h / 2));
      const k4 = slope(moved(k3, h));
      state = state.map((value, i) => value + (h / 6) * (k1[i] + 2 * k2[i] + 2 * k3[i] + k4[i]));
    }
  }
  return Float64Array.from(signal);
}

function largestDifference(a: Float64Array, b: Float64Array): number {
  return a.reduce((worst, value, i) => Math.max(worst, Math.abs(value - b[i])), 0);
}

describe('feedBack', () => {
  it('steps two samples as by hand', () => {
    // S(1) = (F(1) - g K(1) S(0) / 2) / (1 + g K(0) / 2), F = 1, i and K = i, 1: g = 2: (i - 1) / (1 + i) = i; g = i: (i - i / 2) / (1 / 2) = i.
    const [free, answer] = [Float64Array.of(1, 0, 0, 1), Float64Array.of(0, 1, 1, 0)];
    for (const gain of [
      { decayPerSecond: 2, pullRadPerSecond: 0 },
      { decayPerSecond: 0, pullRadPerSecond: 1 },
    ])
      expect([...feedBack(free, answer, { ...gain, ofSignal: 1, stepsPerSample: 1 }, 1)]).toEqual([1, 0, 0, 1]);
  });

  it('broadens and pulls a lone line in proportion to its amplitude', () => {
    // Closed form of the law for one line: a exp((i w - R - k a) t), k a = (1.9 + 0.6 i) 3 / 2.
    const signal = damped([LINES[0]], { decayPerSecond: 1.9, pullRadPerSecond: 0.6 }, 1);
    for (let n = 0; n < RECORD.sampleCount; n += 1) {
      const seconds = n * RECORD.dwellSeconds;
      const size = 3 * Math.exp(-(2 + 2.85) * seconds);
      const angle = (2 * Math.PI * -20 - 0.9) * seconds;
      // The trapezoid turns k a h into (1 - k a h / 2) / (1 + k a h / 2): off by (k a h)^3 / 12 a step, k a h = 0.003.
      const bound = (3 * n * 0.003 ** 3) / 12 + 1e-12;
      expect(
        Math.hypot(signal[2 * n] - size * Math.cos(angle), signal[2 * n + 1] - size * Math.sin(angle)),
      ).toBeLessThan(bound);
    }
  });

  it.each([0, 0.3, -2.4])('couples lines as the law does when time zero lies %d samples in', (timeZeroSamples) => {
    const gain = { decayPerSecond: 1.9, pullRadPerSecond: 0.6 };
    const difference = largestDifference(
      damped(LINES, gain, 8, timeZeroSamples),
      integrated(LINES, gain, timeZeroSamples),
    );
    // Lines at most 42 Hz apart, 1/8000 s a step: the trapezoid is off by (2 pi 42 / 8000)^2 / 12 = 9e-5 of what the feedback adds,
    // at most k S(0) 0.3 s = 2 times S(0) = 6.
    expect(difference).toBeLessThan(9.1e-5 * 12);
    expect(
      largestDifference(damped(LINES, { decayPerSecond: 0, pullRadPerSecond: 0 }, 1), integrated(LINES, gain, 0)),
    ).toBeGreaterThan(0.5);
  });

  it('errs four times less for steps half as long', () => {
    const gain = { decayPerSecond: 1.9, pullRadPerSecond: 0.6 };
    const exact = integrated(LINES, gain, 0);
    const [coarse, fine] = [4, 8].map((steps) => largestDifference(damped(LINES, gain, steps), exact));
    // Second order; the next term, (2 pi 42 / 4000)^2 relative, moves the ratio by under 1 %.
    expect(Math.abs(coarse / fine - 4)).toBeLessThan(0.04);
  });

  it('changes nothing where there is no feedback', () => {
    const none = { decayPerSecond: 0, pullRadPerSecond: 0 };
    const free = damped(LINES, none, 1);
    expect(largestDifference(free, integrated(LINES, none, 0))).toBeLessThan(1e-6);
    expect(largestDifference(damped(LINES, none, 3), free)).toBeLessThan(1e-11);
  });
});
