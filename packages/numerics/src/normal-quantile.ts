import { DomainError } from './errors.ts';
import { normalCdf } from './normal-distribution.ts';

/** The rational start is within 4.5e-4 and each step squares the error: 1e-7, 1e-14, rounding. */
const NEWTON_STEPS = 3;

/**
 * The x below which a standard normal variate falls with this probability; error below 1e-14 of max(1, |x|).
 *
 * @param probability in (0, 1), not below 1e-300; above one half the answer is as good as 1 - probability is
 * @throws DomainError outside that range
 * @source start: Abramowitz & Stegun 26.2.23; then Newton's method on the logarithm of normalCdf, straight in the tails
 */
export function normalQuantile(probability: number): number {
  if (!(probability >= 1e-300 && probability < 1)) {
    throw new DomainError(`expected a probability in [1e-300, 1), got ${probability}`, { probability });
  }
  const tail = Math.min(probability, 1 - probability);
  let x = -upperTailStart(tail);
  for (let step = 0; step < NEWTON_STEPS; step += 1) {
    const below = normalCdf(x);
    const density = Math.exp(-0.5 * x * x) / Math.sqrt(2 * Math.PI);
    x -= (Math.log(below / tail) * below) / density;
  }
  return probability < 0.5 ? x : -x;
}

function upperTailStart(tail: number): number {
  const t = Math.sqrt(-2 * Math.log(tail));
  const above = 2.515517 + t * (0.802853 + t * 0.010328);
  const below = 1 + t * (1.432788 + t * (0.189269 + t * 0.001308));
  return t - above / below;
}
