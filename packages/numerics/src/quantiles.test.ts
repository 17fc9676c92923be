import { describe, expect, it } from 'vitest';
import { chiSquareQuantile } from './chi-square-quantile.ts';
import { DomainError } from './errors.ts';
import { logGamma } from './log-gamma.ts';
import { normalCdf } from './normal-distribution.ts';
import { normalQuantile } from './normal-quantile.ts';
import { studentQuantile } from './student-quantile.ts';

/** Relative difference. */
const off = (found: number, expected: number): number => Math.abs(found / expected - 1);

describe('logGamma', () => {
  // Abramowitz & Stegun 6.1.8 to 6.1.12 and factorials: exact values, their logarithms by Math.log.
  it.each([
    [0.5, 0.5 * Math.log(Math.PI)],
    [1.5, 0.5 * Math.log(Math.PI) - Math.LN2],
    [1, 0],
    [2, 0],
    [5, Math.log(24)],
    [11, Math.log(3628800)],
    [21, Math.log(2432902008176640000)],
  ])('of %d is exact to rounding', (x, expected) => {
    expect(Math.abs(logGamma(x) - expected)).toBeLessThan(4e-15 * Math.max(1, expected));
  });

  it('keeps the duplication formula (Abramowitz & Stegun 6.1.18) on both sides of the shift', () => {
    for (const x of [1e-6, 0.3, 2.7, 4.9, 5.1, 9.99, 10.01, 37, 1e4]) {
      const doubled = logGamma(x) + logGamma(x + 0.5) + (2 * x - 1) * Math.LN2 - 0.5 * Math.log(Math.PI);
      expect(Math.abs(logGamma(2 * x) - doubled)).toBeLessThan(1e-14 * Math.max(1, x * Math.log(x + 1)));
    }
  });

  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])('refuses %d', (x) => {
    expect(() => logGamma(x)).toThrow(DomainError);
  });
});

describe('normalQuantile', () => {
  // Abramowitz & Stegun table 26.5 and the usual points, from memory to these digits.
  it.each([
    [0.9, 1.2815515655446],
    [0.975, 1.959963984540054],
    [0.995, 2.575829303548901],
    [1e-10, -6.361340902404],
  ])('of %d is %d', (probability, expected) => {
    expect(off(normalQuantile(probability), expected)).toBeLessThan(1e-12);
  });

  it('undoes normalCdf from the far tail to the middle', () => {
    for (let x = -36; x <= 0; x += 0.37) expect(Math.abs(normalQuantile(normalCdf(x)) - x)).toBeLessThan(4e-14);
    expect(Math.abs(normalQuantile(0.5))).toBeLessThan(1e-15);
    expect(normalQuantile(0.75)).toBe(-normalQuantile(0.25));
  });

  it.each([0, 1, -0.1, 1.1, Number.NaN])('refuses the probability %d', (probability) => {
    expect(() => normalQuantile(probability)).toThrow(DomainError);
  });
});

