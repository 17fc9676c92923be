/**
 * Round to whole counts and hold at the converter's full scale, in place.
 *
 * @param fullScaleCounts largest count of either sign, > 0: 2^15 - 1 of a 16-bit converter
 * @returns how many components were clipped
 */
export function digitise(signal: Float64Array, fullScaleCounts: number): number {
  let clipped = 0;
  for (let i = 0; i < signal.length; i += 1) {
    const count = Math.round(signal[i]);
    if (Math.abs(count) > fullScaleCounts) clipped += 1;
    signal[i] = Math.max(-fullScaleCounts, Math.min(fullScaleCounts, count));
  }
  return clipped;
}
