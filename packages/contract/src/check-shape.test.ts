import { expect, test } from 'vitest';
import { checkShape } from './check-shape.ts';
import { conditionsSchema } from './conditions.ts';
import { preparationPostExample } from './examples/document-examples.ts';
import { preparationPostSchema } from './versioned-documents.ts';

// The promises under test are the words of the wire, ours; no outside source.
test('gives back the value that passes', () => {
  expect(checkShape(preparationPostSchema, preparationPostExample)).toEqual({
    ok: true,
    value: preparationPostExample,
  });
});

test('tells what is missing, what is unknown and what is out of range, each at its own place', () => {
  const checked = checkShape(preparationPostSchema, { id: 'Tank 4', colour: 1, body: { standard: {} } });
  const faults = checked.ok ? [] : checked.faults.map(({ path, detail }) => `${path.join('/')}: ${detail}`);
  expect(faults.sort()).toEqual([
    'body/standard/amountConcentration: this member is missing: expected object',
    'body/standard/compoundId: this member is missing: expected string',
    'colour: this name is not known here',
    'id: expected kebab-case: lower-case letters and digits, joined by single hyphens',
  ]);
});

test('takes what is not an object for one fault at the root', () => {
  for (const value of [null, 7, 'x', []]) {
    const checked = checkShape(conditionsSchema, value);
    expect(checked.ok ? [] : checked.faults.map(({ path }) => path)).toEqual([[]]);
  }
});
