import { DomainError } from './errors.ts';

/** From here on the remainder's eight terms are good to rounding; smaller arguments are moved up to it. */
export const STIRLING_MIN = 10;

/** B_2k / (2k (2k - 1)) for k = 1 ... 8; the next term is below 2e-16 at x = 10. */
const REMAINDER_TERMS = [
  1 / 12,
  -1 / 360,
  1 / 1260,
  -1 / 1680,
  1 / 1188,
  -691 / 360360,
  1 / 156,
  -3617 / 122400,
] as const;

/**
 * Natural logarithm of the gamma function for x > 0; absolute error within a few roundings of max(1, |result|).
 *
 * @throws DomainError unless x is positive and finite
 * @source Abramowitz & Stegun 6.1.41 (Stirling's series), 6.1.15 (recurrence)
 */
export function logGamma(x: number): number {
  if (!(x > 0) || x === Number.POSITIVE_INFINITY) throw new DomainError(`expected a finite x > 0, got ${x}`, { x });
  // Gamma(x) = Gamma(x + n) / (x (x + 1) ... (x + n - 1)); at most ten factors, so the product cannot overflow.
  let product = 1;
  let shifted = x;
  for (; shifted < STIRLING_MIN; shifted += 1) product *= shifted;
  const series = (shifted - 0.5) * Math.log(shifted) - shifted + 0.5 * Math.log(2 * Math.PI);
  return series + stirlingRemainder(shifted) - Math.log(product);
}

/**
 * What Stirling's formula (x - 1/2) log x - x + log(2 pi) / 2 leaves of log Gamma(x), for x >= STIRLING_MIN.
 *
 * Ratios of large gamma functions are taken from it: their logarithms would cancel.
 */
export function stirlingRemainder(x: number): number {
  const inverseSquare = 1 / (x * x);
  let sum = 0;
  for (let k = REMAINDER_TERMS.length - 1; k >= 0; k -= 1) sum = sum * inverseSquare + REMAINDER_TERMS[k];
  return sum / x;
}
