import { afterAll, beforeAll, expect, test } from 'vitest';
import { type ApiFixture, openApiFixture } from '../../../test-support/api-fixture.ts';
import { singletCompound } from '../../../test-support/laboratory-content.ts';

let api: ApiFixture;
beforeAll(async () => {
  api = await openApiFixture();
});
afterAll(() => api.close());

test('answers the body of the latest version with that version, whatever the order of its members', async () => {
  const json = singletCompound('acetate', 1.91);
  const first = await api.send('POST', '/v1/compounds', { role: 'method-owner', json });
  const body = Object.fromEntries(Object.entries(json.body).reverse());
  const second = await api.send('POST', '/v1/compounds', { role: 'method-owner', json: { body, id: 'acetate' } });
  expect([first.status, second.status]).toEqual([201, 200]);
  expect(await second.json()).toEqual(await first.json());
});
