import { ConvergenceError, DomainError } from './errors.ts';
import { logGamma, STIRLING_MIN, stirlingRemainder } from './log-gamma.ts';

/** Near x = a either expansion takes some 10 sqrt(a) terms: enough for a up to 1e8. */
const TERMS_MAX = 100_000;

/** Lower and upper share of the gamma function; they add up to 1, and the smaller one keeps its digits. */
export interface GammaFractions {
  readonly lower: number;
  readonly upper: number;
  /** d(lower)/dx. */
  readonly density: number;
}

/**
 * P(a, x) = gamma(a, x) / Gamma(a) and Q = 1 - P.
 *
 * @param a shape, in (0, 1e8]
 * @param x > 0
 * @throws DomainError outside those ranges
 * @source Abramowitz & Stegun 6.5.29 (series), 6.5.31 (continued fraction); Lentz's evaluation, Appl. Opt. 15 (1976) 668
 */
export function gammaFractions(a: number, x: number): GammaFractions {
  if (!(a > 0 && a <= 1e8)) throw new DomainError(`expected a shape in (0, 1e8], got ${a}`, { a });
  if (!(x > 0)) throw new DomainError(`expected x > 0, got ${x}`, { x });
  const front = Math.exp(logFront(a, x));
  const density = front / x;
  if (x < a + 1) {
    const lower = (front * series(a, x)) / a;
    return { lower, upper: 1 - lower, density };
  }
  const upper = front === 0 ? 0 : front * continuedFraction(a, x);
  return { lower: 1 - upper, upper, density };
}

/** log(x^a exp(-x) / Gamma(a)). For large a by Stirling's formula, so that terms of the size of a log a never meet. */
function logFront(a: number, x: number): number {
  if (a < STIRLING_MIN) return a * Math.log(x) - x - logGamma(a);
  const excess = (x - a) / a;
  return a * (Math.log1p(excess) - excess) + 0.5 * Math.log(a / (2 * Math.PI)) - stirlingRemainder(a);
}

/** sum_n x^n / ((a + 1) ... (a + n)); terms fall from the first on while x < a + 1. */
function series(a: number, x: number): number {
  let term = 1;
  let sum = 1;
  for (let n = 1; n <= TERMS_MAX; n += 1) {
    term *= x / (a + n);
    sum += term;
    if (term < sum * Number.EPSILON) return sum;
  }
  throw new ConvergenceError(`expected the gamma series to end at a = ${a}, x = ${x}`, { a, x });
}

/** 1 / (x + 1 - a - 1 (1 - a) / (x + 3 - a - 2 (2 - a) / (x + 5 - a - ...))); all denominators stay positive for x >= a + 1. */
function continuedFraction(a: number, x: number): number {
  let denominator = x + 1 - a;
  let c = Number.POSITIVE_INFINITY;
  let d = 1 / denominator;
  let value = d;
  for (let n = 1; n <= TERMS_MAX; n += 1) {
    const numerator = -n * (n - a);
    denominator += 2;
    d = 1 / (denominator + numerator * d);
    c = denominator + numerator / c;
    value *= c * d;
    if (Math.abs(c * d - 1) < Number.EPSILON) return value;
  }
  throw new ConvergenceError(`expected the gamma fraction to end at a = ${a}, x = ${x}`, { a, x });
}
