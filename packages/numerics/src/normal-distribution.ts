/** Where the series of erf gives way to the continued fraction of erfc. */
const SERIES_LIMIT = 2;
/** Both expansions reach rounding within this many terms on their side of the limit. */
const TERM_MAX = 200;

/**
 * Probability that a standard normal variate is below x; relative error below 1e-13 down to x = -37.
 *
 * @source Abramowitz & Stegun 7.1.6 (series) and 7.1.14 (continued fraction)
 */
export function normalCdf(x: number): number {
  const half = 0.5 * complementaryError(Math.abs(x) / Math.SQRT2);
  return x > 0 ? 1 - half : half;
}

/** erfc(z) for z >= 0. */
function complementaryError(z: number): number {
  return z < SERIES_LIMIT ? 1 - errorSeries(z) : errorFraction(z);
}

/** erf(z) = 2 / sqrt(pi) exp(-z^2) sum_n 2^n z^(2n+1) / (1 3 5 ... (2n+1)). */
function errorSeries(z: number): number {
  let term = z;
  let sum = z;
  for (let n = 1; n < TERM_MAX && term > sum * 1e-17; n += 1) {
    term *= (2 * z * z) / (2 * n + 1);
    sum += term;
  }
  return (2 / Math.sqrt(Math.PI)) * Math.exp(-z * z) * sum;
}

/** sqrt(pi) exp(z^2) erfc(z) = 1 / (z + (1/2) / (z + 1 / (z + (3/2) / (z + ...)))), from the far end back. */
function errorFraction(z: number): number {
  let tail = z;
  for (let n = TERM_MAX; n >= 1; n -= 1) tail = z + n / 2 / tail;
  return Math.exp(-z * z) / (Math.sqrt(Math.PI) * tail);
}
