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
