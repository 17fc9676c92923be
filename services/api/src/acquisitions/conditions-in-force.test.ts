import { expect, test } from 'vitest';
import { conditionDifferences } from './condition-differences.ts';
import { conditionsInForce } from './conditions-in-force.ts';

test('lets what is declared win and fills the rest from the file', () => {
  const fromFile = { temperatureCelsius: 25, solvent: 'D2O', scanCount: 64 };
  const declared = { temperatureCelsius: 27, pH: 6, solvent: undefined };
  expect(conditionsInForce(declared, fromFile)).toEqual({
    temperatureCelsius: 27,
    pH: 6,
    solvent: 'D2O',
    scanCount: 64,
  });
});

test('never takes the sequence from a file', () => {
  expect(conditionsInForce({}, { sequence: 'single-pulse' })).toEqual({});
  expect(conditionsInForce({ sequence: 'cpmg' }, { sequence: 'single-pulse' })).toEqual({ sequence: 'cpmg' });
});

test('names every difference with both values, in order of name, and none where there is none', () => {
  const held = { pH: 6, solvent: 'D2O', dummyScans: 0 };
  const sent = { pH: 6, solvent: 'CDCl3', scanCount: 8 };
  expect(conditionDifferences(held, sent)).toEqual([
    { pointer: '#/conditions/dummyScans', detail: 'held: 0; sent: undeclared' },
    { pointer: '#/conditions/scanCount', detail: 'held: undeclared; sent: 8' },
    { pointer: '#/conditions/solvent', detail: 'held: "D2O"; sent: "CDCl3"' },
  ]);
  expect(conditionDifferences(held, { ...held })).toEqual([]);
});
