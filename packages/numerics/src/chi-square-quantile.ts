import { DomainError } from './errors.ts';
import { gammaFractions } from './gamma-fractions.ts';
import { increasingRoot } from './increasing-root.ts';
import { normalQuantile } from './normal-quantile.ts';

/**
 * The value below which chi-squared falls with this probability.
 *
 * @param probability in (0, 1), not below 1e-300; above one half the answer is as good as 1 - probability is
 * @param degreesOfFreedom in (0, 2e8], need not be whole
 * @throws DomainError outside those ranges, or when the answer is below the smallest positive double
 * @source chi^2 / 2 has the lower gamma fraction of shape nu / 2 (Abramowitz & Stegun 26.4.19); start: Wilson & Hilferty,
 *   Proc. Natl. Acad. Sci. 17 (1931) 684
 */
export function chiSquareQuantile(probability: number, degreesOfFreedom: number): number {
  if (!(degreesOfFreedom > 0)) {
    throw new DomainError(`expected degreesOfFreedom > 0, got ${degreesOfFreedom}`, { degreesOfFreedom });
  }
  const shrink = 2 / (9 * degreesOfFreedom);
  const root = 1 - shrink + normalQuantile(probability) * Math.sqrt(shrink);
  const start = Math.max(degreesOfFreedom * root * root * root, START_MIN);
  // The logarithm of the smaller tail: straight where the tail itself would be flat.
  const x = increasingRoot(start / 2, (at) => {
    const { lower, upper, density } = gammaFractions(degreesOfFreedom / 2, at);
    return probability < 0.5
      ? { value: Math.log(lower / probability), slope: density / lower }
      : { value: Math.log((1 - probability) / upper), slope: density / upper };
  });
  return 2 * x;
}

/** Wilson and Hilferty's cube turns negative in the far lower tail; the search finds its way down from here. */
const START_MIN = 1e-3;
