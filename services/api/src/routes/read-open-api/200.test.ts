import { buildOpenApi } from '@spinassay/contract';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('serves the description that openapi.yaml is made from', async () => {
  const response = await api.send('GET', '/openapi.json');
  expect(await response.json()).toEqual(JSON.parse(JSON.stringify(buildOpenApi())));
});
