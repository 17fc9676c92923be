import { readinessSchema } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('is ready when the database answers and holds the migrations of this build', async () => {
  const response = await api.send('GET', '/readyz');
  const { status, checks } = readinessSchema.parse(await response.json());
  expect([response.status, status, checks.map((check) => check.passed)]).toEqual([200, 'ready', [true, true]]);
});
