import { describe, expect, it } from 'vitest';
import { choleskyInto, choleskyLogDeterminant, choleskySolveInto } from './cholesky.ts';
import { ConvergenceError } from './errors.ts';
import { logSumExp } from './log-sum-exp.ts';
import { normalCdf } from './normal-distribution.ts';
import { median, quantile } from './order-statistics.ts';
import { createRandomStream, createXoshiro128 } from './random-stream.ts';

describe('cholesky', () => {
  it('factors, solves and weighs the matrix done by hand', () => {
    const matrix = Float64Array.of(4, 2, 2, 5);
    const factor = new Float64Array(4);
    choleskyInto(2, matrix, factor);
    expect([...factor]).toEqual([2, 0, 1, 2]);
    const solution = new Float64Array(2);
    choleskySolveInto(2, factor, Float64Array.of(8, 12), solution);
    expect([...solution]).toEqual([1, 2]);
    expect(choleskyLogDeterminant(2, factor)).toBeCloseTo(Math.log(16), 14);
  });

  it('refuses a matrix that is not positive definite', () => {
    expect(() => choleskyInto(2, Float64Array.of(1, 2, 2, 1), new Float64Array(4))).toThrow(ConvergenceError);
  });
});

describe('normalCdf', () => {
  // Abramowitz & Stegun table 26.1 (from memory to these digits) and the usual 95 % point.
  it.each([
    [0, 0.5],
    [1, 0.841344746068543],
    [2, 0.977249868051821],
    [-3, 0.00134989803163],
    [1.959963984540054, 0.975],
  ])('is %d -> %d', (x, expected) => {
    expect(normalCdf(x)).toBeCloseTo(expected, 13);
  });

  it('joins its two expansions without a step', () => {
    const at = 2 * Math.SQRT2;
    expect(normalCdf(-at * (1 - 1e-13)) / normalCdf(-at * (1 + 1e-13))).toBeCloseTo(1, 10);
  });
});

describe('order statistics', () => {
  it('interpolates quantiles and takes medians of odd and even samples', () => {
    expect(quantile([1, 2, 3, 4], 0.25)).toBe(1.75);
    expect(median([5, 1, 3])).toBe(3);
    expect(median([4, 1, 3, 2])).toBe(2.5);
    expect(() => median([])).toThrow('at least one');
  });
});

describe('logSumExp', () => {
  it('survives exponents that overflow', () => {
    expect(logSumExp([1000, 1000])).toBeCloseTo(1000 + Math.LN2, 12);
    expect(logSumExp([])).toBe(Number.NEGATIVE_INFINITY);
  });
});

describe('random streams', () => {
  it('gives the words that the published recurrence gives from the state 1, 2, 3, 4', () => {
    // First three words worked by hand from Blackman & Vigna's listing: rotl(5 s1, 7) 9 and the update.
    const next = createXoshiro128(Uint32Array.of(1, 2, 3, 4));
    expect([next(), next(), next()]).toEqual([11520, 0, 5927040]);
  });

  it('gives the uniforms of an independent implementation in whole numbers of the published listings', () => {
    // FNV-1a, SplitMix64 and xoshiro128** once more, in BigInt from their listings; Fowler, Noll & Vo's offset and prime.
    const wide = (1n << 64n) - 1n;
    const narrow = (1n << 32n) - 1n;
    const turn = (word: bigint, bits: bigint): bigint => ((word << bits) | (word >> (32n - bits))) & narrow;
    let digest = 14695981039346656037n;
    for (const byte of Buffer.from('77/3/4/moves')) digest = ((digest ^ BigInt(byte)) * 1099511628211n) & wide;
    const state = [0, 1].flatMap(() => {
      digest = (digest + 11400714819323198485n) & wide;
      let z = digest;
      z = ((z ^ (z >> 30n)) * 13787848793156543929n) & wide;
      z = ((z ^ (z >> 27n)) * 10723151780598845931n) & wide;
      z ^= z >> 31n;
      return [z & narrow, z >> 32n];
    });
    const word = (): bigint => {
      const [s0, s1, s2, s3] = state;
      const shifted = (s1 << 9n) & narrow;
      const [t2, t3] = [s2 ^ s0, s3 ^ s1];
      state.splice(0, 4, s0 ^ t3, s1 ^ t2, t2 ^ shifted, turn(t3, 11n));
      return (turn((s1 * 5n) & narrow, 7n) * 9n) & narrow;
    };
    const stream = createRandomStream({ seed: 77n, purpose: 'moves', population: 3, member: 4 });
    for (let k = 0; k < 1000; k += 1) {
      const bits = ((word() >> 5n) << 26n) | (word() >> 6n);
      expect(stream.nextUniform()).toBe((Number(bits) + 0.5) / 9007199254740992);
    }
  });

  it('draws whole numbers evenly and refuses a bound below one', () => {
    const stream = createRandomStream({ seed: 2n, purpose: 'integers' });
    const counts = new Array<number>(10).fill(0);
    for (let k = 0; k < 10000; k += 1) counts[stream.nextInteger(10)] += 1;
    const square = counts.reduce((sum, count) => sum + ((count - 1000) * (count - 1000)) / 1000, 0);
    // REFERENCE section 5: chi-squared of nine degrees, upper 1 %; the stream is seeded, so this is one draw of it.
    expect(square).toBeLessThan(21.66599);
    expect(() => stream.nextInteger(0)).toThrow('bound');
  });

  it('repeats itself for a key and differs for another purpose, population, member or seed', () => {
    const first = (key: Parameters<typeof createRandomStream>[0]): number => createRandomStream(key).nextUniform();
    const key = { seed: 9n, purpose: 'a', population: 1, member: 2 };
    expect(first(key)).toBe(first({ ...key }));
    const others = [{ seed: 10n }, { purpose: 'b' }, { population: 2 }, { member: 3 }].map((change) =>
      first({ ...key, ...change }),
    );
    expect(new Set([first(key), ...others]).size).toBe(5);
  });

  it('has uniform and normal draws of the right mean and variance', () => {
    const stream = createRandomStream({ seed: 1n, purpose: 'moments' });
    const n = 20000;
    const normals = Array.from({ length: n }, () => stream.nextNormal());
    const uniforms = Array.from({ length: n }, () => stream.nextUniform());
    const mean = (x: number[]): number => x.reduce((sum, value) => sum + value, 0) / n;
    // Five standard errors each.
    expect(Math.abs(mean(normals))).toBeLessThan(5 / Math.sqrt(n));
    expect(Math.abs(mean(normals.map((x) => x * x)) - 1)).toBeLessThan(5 * Math.sqrt(2 / n));
    expect(Math.abs(mean(uniforms) - 0.5)).toBeLessThan(5 / Math.sqrt(12 * n));
  });
});
