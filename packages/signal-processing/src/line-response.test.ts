import { describe, expect, it } from 'vitest';
import { createBinGrid, type DampedLine, lineResponseInto } from './line-response.ts';
import { softWindowedSpectrum } from './soft-windowed-spectrum.ts';

const sampling = { sampleCount: 509, dwellSeconds: 1 / 4000, softWindowPerSecond: 0 };
const line: DampedLine = { frequencyHz: 123.4, decayPerSecond: 7.5, leadSamples: 16.3 };

/** The definition itself: exp(s (n0 - tau + m) dt), term by term. */
function directSum(at: DampedLine, kappa: number, bin: number): [number, number] {
  let re = 0;
  let im = 0;
  for (let m = 0; m < sampling.sampleCount; m += 1) {
    const seconds = (at.leadSamples + m) * sampling.dwellSeconds;
    const size = Math.exp(-at.decayPerSecond * seconds - kappa * m * sampling.dwellSeconds);
    const angle = 2 * Math.PI * (at.frequencyHz * seconds - (bin * m) / sampling.sampleCount);
    re += size * Math.cos(angle);
    im += size * Math.sin(angle);
  }
  const scale = 1 / Math.sqrt(sampling.sampleCount);
  return [re * scale, im * scale];
}

function response(at: DampedLine, kappa = 0): { value: Float64Array; slope: Float64Array } {
  const grid = createBinGrid({ ...sampling, firstBin: -5, binCount: 40, softWindowPerSecond: kappa });
  const value = new Float64Array(80);
  const slope = new Float64Array(80);
  lineResponseInto(grid, at, value, slope);
  return { value, slope };
}

describe('lineResponseInto', () => {
  it.each([0, 30])('equals the direct sum under a soft window of %d per second', (kappa) => {
    const { value } = response(line, kappa);
    for (let k = 0; k < 40; k += 1) {
      const [re, im] = directSum(line, kappa, k - 5);
      expect(Math.hypot(value[2 * k] - re, value[2 * k + 1] - im)).toBeLessThan(1e-10);
    }
  });

  it('equals the transform of the sampled exponential', () => {
    const samples = new Float64Array(2 * (16 + sampling.sampleCount));
    for (let n = 0; n < samples.length / 2; n += 1) {
      const seconds = (n + 0.3) * sampling.dwellSeconds;
      const size = Math.exp(-line.decayPerSecond * seconds);
      samples[2 * n] = size * Math.cos(2 * Math.PI * line.frequencyHz * seconds);
      samples[2 * n + 1] = size * Math.sin(2 * Math.PI * line.frequencyHz * seconds);
    }
    const spectrum = softWindowedSpectrum(samples, { ...sampling, firstSampleIndex: 16 });
    const { value } = response(line);
    for (let k = 5; k < 40; k += 1) {
      expect(Math.abs(value[2 * k] - spectrum[2 * (k - 5)])).toBeLessThan(1e-10);
      expect(Math.abs(value[2 * k + 1] - spectrum[2 * (k - 5) + 1])).toBeLessThan(1e-10);
    }
  });

  it('has the derivative that central differences show, by frequency and by decay', () => {
    const step = 1e-4;
    const { slope } = response(line);
    const up = response({ ...line, decayPerSecond: line.decayPerSecond + step }).value;
    const down = response({ ...line, decayPerSecond: line.decayPerSecond - step }).value;
    const right = response({ ...line, frequencyHz: line.frequencyHz + step }).value;
    const left = response({ ...line, frequencyHz: line.frequencyHz - step }).value;
    for (let k = 0; k < 80; k += 2) {
      expect(-slope[k]).toBeCloseTo((up[k] - down[k]) / (2 * step), 7);
      // d/df = 2 pi i d/ds
      expect(-2 * Math.PI * slope[k + 1]).toBeCloseTo((right[k] - left[k]) / (2 * step), 5);
      expect(2 * Math.PI * slope[k]).toBeCloseTo((right[k + 1] - left[k + 1]) / (2 * step), 5);
    }
  });
});
