import type { Request } from 'express';
import { expect, test } from 'vitest';
import { preferredWaitSeconds } from './preferred-wait.ts';

function asked(prefer: string | undefined): Request {
  return { get: (name: string) => (name === 'prefer' ? prefer : undefined) } as unknown as Request;
}

// Forms after RFC 7240 section 2 (list, parameters, quoted value, case of the name) and section 4.3 (wait).
test.each([
  ['wait=10', 10],
  ['respond-async, wait=10', 10],
  ['Wait="7"; foo=bar', 7],
  ['wait = 3', 3],
  ['wait=100', 30],
  ['wait=0', 0],
  ['wait=5, wait=9', 5],
  ['wait=-1', undefined],
  ['wait=soon', undefined],
  ['wait', undefined],
  ['return=minimal', undefined],
  [undefined, undefined],
])('reads "%s" as %s seconds', (prefer, expected) => {
  expect(preferredWaitSeconds(asked(prefer))).toBe(expected);
});
