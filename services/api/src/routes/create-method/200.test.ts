import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { acetateMethod, put, singletCompound } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('answers the same method again with the version it has', async () => {
  await put(api, '/v1/compounds', singletCompound('acetate', 1.91));
  await put(api, '/v1/compounds', singletCompound('tsp', 0));
  const first = await api.send('POST', '/v1/methods', { role: 'method-owner', json: acetateMethod });
  const second = await api.send('POST', '/v1/methods', { role: 'method-owner', json: acetateMethod });
  expect([first.status, second.status]).toEqual([201, 200]);
  expect(await second.json()).toEqual(await first.json());
});
