import { describe, expect, it } from 'vitest';
import { discreteFourierTransform } from './discrete-fourier-transform.ts';
import { createRandomStream } from './random-stream.ts';

const random = createRandomStream({ seed: 5n, purpose: 'dft test' });
const draw = (size: number): Float64Array => Float64Array.from({ length: 2 * size }, () => random.nextNormal());

/** The definition, term by term. */
function naive(signal: Float64Array): Float64Array {
  const size = signal.length / 2;
  const output = new Float64Array(2 * size);
  for (let k = 0; k < size; k += 1) {
    for (let n = 0; n < size; n += 1) {
      const angle = (-2 * Math.PI * ((k * n) % size)) / size;
      output[2 * k] += signal[2 * n] * Math.cos(angle) - signal[2 * n + 1] * Math.sin(angle);
      output[2 * k + 1] += signal[2 * n] * Math.sin(angle) + signal[2 * n + 1] * Math.cos(angle);
    }
  }
  return output;
}

describe('discreteFourierTransform', () => {
  it.each([1, 2, 3, 8, 15, 17, 64, 127, 360])('equals the naive sum for %d samples', (size) => {
    const signal = draw(size);
    const before = signal.slice();
    const expected = naive(signal);
    discreteFourierTransform(signal).forEach((value, k) => {
      expect(Math.abs(value - expected[k])).toBeLessThan(1e-11);
    });
    expect(signal).toEqual(before);
  });

  it('puts exp(+2 pi i n 3 / N) into bin 3 alone', () => {
    const size = 21;
    const signal = Float64Array.from({ length: 2 * size }, (_, i) => {
      const angle = (2 * Math.PI * 3 * Math.floor(i / 2)) / size;
      return i % 2 === 0 ? Math.cos(angle) : Math.sin(angle);
    });
    const spectrum = discreteFourierTransform(signal);
    for (let k = 0; k < size; k += 1)
      expect(Math.hypot(spectrum[2 * k], spectrum[2 * k + 1])).toBeCloseTo(k === 3 ? size : 0, 10);
  });

  it('keeps energy by Parseval at a length of a measured FID', () => {
    const signal = draw(16292);
    const energy = (x: Float64Array): number => x.reduce((sum, value) => sum + value * value, 0);
    expect(energy(discreteFourierTransform(signal)) / 16292 / energy(signal)).toBeCloseTo(1, 11);
  });

  it('refuses a buffer that holds no whole complex samples', () => {
    expect(() => discreteFourierTransform(new Float64Array(3))).toThrow('interleaved');
  });
});
