/**
 * Conventions of this room, stated once.
 *
 * - A signal is complex and interleaved: [re0, im0, re1, im1, ...]; sample n was taken at time n * dwellSeconds.
 * - The transform is Y_k = M^(-1/2) sum_m y_(n0+m) exp(-2 pi i k m / M): unitary, so white noise of standard deviation
 *   sigma per component has the same sigma in every bin. Phases are those of sample n0, the first one used.
 * - Bin k stands for the frequency k / (M dwell), folded into [-1/(2 dwell), 1/(2 dwell)); a positive frequency (Hz from the
 *   carrier) is a higher chemical shift.
 * - A line is a exp(i phase) exp((2 pi i f - R) (t - t0)), R in 1/s; its full width at half maximum is R / pi Hz.
 */

/** Real numbers that one complex bin or sample takes in an interleaved buffer. */
export const REALS_PER_COMPLEX = 2;

/** Frequency of a bin in Hz from the carrier, folded about zero. */
export function binFrequencyHz(binIndex: number, binCount: number, dwellSeconds: number): number {
  const folded = binIndex < binCount / 2 ? binIndex : binIndex - binCount;
  return folded / (binCount * dwellSeconds);
}
