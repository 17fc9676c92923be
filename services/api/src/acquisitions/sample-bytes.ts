import { endianness } from 'node:os';

/** Bytes in one float64. */
const FLOAT64_BYTES = 8;

/**
 * Samples in the canonical stored form: float64, little-endian, interleaved re, im.
 *
 * @param samples not changed; shared with the answer where the machine is little-endian already
 */
export function sampleBytes(samples: Float64Array): Uint8Array {
  const bytes = Buffer.from(samples.buffer, samples.byteOffset, samples.length * FLOAT64_BYTES);
  return endianness() === 'LE' ? bytes : Buffer.from(bytes).swap64();
}
