import { ProblemError } from '@spinassay/problems';
import { expect, test } from 'vitest';
import { translateFailure } from './translate-failure.ts';

test('passes a known problem on as it is', () => {
  const record = { slug: 'unknown-resource', detail: 'no fit 7' } as const;
  expect(translateFailure(new ProblemError(record))).toEqual({ record, headers: {} });
});

test('tells nothing of the inside when the fault is ours', () => {
  const secret = 'relation "acquisition" violates password hunter2';
  for (const error of [new Error(secret), new TypeError(secret), secret, undefined]) {
    const { record } = translateFailure(error);
    expect([record.slug, JSON.stringify(record).includes('hunter2')]).toEqual(['internal-fault', false]);
  }
});

test('answers a database that refuses connections with 503 and when to come back', () => {
  // The code is the one Node gives a refused connection (errno ECONNREFUSED).
  const refused = Object.assign(new Error('connect ECONNREFUSED'), { code: 'ECONNREFUSED' });
  const { record, headers } = translateFailure(refused);
  expect([record.slug, headers['Retry-After']]).toEqual(['service-unavailable', '5']);
});
