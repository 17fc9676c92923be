import { createHash } from 'node:crypto';
import { expect, test } from 'vitest';
import { signalDigest } from './signal-digest.ts';

// The layout is this house's own; the header is written out here by hand.
test('digests the scales as canonical JSON and then the samples', () => {
  const bytes = new Uint8Array([0, 0, 0, 0, 0, 0, 240, 63]);
  const expected = createHash('sha256').update('{"dwellSeconds":0.0005,"observeFrequencyMHz":500.13}').update(bytes);
  expect(signalDigest({ observeFrequencyMHz: 500.13, dwellSeconds: 0.0005 }, bytes)).toBe(expected.digest('hex'));
});

test('tells the same samples at another dwell time apart', () => {
  const bytes = new Uint8Array(8);
  const at = (dwellSeconds: number): string => signalDigest({ dwellSeconds, observeFrequencyMHz: 500 }, bytes);
  expect(at(0.001)).not.toBe(at(0.0011));
});
