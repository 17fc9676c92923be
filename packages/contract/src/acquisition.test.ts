import { expect, test } from 'vitest';
import { acquisitionPostSchema } from './acquisition.ts';
import { acquisitionPostExample, jcampDxExample } from './examples/acquisition-examples.ts';

// The promises under test are the words of the wire, ours; no outside source.
function faultsOf(post: unknown): string[] {
  const parsed = acquisitionPostSchema.safeParse(post);
  return parsed.success ? [] : parsed.error.issues.map((issue) => issue.path.join('/'));
}

test('takes either a file or numbers, and refuses both or neither', () => {
  expect(faultsOf({ jcampDx: jcampDxExample })).toEqual([]);
  expect(faultsOf(acquisitionPostExample)).toEqual([]);
  expect(faultsOf({ ...acquisitionPostExample, jcampDx: jcampDxExample })).toEqual(['']);
  expect(faultsOf({})).toEqual(['']);
});

test('lists every fault of signal and conditions at once', () => {
  const signal = { ...acquisitionPostExample.signal, dwellSeconds: -0.0001, encoding: 'float16', data: '%%%' };
  const conditions = { sequence: 'zigzag', flipAngleDegrees: 0, pulse: 90 };
  expect(faultsOf({ signal, conditions }).sort()).toEqual([
    'conditions',
    'conditions/flipAngleDegrees',
    'conditions/sequence',
    'signal/data',
    'signal/dwellSeconds',
    'signal/encoding',
  ]);
});

test('takes the time of the instrument only with its zone', () => {
  const at = (measuredAt: string): string[] => faultsOf({ ...acquisitionPostExample, conditions: { measuredAt } });
  expect(at('2026-01-17T04:12:45+01:00')).toEqual([]);
  expect(at('2026-01-17T04:12:45')).toEqual(['conditions/measuredAt']);
});
