import { canonicalJson } from './canonical-json.ts';
import { sha256Hex } from './sha256-hex.ts';

/** The two scales without which samples are only numbers. */
export type SignalScales = { readonly dwellSeconds: number; readonly observeFrequencyMHz: number };

/**
 * The digest that a signal is addressed by: canonical JSON of its scales, then its samples.
 * The JSON ends with its closing brace, so that no header can run into the samples of another.
 *
 * @param bytes float64, little-endian, interleaved re, im: the canonical stored form, whatever the signal came in
 */
export function signalDigest({ dwellSeconds, observeFrequencyMHz }: SignalScales, bytes: Uint8Array): string {
  return sha256Hex(canonicalJson({ dwellSeconds, observeFrequencyMHz }), bytes);
}
