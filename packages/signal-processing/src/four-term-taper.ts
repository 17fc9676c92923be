import { DomainError } from '@spinassay/numerics';

/** Coefficients of the minimum four-term window; side lobes below -92 dB. */
const TERMS = [0.35875, -0.48829, 0.14128, -0.01168] as const;

/**
 * A taper that hides the truncation of a signal and the far wings of its lines.
 *
 * @param length number of samples, at least 1
 * @returns (length) weights in (0, 1], symmetric
 * @throws DomainError when length is not a positive whole number
 * @source Harris, Proc. IEEE 66 (1978) 51, table I, four-term minimum side lobe window (coefficients from memory)
 */
export function fourTermTaper(length: number): Float64Array {
  if (!Number.isInteger(length) || length < 1) throw new DomainError(`expected length >= 1, got ${length}`);
  const taper = new Float64Array(length);
  for (let n = 0; n < length; n += 1) {
    const angle = (2 * Math.PI * (n + 0.5)) / length;
    let sum = 0;
    for (let term = 0; term < TERMS.length; term += 1) sum += (TERMS[term] ?? 0) * Math.cos(term * angle);
    taper[n] = sum;
  }
  return taper;
}
