import { createRandomStream } from '@spinassay/numerics';
import { describe, expect, it } from 'vitest';
import { estimateNoise } from './estimate-noise.ts';
import { taperedSpectrum } from './tapered-spectrum.ts';

const SAMPLE_COUNT = 8192;
const DWELL = 1 / 5000;
const SIGMA = 3;

function noisyFid(amplitude: number): Float64Array {
  const random = createRandomStream({ seed: 7n, purpose: 'noise test' });
  return Float64Array.from({ length: 2 * SAMPLE_COUNT }, (_, i) => {
    const seconds = Math.floor(i / 2) * DWELL;
    const angle = 2 * Math.PI * 321.5 * seconds;
    const line = amplitude * Math.exp(-4 * seconds) * (i % 2 === 0 ? Math.cos(angle) : Math.sin(angle));
    return line + SIGMA * random.nextNormal();
  });
}

describe('estimateNoise', () => {
  // The median of n exponential variates has relative sd 1 / (ln 2 sqrt n); half of it in sigma. Neighbouring tapered bins
  // are correlated over about two bins, so n is halved. Six of these sd: 1 in 5e8.
  const tolerance = 6 * (0.5 / (Math.LN2 * Math.sqrt(SAMPLE_COUNT / 2)));

  it.each([0, 1e5])('finds the level of white noise under a line of amplitude %d', (amplitude) => {
    const estimate = estimateNoise(taperedSpectrum(noisyFid(amplitude), 16, DWELL));
    expect(Math.abs(estimate.sdPerComponent / SIGMA - 1)).toBeLessThan(tolerance);
    expect(estimate.quietBinCount).toBeGreaterThan(SAMPLE_COUNT / 2);
  });
});
