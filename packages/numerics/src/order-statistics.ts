import { DomainError } from './errors.ts';

/**
 * Quantile of a sample, linear between order statistics.
 *
 * @param probability in [0, 1]
 * @throws DomainError for an empty sample
 * @source Hyndman & Fan, Am. Stat. 50 (1996) 361, type 7
 */
export function quantile(values: ArrayLike<number>, probability: number): number {
  if (values.length === 0) throw new DomainError('expected at least one value');
  const sorted = Float64Array.from(values).sort();
  const place = (sorted.length - 1) * probability;
  const below = Math.floor(place);
  const above = Math.min(sorted.length - 1, below + 1);
  return sorted[below] + (place - below) * (sorted[above] - sorted[below]);
}

/** Median of a sample. Throws DomainError when it is empty. */
export function median(values: ArrayLike<number>): number {
  return quantile(values, 0.5);
}
