import { expect, test } from 'vitest';
import { methodPostExample } from './examples/document-examples.ts';
import { methodBodySchema } from './method-body.ts';

// The promises under test are the words of the wire, ours; no outside source.
function faultsOf(change: object): string[] {
  const parsed = methodBodySchema.safeParse({ ...methodPostExample.body, ...change });
  return parsed.success ? [] : parsed.error.issues.map((issue) => issue.path.join('/'));
}

test('takes a method without windows, widths or limits', () => {
  const body = { name: 'x', panel: [{ compoundId: 'a' }], reference: { compoundId: 'b' }, claims: ['shifts'] };
  expect(methodBodySchema.safeParse(body).success).toBe(true);
});

test('refuses to claim amounts without a quantity standard', () => {
  expect(faultsOf({ standard: undefined })).toEqual(['standard']);
});

test('refuses a compound that stands in the panel twice, and a claim made twice', () => {
  expect(faultsOf({ panel: [{ compoundId: 'a' }, { compoundId: 'a' }], claims: ['shifts', 'shifts'] })).toEqual([
    'panel/1/compoundId',
    'claims',
  ]);
});

test('refuses a window that ends before it begins', () => {
  expect(faultsOf({ windows: [{ lowPpm: 2, highPpm: 1.8 }] })).toEqual(['windows/0/highPpm']);
});

test('refuses a prior width of zero, which would claim certainty', () => {
  expect(faultsOf({ panel: [{ compoundId: 'a', shiftSdPpm: 0 }] })).toEqual(['panel/0/shiftSdPpm']);
});

test('refuses a standard that nothing of the method would measure', () => {
  expect(faultsOf({ standard: { compoundId: 'maleic-acid' } })).toEqual(['standard/compoundId']);
  expect(faultsOf({ standard: { compoundId: 'acetate' } })).toEqual([]);
});
