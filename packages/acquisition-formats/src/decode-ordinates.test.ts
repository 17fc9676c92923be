import { describe, expect, test } from 'vitest';
import { decodeOrdinatesInto } from './decode-ordinates.ts';
import { FaultList } from './fault-list.ts';

function decode(text: string, count: number, isAffn = false) {
  const ordinates = new Float64Array(count);
  const faults = new FaultList(20);
  const abscissas: [abscissa: number, index: number][] = [];
  const table = { text, start: 0, end: text.length, line: 1, isAffn };
  const stored = decodeOrdinatesInto(table, ordinates, (x, index) => abscissas.push([x, index]), faults);
  return { values: [...ordinates.subarray(0, stored)], abscissas, codes: faults.toArray().map((fault) => fault.code) };
}

// McDonald & Wilks, Appl. Spectrosc. 42 (1988) 151, table of the ASDF forms (from memory).
describe('the published row 1, 2, 3, 3, 2, 1, 0, -1, -2, -3', () => {
  const published = [1, 2, 3, 3, 2, 1, 0, -1, -2, -3];
  test.each([
    ['AFFN', '0 1 2 3 3 2 1 0 -1 -2 -3'],
    ['PAC', '0+1+2+3+3+2+1+0-1-2-3'],
    ['PAC with its first sign as a blank', '0 1+2+3+3+2+1+0-1-2-3'],
    ['SQZ', '0 1BCCBA@abc'],
    ['DIF', '0 1JJ%jjjjjj'],
    ['SQZ with DUP', '0 1BCTBA@abc'],
    ['DIF with DUP', '0 1JJ%jX'],
    ['SQZ and DIF mixed', '0ABCTBA@jjj'],
  ])('decodes from %s', (_form, text) => {
    expect(decode(text, 10)).toEqual({ values: published, abscissas: [[0, 0]], codes: [] });
  });
});

// The worked example of McDonald & Wilks (same source, from memory): 53 ordinates in differences, ended by a check.
test('decodes the published example of differences with its closing check', () => {
  const text = '599.860@VKT%TLkj%J%KLJ%njKjL%kL%jJULJ%kLK1%lLMNPNPRLJ0QTOJ1P\n700.158A28\n';
  const published =
    '0 0 0 0 2 4 4 4 7 5 4 4 5 5 7 10 11 11 6 5 7 6 9 9 7 10 10 9 10 11 12 15 16 16 14 17 38 38 35 38 42 47 54 59 66 75 78 88 96 104 110 121 128';
  const { values, abscissas, codes } = decode(text, 53);
  expect(values).toEqual(published.split(' ').map(Number));
  expect(abscissas).toEqual([
    [599.86, 0],
    [700.158, 52],
  ]);
  expect(codes).toEqual([]);
});

describe('the letter E', () => {
  test('is an exponent in plain numbers when a sign follows', () => {
    expect(decode('0 1.5E+3 -2E-1 7', 3).values).toEqual([1500, -0.2, 7]);
  });
  test('is an exponent without a sign where the form is declared as AFFN', () => {
    expect(decode('0 1E3 2.5e-2', 2, true).values).toEqual([1000, 0.025]);
  });
  test('is the digit 5 among compressed ordinates', () => {
    expect(decode('0E5e5A', 3).values).toEqual([55, -55, 1]);
    expect(decode('599.860E5E', 2)).toMatchObject({ values: [55, 5], abscissas: [[599.86, 0]] });
  });
});

describe('checks', () => {
  test('take the repeated ordinate after a difference once', () => {
    expect(decode('0A0J\n1A1JJ\n3A3\n', 4).values).toEqual([10, 11, 12, 13]);
  });
  test('store the first ordinate of a line after plain values', () => {
    expect(decode('0 1 2\n2 2 3\n', 4).values).toEqual([1, 2, 2, 3]);
  });
  test('let a repeat behind the check add only what is new', () => {
    expect(decode('0A0J\n1A1U', 4).values).toEqual([10, 11, 11, 11]);
  });
  test('report a repeated ordinate that differs', () => {
    expect(decode('0A0J\n1A2J', 3).codes).toEqual(['y-check-failed']);
  });
});

describe('what cannot be read', () => {
  test.each([
    ['0 1 ? 3', 'missing-ordinate'],
    ['0 1 NaN 3', 'missing-ordinate'],
    ['0 1 -Infinity', 'unreadable-ordinate'],
    ['0 1 infinity', 'missing-ordinate'],
    ['0 1 2!3', 'unreadable-ordinate'],
    ['0 1 2\u00b53', 'unreadable-ordinate'],
    ['0 1E+999', 'unreadable-ordinate'],
    ['0A.5', 'unreadable-ordinate'],
    ['0AS.5', 'unreadable-ordinate'],
    ['A1 2', 'unreadable-abscissa'],
    ['0J', 'difference-without-start'],
    ['0S3', 'repeat-without-start'],
    ['0 1 2 3 4 5 6 7 8 9 10 11 12', 'too-many-ordinates'],
  ])('%j is reported as %s', (text, code) => {
    expect(decode(text, 10).codes).toEqual([code]);
  });

  test('reads on behind a faulty line', () => {
    expect(decode('0 1 !\n1 2\n2 ?\n2 3', 10)).toMatchObject({
      values: [1, 2, 3],
      codes: ['unreadable-ordinate', 'missing-ordinate'],
    });
  });
  test('stops a repeat count of a thousand million at the end of the table', () => {
    expect(decode('0AS000000000', 10)).toMatchObject({ codes: ['too-many-ordinates'] });
  });
});

test('passes over comments, blank lines and every kind of line break', () => {
  expect(decode('$$ first\r\n0 1 2 $$ 9 9\r\r\n2 3 4\n\n4,5;6', 6).values).toEqual([1, 2, 3, 4, 5, 6]);
});

test('decodes an empty table to nothing', () => {
  expect(decode('', 4)).toEqual({ values: [], abscissas: [], codes: [] });
});
