import { afterAll, beforeAll, expect, test } from 'vitest';
import type { ServedApi } from '../../../test-support/serve-api.ts';
import { serveWithoutDatabase } from '../../../test-support/serve-without-database.ts';

let api: ServedApi;
beforeAll(async () => {
  api = await serveWithoutDatabase();
});
afterAll(() => api.close());

test('answers without a key and without a database', async () => {
  const response = await fetch(`${api.baseUrl}/healthz`);
  expect([response.status, await response.json()]).toEqual([200, { status: 'alive' }]);
});
