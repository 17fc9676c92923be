import { createHash } from 'node:crypto';

/**
 * SHA-256 of the parts one after the other, in lower-case hexadecimal. Text is taken as UTF-8.
 *
 * @source FIPS 180-4
 */
export function sha256Hex(...parts: readonly (string | Uint8Array)[]): string {
  const hash = createHash('sha256');
  for (const part of parts) hash.update(part);
  return hash.digest('hex');
}
