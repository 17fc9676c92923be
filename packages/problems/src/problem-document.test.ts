import { expect, test } from 'vitest';
import { problemDocument } from './problem-document.ts';
import { ProblemError } from './problem-error.ts';

const address = { baseUrl: 'https://lab.example/', instance: '/v1/fits/7' };

test('carries the five members of RFC 9457 section 3.1 with an absolute type', () => {
  expect(problemDocument({ slug: 'unknown-resource', detail: 'no fit 7' }, address)).toEqual({
    type: 'https://lab.example/problems/unknown-resource',
    title: 'Your laboratory holds no such item',
    status: 404,
    detail: 'no fit 7',
    instance: '/v1/fits/7',
  });
});

test('puts faults and facts at the top level as RFC 9457 section 3.2 has extensions', () => {
  const record = {
    slug: 'invalid-body' as const,
    detail: 'one fault',
    errors: [{ pointer: '#/name', detail: 'is missing' }],
    facts: { limitBytes: 12 },
  };
  const document = problemDocument(record, { baseUrl: 'http://127.0.0.1:1' });
  expect(document.errors).toEqual([{ pointer: '#/name', detail: 'is missing' }]);
  expect(document['limitBytes']).toBe(12);
  expect('instance' in document).toBe(false);
});

test('refuses a fact that would replace a standard member', () => {
  const record = { slug: 'internal-fault' as const, detail: 'x', facts: { status: 200 } };
  expect(() => problemDocument(record, address)).toThrow(RangeError);
});

test('throws with the status of its kind and keeps the cause', () => {
  const cause = new Error('socket closed');
  const error = new ProblemError({ slug: 'service-unavailable', detail: 'the database is away' }, { cause });
  expect([error.status, error.isRetryable, error.cause]).toEqual([503, true, cause]);
});