describe('studentQuantile', () => {
  // REFERENCE section 4: JCGM 100 H.1 (t of 2.57 for 95 %, 5 degrees; 2.92078 for 99 %, 16) and G.4.1 (2.154697 = 1.029466 t95(19)).
  it('is the coverage factor of the examples of JCGM 100', () => {
    expect(Math.abs(studentQuantile(0.975, 5) - 2.57)).toBeLessThan(0.005);
    expect(Math.abs(studentQuantile(0.995, 16) - 2.92078)).toBeLessThan(0.6e-5);
    expect(Math.abs(1.029466 * studentQuantile(0.975, 19) - 2.154697)).toBeLessThan(2e-6);
  });

  // REFERENCE: Grubbs critical values, one-sided t(1 - a / n), two-sided t(1 - a / 2n), n - 2 degrees; four decimals.
  it.each([
    [3, 1.1531, 1.1546, 1.1543, 1.1547],
    [5, 1.6714, 1.7489, 1.715, 1.7637],
    [6, 1.8221, 1.9442, 1.8871, 1.9728],
    [8, 2.0317, 2.2208, 2.1266, 2.2744],
    [10, 2.1761, 2.4097, 2.29, 2.4821],
    [20, 2.5566, 2.8838, 2.7082, 3.0008],
  ])('gives the Grubbs limits of %d values', (n, ...printed) => {
    const limit = (tail: number): number => {
      const t = studentQuantile(1 - tail, n - 2);
      return ((n - 1) / Math.sqrt(n)) * Math.sqrt((t * t) / (n - 2 + t * t));
    };
    [0.05 / n, 0.01 / n, 0.05 / (2 * n), 0.01 / (2 * n)].forEach((tail, k) => {
      expect(Math.abs(limit(tail) - printed[k])).toBeLessThan(0.51e-4);
    });
  });

  it('has the closed forms of one, two and four degrees of freedom', () => {
    for (const p of [1e-200, 1e-9, 0.01, 0.2, 0.49, 0.4999999]) {
      // Cauchy: t = -cot(pi p). Two degrees: t = (2p - 1) / sqrt(2 p (1 - p)).
      expect(off(studentQuantile(p, 1), -1 / Math.tan(Math.PI * p))).toBeLessThan(1e-9);
      expect(off(studentQuantile(p, 2), (2 * p - 1) / Math.sqrt(2 * p * (1 - p)))).toBeLessThan(1e-9);
    }
    for (const p of [0.001, 0.05, 0.3]) {
      // Four degrees (Shaw, J. Comput. Finance 9 (2006) 37, from memory): a = 4p(1-p), t = -2 sqrt(cos(acos(sqrt a)/3)/sqrt a - 1).
      const root = Math.sqrt(4 * p * (1 - p));
      expect(off(studentQuantile(p, 4), -2 * Math.sqrt(Math.cos(Math.acos(root) / 3) / root - 1))).toBeLessThan(1e-12);
    }
  });

  it('goes over into the normal quantile as Abramowitz & Stegun 26.7.5 says, and is odd', () => {
    for (const p of [0.6, 0.975, 0.995]) {
      const z = normalQuantile(p);
      const square = z * z;
      const terms = [
        (z * (square + 1)) / 4,
        (z * (5 * square * square + 16 * square + 3)) / 96,
        (z * (((3 * square + 19) * square + 17) * square - 15)) / 384,
        (z * ((((79 * square + 776) * square + 1482) * square - 1920) * square - 945)) / 92160,
      ];
      for (const nu of [1e3, 1e5, 1e7, 1e9, 1e12, 1e18]) {
        const expected = terms.reduceRight((sum, term) => (sum + term) / nu, 0) + z;
        // The term left out is at most 8.5 / nu^5 for these z, 9e-15 at 1,000; beside it the 1e-13 of the tail that normalCdf
        // promises, times tail over density, 0.35 at most.
        expect(Math.abs(studentQuantile(p, nu) - expected)).toBeLessThan(4.4e-14);
      }
    }
    const z = normalQuantile(0.975);
    expect(studentQuantile(0.975, Number.POSITIVE_INFINITY)).toBe(z);
    expect(studentQuantile(0.25, 7)).toBe(-studentQuantile(0.75, 7));
    expect(Math.abs(studentQuantile(0.5, 7))).toBeLessThan(1e-15);
  });

  it.each([
    [0.975, 0.5],
    [0.975, Number.NaN],
    [1, 5],
    [0, 5],
  ])('refuses the probability %d with %d degrees of freedom', (probability, nu) => {
    expect(() => studentQuantile(probability, nu)).toThrow(DomainError);
  });
});

describe('chiSquareQuantile', () => {
  // REFERENCE section 5: upper 5 and 1 % of 9 and 19 degrees, five decimals.
  it.each([
    [0.95, 9, 16.91898],
    [0.99, 9, 21.66599],
    [0.95, 19, 30.14353],
    [0.99, 19, 36.19087],
  ])('at %d with %d degrees is %d', (probability, nu, expected) => {
    expect(Math.abs(chiSquareQuantile(probability, nu) - expected)).toBeLessThan(0.51e-5);
  });

  it('is the square of the normal quantile for one degree and an exponential for two', () => {
    for (const p of [1e-12, 1e-3, 0.2, 0.5, 0.9, 0.999]) {
      const z = normalQuantile(0.5 - p / 2);
      // 0.5 - p / 2 keeps only the absolute rounding of one half: a relative 1e-16 / p in z.
      expect(off(chiSquareQuantile(p, 1), z * z)).toBeLessThan(1e-12 + 1e-15 / p);
      expect(off(chiSquareQuantile(p, 2), -2 * Math.log1p(-p))).toBeLessThan(1e-12);
    }
  });

  it('solves the closed form 1 - (1 + x / 2) exp(-x / 2) = p of four degrees', () => {
    for (const p of [0.01, 0.4, 0.6, 0.99]) {
      const x = chiSquareQuantile(p, 4);
      expect(Math.abs(1 - (1 + x / 2) * Math.exp(-x / 2) - p)).toBeLessThan(1e-14);
    }
  });

  it('approaches nu + z sqrt(2 nu) + (2/3)(z^2 - 1) for as many bins as a window has (Cornish & Fisher 1938, from memory)', () => {
    for (const nu of [1e4, 1e6, 1e8]) {
      for (const p of [0.001, 0.975]) {
        const z = normalQuantile(p);
        const expected = nu + z * Math.sqrt(2 * nu) + (2 / 3) * (z * z - 1);
        // The next term is (z^3 - 7 z) / (9 sqrt(2 nu)); rounding of nu itself beside it.
        const next = Math.abs(z * z * z - 7 * z) / (9 * Math.sqrt(2 * nu));
        expect(Math.abs(chiSquareQuantile(p, nu) - expected)).toBeLessThan(1.5 * next + 1e-11 * nu);
      }
    }
  });

  it.each([
    [0.95, 0],
    [0.95, Number.NaN],
    [1, 3],
  ])('refuses the probability %d with %d degrees of freedom', (probability, nu) => {
    expect(() => chiSquareQuantile(probability, nu)).toThrow(DomainError);
  });
});
