import { expect, test } from 'vitest';
import { jsonPointer } from './json-pointer.ts';

// The table of RFC 6901 section 6 (URI fragment representation), from memory.
test.each([
  [[], '#'],
  [['foo'], '#/foo'],
  [['foo', 0], '#/foo/0'],
  [[''], '#/'],
  [['a/b'], '#/a~1b'],
  [['c%d'], '#/c%25d'],
  [['e^f'], '#/e%5Ef'],
  [['g|h'], '#/g%7Ch'],
  [['i\\j'], '#/i%5Cj'],
  [['k"l'], '#/k%22l'],
  [[' '], '#/%20'],
  [['m~n'], '#/m~0n'],
])('writes %j as RFC 6901 section 6 prints it', (path, expected) => {
  expect(jsonPointer(path)).toBe(expected);
});

test('writes a key with a lone surrogate instead of throwing', () => {
  expect(jsonPointer(['\ud800'])).toBe('#/%EF%BF%BD');
});
