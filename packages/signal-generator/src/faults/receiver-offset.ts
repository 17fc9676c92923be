/** What a receiver adds with nothing in the magnet: a constant, which is a spike at the carrier, and its drift. */
export interface ReceiverOffset {
  readonly re: number;
  readonly im: number;
  readonly driftRePerSecond: number;
  readonly driftImPerSecond: number;
}

/** Add offset + drift t to both components, in place; t counts from the first sample, where the receiver opens. */
export function addReceiverOffset(signal: Float64Array, offset: ReceiverOffset, dwellSeconds: number): void {
  const { re, im, driftRePerSecond, driftImPerSecond } = offset;
  for (let n = 0; n < signal.length / 2; n += 1) {
    signal[2 * n] += re + driftRePerSecond * n * dwellSeconds;
    signal[2 * n + 1] += im + driftImPerSecond * n * dwellSeconds;
  }
}
