import { describe, expect, it } from 'vitest';
import { createSeededDraws } from './seeded-draws.ts';

/** The golden step that the sequence takes before each word. */
const STEP = 0x9e3779b9;

describe('createSeededDraws', () => {
  // The 32-bit hash of an empty text with seed s is its finaliser of s: published test vectors of MurmurHash3 (from memory).
  it.each([
    [0x00000001, 0x514e28b7],
    [0xffffffff, 0x81f16f39],
  ])('makes of the word %d what the published finaliser does', (word, hash) => {
    const seed = (word - STEP) >>> 0;
    // A uniform draw takes its upper 27 bits from the first word.
    expect(Math.floor(createSeededDraws(seed).uniform(0, 1) * 2 ** 27)).toBe(hash >>> 5);
  });

  it('draws uniform and normal variates of the right moments', () => {
    const draws = createSeededDraws(3);
    const n = 20000;
    const uniforms = Array.from({ length: n }, () => draws.uniform(0, 1));
    const normals = Array.from({ length: n }, () => draws.normal());
    const mean = (x: readonly number[]): number => x.reduce((sum, value) => sum + value, 0) / n;
    expect(Math.abs(mean(uniforms) - 0.5)).toBeLessThan(5 / Math.sqrt(12 * n));
    expect(Math.abs(mean(normals))).toBeLessThan(5 / Math.sqrt(n));
    expect(Math.abs(mean(normals.map((x) => x * x)) - 1)).toBeLessThan(5 * Math.sqrt(2 / n));
  });

  it('fills a hundred bins evenly', () => {
    const draws = createSeededDraws(11);
    const counts = new Float64Array(100);
    for (let i = 0; i < 100000; i += 1) counts[draws.index(100)] += 1;
    const chiSquare = counts.reduce((sum, count) => sum + (count - 1000) ** 2 / 1000, 0);
    // 99 degrees of freedom: mean 99, sd sqrt(198); five of them either way.
    expect(Math.abs(chiSquare - 99)).toBeLessThan(5 * Math.sqrt(198));
  });

  it('keeps streams of near seeds from overlapping', () => {
    // Words repeat where seeds differ by a multiple of the step: none of the first 2^17 comes within 10,000 of 0 modulo 2^32.
    let nearest = 2 ** 32;
    for (let k = 1; k <= 2 ** 17; k += 1) {
      const rest = (k * STEP) % 2 ** 32;
      nearest = Math.min(nearest, rest, 2 ** 32 - rest);
    }
    expect(nearest).toBeGreaterThan(10000);
  });

  it('repeats itself for the same seed only', () => {
    const five = (seed: number) => {
      const draws = createSeededDraws(seed);
      return [1, 2, 3, 4, 5].map(() => draws.normal());
    };
    expect(five(7)).toEqual(five(7));
    expect(five(7)).not.toEqual(five(8));
  });

  it.each([-1, 0.5, 2 ** 32, Number.NaN])('refuses the seed %d', (seed) => {
    expect(() => createSeededDraws(seed)).toThrow(`whole number from 0 to 2^32 - 1, got ${seed}`);
  });
});
