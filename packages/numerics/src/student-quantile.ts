import { ConvergenceError, DomainError } from './errors.ts';
import { increasingRoot } from './increasing-root.ts';
import { logGamma, STIRLING_MIN, stirlingRemainder } from './log-gamma.ts';
import { normalQuantile } from './normal-quantile.ts';

/** Fewer than 100 terms were needed at each of 5,040 points, nu 1 to 1e12, tails 1e-299 to 1/2 - 1e-9 (2026-12-01). */
const TERMS_MAX = 400;
/** From here on z + (z^3 + z) / (4 nu) is t to rounding: the next term is below 1e-17 of t for |z| <= 38 (26.7.5). */
const EXPANSION_FROM = 1e12;

/**
 * The t below which Student's variate falls with this probability: the coverage factor of JCGM 100 at (1 + coverage) / 2.
 *
 * @param probability in (0, 1), not below 1e-300; above one half the answer is as good as 1 - probability is
 * @param degreesOfFreedom >= 1, need not be whole; infinite gives the normal quantile
 * @throws DomainError outside those ranges
 * @source Abramowitz & Stegun 26.7.1; incomplete beta function: DiDonato & Morris, ACM Trans. Math. Softw. 18 (1992) 360 (from memory)
 */
export function studentQuantile(probability: number, degreesOfFreedom: number): number {
  if (!(degreesOfFreedom >= 1)) {
    throw new DomainError(`expected degreesOfFreedom >= 1, got ${degreesOfFreedom}`, { degreesOfFreedom });
  }
  const z = normalQuantile(probability);
  if (degreesOfFreedom >= EXPANSION_FROM) return z + (z * (z * z + 1)) / (4 * degreesOfFreedom);
  if (z === 0) return 0;
  const tail = Math.min(probability, 1 - probability);
  const logScale = logDensityScale(degreesOfFreedom);
  const t = increasingRoot(Math.abs(z), (at) => {
    const { upper, density } = upperTail(at, degreesOfFreedom, logScale);
    return { value: Math.log(tail / upper), slope: density / upper };
  });
  return probability < 0.5 ? -t : t;
}

/** log(Gamma((nu + 1) / 2) / (Gamma(nu / 2) sqrt(pi))): the density at 0 times sqrt(nu). */
function logDensityScale(degreesOfFreedom: number): number {
  const a = degreesOfFreedom / 2;
  const halfLogPi = 0.5 * Math.log(Math.PI);
  if (a < STIRLING_MIN) return logGamma(a + 0.5) - logGamma(a) - halfLogPi;
  const ratio = a * Math.log1p(0.5 / a) - 0.5 + 0.5 * Math.log(a);
  return ratio + stirlingRemainder(a + 0.5) - stirlingRemainder(a) - halfLogPi;
}

/** P(T > t) = I_x(nu / 2, 1/2) / 2 with x = nu / (nu + t^2), for t > 0, and the density at t. */
function upperTail(t: number, degreesOfFreedom: number, logScale: number): { upper: number; density: number } {
  const a = degreesOfFreedom / 2;
  const s = t / Math.sqrt(degreesOfFreedom);
  // h^2 = 1 + s^2 without overflow; x = 1 / h^2 and 1 - x = (s / h)^2 each keep their digits.
  const h = Math.hypot(1, s);
  const logH = s < 1 ? 0.5 * Math.log1p(s * s) : Math.log(h);
  const x = 1 / h / h;
  const y = (s / h) * (s / h);
  const front = Math.exp(logScale - degreesOfFreedom * logH);
  const upper =
    x < (a + 1) / (a + 2.5)
      ? (0.5 * front * s) / h / betaFraction(a, 0.5, x, y)
      : 0.5 - (0.5 * front * s) / h / betaFraction(0.5, a, y, x);
  return { upper, density: front / h / Math.sqrt(degreesOfFreedom) };
}

/**
 * f with I_x(a, b) = x^a y^b / (B(a, b) f), y = 1 - x: the contracted fraction b0 + a1 / (b1 + a2 / (b2 + ...)), by Lentz. The
 * plain one (26.5.8) takes x alone and loses a factor nu of digits near x = 1: 1e-10 was seen at nu = 1e7.
 */
function betaFraction(a: number, b: number, x: number, y: number): number {
  let value = (a * (a * y - b * x + 1)) / (a + 1);
  let c = value;
  let d = 0;
  for (let m = 1; m <= TERMS_MAX; m += 1) {
    const step = a + 2 * m - 1;
    const numerator = ((a + m - 1) / step) * ((a + b + m - 1) / step) * m * (b - m) * x * x;
    const denominator = m + (m * (b - m) * x) / step + ((a + m) * (a * y - b * x + 1 + m * (2 - x))) / (step + 2);
    d = 1 / (denominator + numerator * d);
    c = denominator + numerator / c;
    value *= c * d;
    if (Math.abs(c * d - 1) < Number.EPSILON) return value;
  }
  throw new ConvergenceError(`expected the beta fraction to end at a = ${a}, b = ${b}, x = ${x}`, { a, b, x });
}
