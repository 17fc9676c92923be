import { expect, test } from 'vitest';
import { sha256Hex } from './sha256-hex.ts';

// FIPS 180-4 examples (NIST CSRC example values for SHA-256), from memory.
const abc = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad';

test('digests "abc" as FIPS 180-4 prints it', () => {
  expect(sha256Hex('abc')).toBe(abc);
  expect(sha256Hex(new Uint8Array([97, 98, 99]))).toBe(abc);
});

test('digests the empty message as FIPS 180-4 has it', () => {
  expect(sha256Hex()).toBe('e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855');
});

test('takes parts as if they stood in one text', () => {
  expect(sha256Hex('a', 'b', new Uint8Array([99]))).toBe(abc);
});
