import { expect, test } from 'vitest';
import { problemCatalogue } from './catalogue.ts';

// Status meanings: RFC 9110 section 15 and, for 422, its section 15.5.21.
const clientAndServerErrors = new Set([400, 401, 403, 404, 405, 409, 413, 415, 422, 500, 503]);

test('files every kind of problem under its own slug in kebab-case', () => {
  for (const [key, kind] of Object.entries(problemCatalogue)) {
    expect(kind.slug).toBe(key);
    expect(kind.slug).toMatch(/^[a-z]+(-[a-z]+)*$/);
  }
});

test('gives every kind an error status of RFC 9110, its own title and a remedy', () => {
  const kinds = Object.values(problemCatalogue);
  expect(new Set(kinds.map((kind) => kind.title)).size).toBe(kinds.length);
  for (const kind of kinds) {
    expect(clientAndServerErrors.has(kind.status), kind.slug).toBe(true);
    expect(kind.remedy.length, kind.slug).toBeGreaterThan(20);
  }
});

test('never tells a client to repeat a request that its own mistake made fail', () => {
  const retryable = Object.values(problemCatalogue).filter((kind) => kind.retryable);
  expect(retryable.map((kind) => kind.slug)).toEqual(['fit-not-completed', 'service-unavailable']);
});
