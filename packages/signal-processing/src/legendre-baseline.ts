import { DomainError } from '@spinassay/numerics';

/**
 * Legendre polynomials over the bins of a window: the shapes a smooth baseline may take, each with a free complex weight.
 *
 * @returns (termCount x binCount) row-major, P_0 to P_(termCount-1) at evenly spaced places in [-1, 1]
 * @throws DomainError when there are fewer bins than terms
 * @source Abramowitz & Stegun 22.7.10, three-term recurrence
 */
export function legendreBaseline(binCount: number, termCount: number): Float64Array {
  if (termCount < 0 || binCount < termCount) {
    throw new DomainError(
      `expected at least as many bins as baseline terms, got ${binCount} bins and ${termCount} terms`,
    );
  }
  const basis = new Float64Array(termCount * binCount);
  for (let k = 0; k < binCount; k += 1) {
    const x = binCount > 1 ? (2 * k) / (binCount - 1) - 1 : 0;
    let previous = 0;
    let current = 1;
    for (let degree = 0; degree < termCount; degree += 1) {
      basis[degree * binCount + k] = current;
      const next = ((2 * degree + 1) * x * current - degree * previous) / (degree + 1);
      previous = current;
      current = next;
    }
  }
  return basis;
}
