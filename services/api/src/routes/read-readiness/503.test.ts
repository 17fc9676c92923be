import { readinessSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { ServedApi } from '../../../test-support/serve-api.ts';
import { serveWithoutDatabase } from '../../../test-support/serve-without-database.ts';

let api: ServedApi;
beforeAll(async () => {
  api = await serveWithoutDatabase();
});
afterAll(() => api.close());

test('is not ready while the database is away, and says so', async () => {
  const response = await fetch(`${api.baseUrl}/readyz`);
  const { status, checks } = readinessSchema.parse(await response.json());
  expect([response.status, status, checks[0]?.passed]).toEqual([503, 'not-ready', false]);
});
