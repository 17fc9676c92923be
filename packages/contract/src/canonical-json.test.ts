import { expect, test } from 'vitest';
import { canonicalJson } from './canonical-json.ts';

// The sample of RFC 8785 section 3.2.2 and its canonical form in section 3.2.3, from memory.
test('writes the sample of RFC 8785 section 3.2.2 as the RFC prints it', () => {
  const sample = JSON.parse(`{
    "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
    "string": "\\u20ac$\\u000F\\u000aA'\\u0042\\u0022\\u005c\\\\\\"\\/",
    "literals": [null, true, false]
  }`);
  expect(canonicalJson(sample)).toBe(
    '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
      '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
  );
});

// The sorting sample of RFC 8785 section 3.2.3, from memory: UTF-16 code units, so the emoji stands before U+FB33.
test('sorts keys by UTF-16 code units as RFC 8785 section 3.2.3 does', () => {
  const sample = {
    '\u20ac': 'Euro Sign',
    '\r': 'Carriage Return',
    '\ufb33': 'Hebrew Letter Dalet With Dagesh',
    '1': 'One',
    '\ud83d\ude00': 'Emoji: Grinning Face',
    '\u0080': 'Control',
    '\u00f6': 'Latin Small Letter O With Diaeresis',
  };
  expect(Object.values(JSON.parse(canonicalJson(sample)))).toEqual([
    'One',
    'Carriage Return',
    'Control',
    'Latin Small Letter O With Diaeresis',
    'Euro Sign',
    'Emoji: Grinning Face',
    'Hebrew Letter Dalet With Dagesh',
  ]);
});

// RFC 8785 appendix B, from memory (the rows whose printed form was certain).
test.each([
  ['0000000000000000', '0'],
  ['8000000000000000', '0'],
  ['0000000000000001', '5e-324'],
  ['7fefffffffffffff', '1.7976931348623157e+308'],
  ['4340000000000000', '9007199254740992'],
  ['444b1ae4d6e2ef50', '1e+21'],
  ['3eb0c6f7a0b5ed8d', '0.000001'],
])('prints the double %s as %s', (bits, expected) => {
  const value = Buffer.from(bits, 'hex').readDoubleBE();
  expect(canonicalJson(value)).toBe(expected);
});

test('gives the same text whatever the order of the keys, and reads back equal', () => {
  const text = canonicalJson({ b: [1, { z: null, a: 'x' }], a: 0.1 });
  expect(text).toBe('{"a":0.1,"b":[1,{"a":"x","z":null}]}');
  expect(canonicalJson({ a: 0.1, b: [1, { a: 'x', z: null }] })).toBe(text);
  expect(JSON.parse(text)).toEqual({ a: 0.1, b: [1, { a: 'x', z: null }] });
});

test('leaves out members that are undefined and takes an object that is met twice', () => {
  const shared = { a: 1 };
  expect(canonicalJson({ a: undefined, b: shared, c: shared })).toBe('{"b":{"a":1},"c":{"a":1}}');
});

const circular: { self?: unknown } = {};
circular.self = circular;
test.each([
  ['NaN', { a: [Number.NaN] }, /#\/a\/0/],
  ['infinity', Number.POSITIVE_INFINITY, /finite/],
  ['half a surrogate pair', 'a\ud800', /surrogate/],
  ['half a surrogate pair in a key', { '\udc00': 1 }, /surrogate/],
  ['undefined at the top', undefined, /undefined/],
  ['undefined in an array', [undefined], /#\/0/],
  ['a hole in an array', new Array(1), /#\/0/],
  ['a bigint', { seed: 1n }, /bigint/],
  ['a typed array', { x: new Float64Array(1) }, /Float64Array/],
  ['a date', new Date(0), /Date/],
  ['a cycle', circular, /itself/],
])('refuses %s and says where', (_name, value, message) => {
  expect(() => canonicalJson(value)).toThrow(message);
});
